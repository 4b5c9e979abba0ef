import { bandPowerDb, isPower } from "../sweep/band-power";
import type { ComparedSweep } from "./compared-sweep";
import type { DetectorChange } from "./delta";
import { decidingDetector } from "./margin-changes";
import { changeOf, measureChange } from "./measured-change";
import type { Repeats } from "./pair-sweeps";
import type { TracePair } from "./trace-pairs";

function levelChange(pair: TracePair, before: Repeats, after: Repeats): DetectorChange {
  // One filter cancels out of the change; with two it has to be known, or nothing can be said.
  const [a, b] = [before[0].settings, after[0].settings];
  const isOneFilter = a.rbwHz === b.rbwHz && (a.rbwKind ?? b.rbwKind) === (b.rbwKind ?? a.rbwKind);
  const power = ({ settings, traces }: ComparedSweep, i: number) => {
    const sum = traces[i]?.powerSumDb ?? null;
    return isOneFilter ? sum : bandPowerDb(sum, settings.rbwHz, settings.rbwKind);
  };
  const measure = (of: (sweep: ComparedSweep, i: number) => number | null) =>
    changeOf(
      measureChange(
        before.map((sweep) => of(sweep, pair.beforeIndex)),
        after.map((sweep) => of(sweep, pair.afterIndex)),
      ),
    );
  return {
    detector: pair.detector,
    peak: measure(({ traces }, i) => traces[i]?.maxDb ?? null),
    floor: measure(({ traces }, i) => traces[i]?.floorDb ?? null),
    bandPower: measure(power),
    bandPowerIsPower: isPower(pair.detector),
  };
}

/**
 * Highest level, floor and band power for every pair of traces. First stands the detector that
 * decided the lowest margin on both sides or, where two did, the first in the order of
 * `pairTraces`: the same whichever way round the sides are taken.
 */
export function changeOfLevels(
  sound: readonly TracePair[],
  before: Repeats,
  after: Repeats,
): DetectorChange[] {
  const [a, b] = [decidingDetector(before), decidingDetector(after)];
  const first = sound.find((pair) => a === b && pair.detector === a) ?? sound[0];
  return [...sound]
    .sort((x, y) => Number(y === first) - Number(x === first))
    .map((pair) => levelChange(pair, before, after));
}
