import { DETECTOR_LABELS, type Detector } from "../sweep/settings";
import { formatFrequency } from "../units/format";
import type { Mask, MaskLine } from "./mask";
import { limitAt } from "./limit-at";
import type { MaskProblem } from "./validate-mask";

/** A rise or fall at one frequency that is more likely a slip of the pen than a limit. */
const UNLIKELY_JUMP_DB = 40;

/** A detector never reads higher than the one before it here (CISPR 16-1-1). */
const BY_HEIGHT: readonly Detector[] = ["peak", "quasi-peak", "rms-average", "average"];

/** Bands in Hz in which both lines have a limit. */
function sharedBands(a: MaskLine, b: MaskLine): { from: number; to: number }[] {
  return a.segments.flatMap((s) =>
    b.segments.flatMap((t) => {
      const from = Math.max(s.startHz, t.startHz);
      const to = Math.min(s.stopHz, t.stopHz);
      return to > from ? [{ from, to }] : [];
    }),
  );
}

function jumpHints(line: MaskLine, at: string): MaskProblem[] {
  const byStart = line.segments.map((s, i) => ({ s, i })).sort((a, b) => a.s.startHz - b.s.startHz);
  return byStart.flatMap(({ s, i }, k) => {
    const before = byStart[k - 1]?.s;
    if (before?.stopHz !== s.startHz) return [];
    const jumpDb = Math.abs(s.startDb - before.stopDb);
    if (jumpDb <= UNLIKELY_JUMP_DB) return [];
    const text = `The limit of "${line.name}" jumps by ${jumpDb.toFixed(1)} dB at ${formatFrequency(s.startHz)}: look whether both levels are right.`;
    return [{ path: `${at}.segments.${i}`, text }];
  });
}

function pairHints(a: MaskLine, b: MaskLine, at: string): MaskProblem[] {
  const [shared] = sharedBands(a, b);
  if (!shared) return [];
  const band = `from ${formatFrequency(shared.from)} to ${formatFrequency(shared.to)}`;
  if (a.detector === b.detector)
    return [
      {
        path: at,
        text: `"${a.name}" and "${b.name}" both limit the ${DETECTOR_LABELS[a.detector]} detector ${band}. That is allowed: a sweep is held against each, and the lower decides.`,
      },
    ];
  const [rankA, rankB] = [BY_HEIGHT.indexOf(a.detector), BY_HEIGHT.indexOf(b.detector)];
  if (rankA < 0 || rankB < 0) return [];
  const [upper, lower] = rankA < rankB ? [a, b] : [b, a];
  for (const { from, to } of sharedBands(upper, lower)) {
    // The middle: at the edges neighbouring bands have their say as well.
    const hz = Math.sqrt(from * to);
    const [high, low] = [limitAt(upper, hz), limitAt(lower, hz)];
    if (high !== null && low !== null && low > high)
      return [
        {
          path: at,
          text: `At ${formatFrequency(hz)} the ${DETECTOR_LABELS[lower.detector]} limit of "${lower.name}" lies above the ${DETECTOR_LABELS[upper.detector]} limit of "${upper.name}", although that detector never reads higher: look whether two columns were swapped.`,
        },
      ];
  }
  return [];
}

/**
 * What is allowed in a mask and yet worth a second look, with the path of its field; never a reason
 * to refuse it. Meant for a mask without problems (`validateMask`).
 */
export function maskHints(mask: Mask): MaskProblem[] {
  const hints: MaskProblem[] = [];
  if (mask.port === "radiated" && mask.distanceM === null)
    hints.push({
      path: "distanceM",
      text: "No measuring distance is stated: whether a sweep was taken at the mask's distance cannot be checked.",
    });
  mask.lines.forEach((line, i) => {
    const at = `lines.${i}`;
    if (line.rbwHz === null)
      hints.push({
        path: `${at}.rbwHz`,
        text: `"${line.name}" states no resolution bandwidth: a sweep's bandwidth cannot be held against it.`,
      });
    hints.push(...jumpHints(line, at));
    mask.lines.slice(0, i).forEach((earlier) => hints.push(...pairHints(earlier, line, at)));
  });
  return hints;
}
