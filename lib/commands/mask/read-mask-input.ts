import type { Mask } from "@/lib/core/mask/mask";
import { maskFromJson } from "@/lib/core/mask/mask-json";
import type { MaskProblem } from "@/lib/core/mask/validate-mask";
import { CommandError, type FieldErrors } from "../result";
import { isStorableText, NOT_STORABLE } from "../storable-text";

const MAX_LINES = 40;
const MAX_SEGMENTS_PER_LINE = 300;
const MAX_SEGMENTS = 1000;
const MAX_TITLE = 160;
const MAX_TEXT = 4000;
const MAX_LEVEL_DB = 400;
const MAX_HZ = 1e12;
const SHOWN_PROBLEMS = 100;

function listOf(json: unknown, key: string): unknown[] {
  const value: unknown =
    typeof json === "object" && json !== null ? Reflect.get(json, key) : undefined;
  return Array.isArray(value) ? value : [];
}

/** Before anything is compared pair by pair: a mask that is far too large is refused at once. */
function sizeProblems(json: unknown): MaskProblem[] {
  const lines = listOf(json, "lines");
  if (lines.length > MAX_LINES)
    return [{ path: "lines", text: `A mask holds at most ${MAX_LINES} lines.` }];
  const counts = lines.map((line) => listOf(line, "segments").length);
  const long = counts.findIndex((count) => count > MAX_SEGMENTS_PER_LINE);
  if (long >= 0)
    return [
      {
        path: `lines.${long}.segments`,
        text: `A line holds at most ${MAX_SEGMENTS_PER_LINE} segments.`,
      },
    ];
  return counts.reduce((sum, count) => sum + count, 0) > MAX_SEGMENTS
    ? [{ path: "lines", text: `A mask holds at most ${MAX_SEGMENTS} segments.` }]
    : [];
}

function textProblems(mask: Mask): MaskProblem[] {
  const texts: [path: string, text: string, max: number][] = [
    ["title", mask.title, MAX_TITLE],
    ["document", mask.document, MAX_TITLE],
    ["clause", mask.clause, MAX_TITLE],
    ["edition", mask.edition, MAX_TITLE],
    ["note", mask.note, MAX_TEXT],
    ...mask.lines.map((line, i): [string, string, number] => [
      `lines.${i}.name`,
      line.name,
      MAX_TITLE,
    ]),
  ];
  return texts.flatMap(([path, text, max]) => {
    if (!isStorableText(text)) return [{ path, text: NOT_STORABLE }];
    if (text.length > max) return [{ path, text: `Keep this under ${max} characters.` }];
    return path === "title" && text.trim() === "" ? [{ path, text: "Give it a title." }] : [];
  });
}

function rangeProblems(mask: Mask): MaskProblem[] {
  return mask.lines.flatMap((line, i) =>
    line.segments.flatMap((segment, k) => {
      const at = `lines.${i}.segments.${k}`;
      const problems: MaskProblem[] = [];
      for (const key of ["startDb", "stopDb"] as const)
        if (Math.abs(segment[key]) > MAX_LEVEL_DB)
          problems.push({
            path: `${at}.${key}`,
            text: `A limit beyond ${MAX_LEVEL_DB} dB either way is out of reach.`,
          });
      for (const key of ["startHz", "stopHz"] as const)
        if (segment[key] > MAX_HZ)
          problems.push({ path: `${at}.${key}`, text: "A mask ends at 1 THz at the latest." });
      return problems;
    }),
  );
}

/** Who says "read" says where: a limit nobody can look up again is from memory. */
function sourceProblems(mask: Mask): MaskProblem[] {
  return mask.provenance === "read" && mask.document.trim() === ""
    ? [{ path: "document", text: "Name the document that the limits were read in." }]
    : [];
}

/** Refuses a mask with its problems, each at its path. */
export function refuseMask(problems: readonly MaskProblem[]): never {
  const fieldErrors: FieldErrors = {};
  for (const { path, text } of problems.slice(0, SHOWN_PROBLEMS)) {
    const before = fieldErrors[path];
    fieldErrors[path] = before === undefined ? text : `${before} ${text}`;
  }
  const message =
    problems.length === 1
      ? "One thing keeps this mask from being stored."
      : `${problems.length} things keep this mask from being stored.`;
  throw new CommandError("invalid", message, fieldErrors);
}

/** A mask that can be stored, or all that keeps it from it, each with the path of its field. */
export function checkMaskInput(
  json: unknown,
): { ok: true; mask: Mask } | { ok: false; problems: MaskProblem[] } {
  const size = sizeProblems(json);
  if (size.length > 0) return { ok: false, problems: size };
  const read = maskFromJson(json);
  if (!read.ok) return read;
  const { mask } = read;
  const problems = [...textProblems(mask), ...rangeProblems(mask), ...sourceProblems(mask)];
  return problems.length > 0 ? { ok: false, problems } : { ok: true, mask };
}

/** A mask that can be stored, or every problem at the path of its field. */
export function readMaskInput(json: unknown): Mask {
  const checked = checkMaskInput(json);
  if (!checked.ok) refuseMask(checked.problems);
  return checked.mask;
}
