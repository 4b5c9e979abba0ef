import { parseSweepFile } from "@/lib/formats/parse-sweep-file";
import { previewSweepFile } from "@/lib/formats/preview-sweep-file";
import type { SweepFileAnswers, SweepFilePreview } from "@/lib/formats/sweep-file";
import { frequencyAt, pointCount } from "@/lib/core/sweep/axis";
import type { Trace } from "@/lib/core/sweep/trace";

export type Encoding =
  "utf-8" | "utf-8-bom" | "utf-16le" | "utf-16be" | "windows-1252" | "nul-padded";

function wide(text: string, isLittle: boolean): Uint8Array {
  const bytes = new Uint8Array(2 * text.length + 2);
  const view = new DataView(bytes.buffer);
  view.setUint16(0, 0xfeff, isLittle);
  for (let i = 0; i < text.length; i += 1) view.setUint16(2 + 2 * i, text.charCodeAt(i), isLittle);
  return bytes;
}

/** Text as an instrument might write it; windows-1252 stands for texts within Latin-1. */
export function encode(text: string, encoding: Encoding = "utf-8"): Uint8Array {
  switch (encoding) {
    case "utf-8":
      return new TextEncoder().encode(text);
    case "utf-8-bom":
      return new TextEncoder().encode(`\ufeff${text}`);
    case "utf-16le":
      return wide(text, true);
    case "utf-16be":
      return wide(text, false);
    case "windows-1252":
      return Uint8Array.from(text, (char) => char.charCodeAt(0));
    case "nul-padded":
      return new TextEncoder().encode(`${text.replaceAll("\n", "\0\n")}\0\0\0`);
  }
}

export function preview(text: string, answers?: SweepFileAnswers): SweepFilePreview {
  return previewSweepFile(encode(text), "sweep.csv", answers);
}

/** Traces of a file that leaves nothing open; says why when it does. */
export function traces(text: string | Uint8Array, answers?: SweepFileAnswers): Trace[] {
  const bytes = typeof text === "string" ? encode(text) : text;
  const result = parseSweepFile(bytes, "sweep.csv", answers);
  if (!result.ok) throw new Error(JSON.stringify(result.preview, null, 1));
  return result.traces;
}

export function hz(trace: Trace): number[] {
  return Array.from({ length: pointCount(trace.axis) }, (_, i) => frequencyAt(trace.axis, i));
}

export function levels(trace: Trace): number[] {
  return Array.from(trace.levelsDb, (level) => Number(level.toFixed(4)));
}
