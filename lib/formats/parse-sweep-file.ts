import type { Trace } from "@/lib/core/sweep/trace";
import { readSweepFile } from "./read-sweep-file";
import type { SweepFileAnswers, SweepFilePreview } from "./sweep-file";

export type SweepFileResult =
  | { ok: true; preview: SweepFilePreview; traces: Trace[] }
  | { ok: false; preview: SweepFilePreview };

/** Traces of an analyzer's file, once nothing about it is open any more. Never throws. */
export function parseSweepFile(
  bytes: Uint8Array,
  _fileName: string,
  answers: SweepFileAnswers = {},
): SweepFileResult {
  const { preview, traces } = readSweepFile(bytes, answers);
  return preview.outcome === "ready" ? { ok: true, preview, traces } : { ok: false, preview };
}
