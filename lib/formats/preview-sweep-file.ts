import { readSweepFile } from "./read-sweep-file";
import type { SweepFileAnswers, SweepFilePreview } from "./sweep-file";

/** What is in an analyzer's file, and what it leaves open. Never throws. */
export function previewSweepFile(
  bytes: Uint8Array,
  _fileName: string,
  answers: SweepFileAnswers = {},
): SweepFilePreview {
  return readSweepFile(bytes, answers).preview;
}
