import { DETECTOR_LABELS } from "../sweep/settings";
import type { Acceptance, DeltaChanges, Mismatch, SweepDelta } from "./delta";
import { describeChange, describeRepeats } from "./describe-change";
import { findDeltaDoubts } from "./find-delta-doubts";
import { findMismatches, NEVER_ACCEPTED } from "./find-mismatches";
import { changeOfLevels } from "./level-changes";
import { changeOfMargins } from "./margin-changes";
import type { Repeats } from "./pair-sweeps";
import { findRepeatDoubts } from "./repeat-doubts";
import type { SideLevels } from "./suspect-changes";
import { changeOfSuspects, unfollowedDetectors } from "./suspect-changes";
import type { TracePair } from "./trace-pairs";
import { pairTraces, soundPairs } from "./trace-pairs";

/** What else a delta depends on. */
export interface DeltaContext {
  /** Traces of the sweeps with their levels, by sweep id: for the suspects. */
  levels: SideLevels;
  /** The engineer's acceptance in force for these two sides. */
  acceptance: Acceptance | null;
  /** Largest tolerance of the clocks of the build, ppm; 0 when none is stated. */
  tolerancePpm: number;
}

const NOTHING_ELSE: DeltaContext = { levels: new Map(), acceptance: null, tolerancePpm: 0 };

/** The acceptance, when it covers every mismatch that there is now and may be accepted at all. */
function heldAcceptance(
  mismatches: readonly Mismatch[],
  acceptance: Acceptance | null,
): Acceptance | null {
  if (mismatches.length === 0 || !acceptance) return null;
  const isCovered = mismatches.every(
    ({ field }) => acceptance.fields.includes(field) && !NEVER_ACCEPTED.has(field),
  );
  return isCovered ? acceptance : null;
}

const nameOf = (side: Repeats) => {
  const others = side.length - 1;
  const name = side.at(-1)?.name ?? side[0].name;
  return others === 0 ? name : `${name} and ${others} ${others === 1 ? "repeat" : "repeats"}`;
};

function pairDoubts(pairs: readonly TracePair[], sound: readonly TracePair[]): string[] {
  return pairs
    .filter((pair) => !sound.includes(pair))
    .map(({ detector, flaws }) => {
      const why = flaws.map(({ text }) => text).join(" ");
      return `The ${DETECTOR_LABELS[detector]} traces are not compared. ${why}`;
    });
}

function suspectDoubts(
  before: Repeats,
  after: Repeats,
  sound: readonly TracePair[],
  context: DeltaContext,
): string[] {
  const doubts = unfollowedDetectors(sound, before, after).map(
    (detector) =>
      `Suspects of the ${DETECTOR_LABELS[detector]} trace are not followed: only one side has it, or the two are not comparable.`,
  );
  const sides = [before, after];
  const has = (side: Repeats) => side.some((s) => s.readings.some((r) => r.suspects.length > 0));
  const spreads = sides.map(([first]) => first.link);
  const isStated = spreads.map((link) => link.spread !== null || link.spreadOff === true);
  // Where neither says anything there is nothing to look for; one alone leaves the other open.
  if (sides.some(has) && isStated[0] !== isStated[1])
    doubts.push(
      `Whether the clock was spread is stated only ${isStated[0] ? "before" : "after"}: a suspect may have moved further than it was looked for.`,
    );
  const levels = sides.flat().every((sweep) => context.levels.has(sweep.id));
  return sides.some(has) && !levels
    ? [...doubts, "Suspects are not followed, because not every trace could be read."]
    : doubts;
}

function acceptedDoubts(accepted: Acceptance | null): string[] {
  if (!accepted?.fields.includes("span")) return [];
  return ["Highest level, floor and band power are each of their own whole span."];
}

/**
 * What changed from one side to another, each one sweep or repeats of one, in dB, after minus
 * before; or every reason why the two may not be compared. Exchanged sides give the same changes
 * with the other sign, and a side against itself exactly zero. Changes are given in spite of
 * mismatches while an acceptance names them all.
 */
export function compareSides(
  before: Repeats,
  after: Repeats,
  context: DeltaContext = NOTHING_ELSE,
): SweepDelta {
  const [a, b] = [before[0], after[0]];
  const mismatches = findMismatches(a, b);
  const accepted = heldAcceptance(mismatches, context.acceptance);
  const pairs = pairTraces(a, b);
  const sound = soundPairs(pairs, accepted?.fields);
  const doubts = new Set([
    ...before.flatMap((x) => after.flatMap((y) => findDeltaDoubts(x, y, sound))),
    ...findRepeatDoubts(before),
    ...findRepeatDoubts(after),
  ]);
  const delta = { beforeName: nameOf(before), afterName: nameOf(after), mismatches, accepted };
  const isRefused = mismatches.length > 0 && !accepted;
  const levels = isRefused ? [] : changeOfLevels(sound, before, after);
  const [headline] = levels;
  if (!headline) return { ...delta, doubts: [...doubts], changes: null };
  const suspects = changeOfSuspects(sound, before, after, context.levels, context.tolerancePpm);
  const { peak, floor, bandPower, bandPowerIsPower } = headline;
  const changes: DeltaChanges = {
    detector: headline.detector,
    margins: changeOfMargins(before, after, sound),
    peakDb: peak.changeDb,
    floorDb: floor.changeDb,
    bandPowerDb: bandPower.changeDb,
    bandPowerIsPower,
    levels,
    suspects,
    sentence: describeChange(headline, {
      fresh: suspects.fresh.length,
      gone: suspects.gone.length,
    }),
    repeatability: describeRepeats(before.length, after.length),
  };
  const more = [
    ...pairDoubts(pairs, sound),
    ...suspectDoubts(before, after, sound, context),
    ...acceptedDoubts(accepted),
  ];
  return { ...delta, doubts: [...doubts, ...more], changes };
}
