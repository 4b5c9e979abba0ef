import type { DetectorChange, MeasuredChange } from "./delta";

/** Below this a change is not worth a word. */
const STILL_DB = 0.05;
/** A change that this tool draws a conclusion from; a rule of its own, no source. */
const CLEAR_DB = 1;

const isKnown = ({ changeDb }: MeasuredChange) => changeDb !== null;

const plusMinus = ({ uncertaintyDb }: MeasuredChange) =>
  uncertaintyDb === null ? "" : ` ± ${uncertaintyDb.toFixed(1)}`;

/** What moved and how far; `way` puts the direction in its place. */
function moved(subject: string, change: MeasuredChange, way: "came" | "moved"): string | null {
  const { changeDb, uncertaintyDb, isWithinRepeatability } = change;
  if (changeDb === null) return null;
  if (isWithinRepeatability && uncertaintyDb !== null && uncertaintyDb > 0)
    return `${subject} did not move beyond repeatability (± ${uncertaintyDb.toFixed(1)} dB)`;
  const size = `${Math.abs(changeDb).toFixed(1)} dB${plusMinus(change)}`;
  if (Math.abs(changeDb) < STILL_DB)
    return way === "came" ? `${subject} did not move` : `${subject} moved ${size}`;
  const direction = changeDb < 0 ? "down" : "up";
  return way === "came"
    ? `${subject} came ${direction} ${size}`
    : `${subject} moved ${size} ${direction}`;
}

/** A change of at least `CLEAR_DB` that the repeats, where there are any, bear out. */
const isClear = ({ changeDb, isWithinRepeatability }: MeasuredChange) =>
  changeDb !== null && !isWithinRepeatability && Math.abs(changeDb) >= CLEAR_DB;

function conclusion(peak: MeasuredChange, power: MeasuredChange, isPower: boolean): string | null {
  if (peak.changeDb === null || power.changeDb === null) return null;
  const isPeakDown = isClear(peak) && peak.changeDb < 0;
  // That the power stayed is only said where its own scatter leaves no room for a clear change.
  const hasStayed = Math.abs(power.changeDb) + (power.uncertaintyDb ?? 0) < CLEAR_DB;
  if (isPeakDown && hasStayed) return "the energy was spread, not removed";
  if (isPeakDown && isClear(power) && power.changeDb < 0) return "less energy reaches the bench";
  // Spread lines touch more points, so a sum over peaks grows while nothing was added.
  const isTelling = isPower || !isPeakDown;
  if (isTelling && isClear(power) && power.changeDb > 0) return "more energy reaches the bench";
  return null;
}

const areOf = (count: number, what: string) => `${count} ${count === 1 ? "is" : "are"} ${what}`;

function suspectSentence(fresh: number, gone: number): string {
  if (fresh === 0 && gone === 0) return "";
  const count = fresh > 0 ? fresh : gone;
  const what = fresh > 0 ? "new" : "gone";
  const first = `${count} suspect${count === 1 ? " is" : "s are"} ${what}`;
  return ` ${first}${fresh > 0 && gone > 0 ? ` and ${areOf(gone, "gone")}` : ""}.`;
}

/**
 * A step in words, from the changes of one detector's traces in dB and how many suspects are new
 * and gone; it says so when the band power is only a comparative sum, and claims no change that
 * lies within the repeatability.
 */
export function describeChange(
  change: Omit<DetectorChange, "detector">,
  suspects: { fresh: number; gone: number } = { fresh: 0, gone: 0 },
): string {
  const { peak, floor, bandPower, bandPowerIsPower } = change;
  const tail = suspectSentence(suspects.fresh, suspects.gone);
  if (![peak, floor, bandPower].some(isKnown))
    return `Neither sweep has a level to compare.${tail}`;
  const parts = [
    moved("peaks", peak, "came"),
    moved("the floor", floor, "came"),
    moved(bandPowerIsPower ? "band power" : "the sum over the band", bandPower, "moved"),
  ].filter((part) => part !== null);
  const text = parts.join(", ");
  const end = conclusion(peak, bandPower, bandPowerIsPower);
  const caveat = end && !bandPowerIsPower ? ", as far as a sum over this detector can tell" : "";
  return `${text[0]?.toUpperCase()}${text.slice(1)}${end ? `: ${end}${caveat}` : ""}.${tail}`;
}

/** How often each side was swept and what follows from it; a whole sentence. */
export function describeRepeats(before: number, after: number): string {
  if (before >= 2 && after >= 2)
    return `The ± is 95 % from ${before} sweeps before and ${after} after.`;
  if (before < 2 && after < 2)
    return "Swept once before and once after, so no repeatability is known.";
  return before < 2
    ? `Swept once before and ${after} times after, so no repeatability is known.`
    : `Swept ${before} times before and once after, so no repeatability is known.`;
}
