/** Below this a change is not worth a word. */
const STILL_DB = 0.05;
/** A change that this tool draws a conclusion from; a rule of its own, no source. */
const CLEAR_DB = 1;

function moved(subject: string, changeDb: number | null): string | null {
  if (changeDb === null) return null;
  if (Math.abs(changeDb) < STILL_DB) return `${subject} did not move`;
  const size = Math.abs(changeDb).toFixed(1);
  return `${subject} came ${changeDb < 0 ? "down" : "up"} ${size} dB`;
}

function conclusion(peakDb: number | null, powerDb: number | null): string | null {
  if (peakDb === null || powerDb === null) return null;
  if (peakDb <= -CLEAR_DB && Math.abs(powerDb) < CLEAR_DB)
    return "the energy was spread, not removed";
  if (peakDb <= -CLEAR_DB && powerDb <= -CLEAR_DB) return "less energy reaches the bench";
  if (powerDb >= CLEAR_DB) return "more energy reaches the bench";
  return null;
}

/**
 * One sentence about a step from the changes in dB of the highest level, the floor and the band
 * power; it says so when the band power is only a comparative sum.
 */
export function describeChange(change: {
  peakDb: number | null;
  floorDb: number | null;
  bandPowerDb: number | null;
  bandPowerIsPower: boolean;
}): string {
  const { peakDb, floorDb, bandPowerDb, bandPowerIsPower } = change;
  const power =
    bandPowerDb === null
      ? null
      : `${bandPowerIsPower ? "band power" : "the sum over the band"} moved ${Math.abs(bandPowerDb).toFixed(1)} dB${Math.abs(bandPowerDb) < STILL_DB ? "" : bandPowerDb < 0 ? " down" : " up"}`;
  const parts = [moved("peaks", peakDb), moved("the floor", floorDb), power].filter(
    (part) => part !== null,
  );
  if (parts.length === 0) return "Neither sweep has a level to compare.";
  const text = parts.join(", ");
  const end = conclusion(peakDb, bandPowerDb);
  const caveat = end && !bandPowerIsPower ? ", as far as a sum over this detector can tell" : "";
  return `${text[0]?.toUpperCase()}${text.slice(1)}${end ? `: ${end}${caveat}` : ""}.`;
}
