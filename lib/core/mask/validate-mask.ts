import type { LevelUnit } from "../units/level-units";
import { formatFrequency, formatLevel } from "../units/format";
import type { Mask, MaskLine } from "./mask";
import { segmentCrossings, type Crossing } from "./segment-crossings";

/** `path` names the field ("lines.0.segments.2.stopHz"), `text` is a sentence for a person. */
export interface MaskProblem {
  path: string;
  text: string;
}

function segmentProblems(line: MaskLine, at: string): MaskProblem[] {
  const problems: MaskProblem[] = [];
  line.segments.forEach((s, i) => {
    const path = `${at}.segments.${i}`;
    if (![s.startHz, s.stopHz, s.startDb, s.stopDb].every(Number.isFinite))
      problems.push({ path, text: "Frequencies and levels must be numbers." });
    else if (s.startHz <= 0)
      problems.push({ path: `${path}.startHz`, text: "The start frequency must be above 0 Hz." });
    else if (s.stopHz === s.startHz)
      problems.push({
        path: `${path}.stopHz`,
        text: `The segment has no width: it starts and ends at ${formatFrequency(s.startHz)}.`,
      });
    else if (s.stopHz < s.startHz)
      problems.push({
        path: `${path}.stopHz`,
        text: `The segment is reversed: it ends at ${formatFrequency(s.stopHz, s.startHz - s.stopHz)}, below its start at ${formatFrequency(s.startHz, s.startHz - s.stopHz)}. Swap the two.`,
      });
  });
  return problems;
}

/** "at 173.2 MHz, where both stand at 45.0 dBµV/m" */
function placeOf({ hz, db }: Crossing, unit: LevelUnit): string {
  return `at ${formatFrequency(hz)}, where both stand at ${formatLevel(db, unit)}`;
}

function crossingProblems(line: MaskLine, at: string, unit: LevelUnit): MaskProblem[] {
  const problems: MaskProblem[] = [];
  line.segments.forEach((a, i) => {
    line.segments.slice(i + 1).forEach((b, k) => {
      const crossings = segmentCrossings(a, b);
      if (crossings.length === 0) return;
      const places = crossings.map((crossing) => placeOf(crossing, unit)).join(", and again ");
      problems.push({
        path: `${at}.segments.${i + 1 + k}`,
        text: `This segment crosses segment ${i + 1} ${places}. Split both there, so that it is plain which limit applies.`,
      });
    });
  });
  return problems;
}

/** Everything that keeps a mask from being used; empty when it can be. */
export function validateMask(mask: Mask): MaskProblem[] {
  const problems: MaskProblem[] = [];
  if (mask.lines.length === 0)
    problems.push({ path: "lines", text: "The mask has no lines: add at least one limit line." });
  if (mask.unit === "dB")
    problems.push({
      path: "unit",
      text: "Relative dB is no unit for a limit: state the unit of the limit.",
    });
  if (mask.distanceM !== null && !(mask.distanceM > 0 && Number.isFinite(mask.distanceM)))
    problems.push({ path: "distanceM", text: "The measuring distance must be above 0 m." });
  const names = new Set<string>();
  mask.lines.forEach((line, i) => {
    const at = `lines.${i}`;
    if (line.name.trim() === "") problems.push({ path: `${at}.name`, text: "Name this line." });
    else if (names.has(line.name))
      problems.push({
        path: `${at}.name`,
        text: `Two lines are named "${line.name}": give each its own name.`,
      });
    names.add(line.name);
    if (line.rbwHz !== null && !(line.rbwHz > 0 && Number.isFinite(line.rbwHz)))
      problems.push({ path: `${at}.rbwHz`, text: "The resolution bandwidth must be above 0 Hz." });
    if (line.segments.length === 0)
      problems.push({
        path: `${at}.segments`,
        text: "This line has no segments: add at least one.",
      });
    const broken = segmentProblems(line, at);
    problems.push(...broken, ...(broken.length === 0 ? crossingProblems(line, at, mask.unit) : []));
  });
  return problems;
}
