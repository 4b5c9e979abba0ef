import type { FrequencyRange } from "../reading/reading";
import type { Detector } from "../sweep/settings";
import type { Trace } from "../sweep/trace";
import type { ComparedSuspect, ComparedSweep } from "./compared-sweep";
import type { SuspectChange, SuspectChanges } from "./delta";
import { measureChange } from "./measured-change";
import { highestIn, suspectWindow } from "./suspect-window";
import type { TracePair } from "./trace-pairs";

/** Repeats of one side with the levels of their traces, by sweep id. */
export type SideLevels = ReadonlyMap<string, readonly Trace[]>;

interface Candidate {
  frequencyHz: number;
  levelDb: number;
  window: FrequencyRange;
}

const EMPTY: SuspectChanges = { followed: [], fresh: [], gone: [] };

function suspectsOf(side: readonly ComparedSweep[], traceIndex: number): ComparedSuspect[] {
  return side
    .flatMap((sweep) => sweep.readings.flatMap((reading) => reading.suspects))
    .filter((suspect) => suspect.traceIndex === traceIndex);
}

function windowed(
  suspects: readonly ComparedSuspect[],
  own: ComparedSweep,
  other: ComparedSweep,
  leastHz: number,
  tolerancePpm: number,
): Candidate[] {
  return suspects.map(({ frequencyHz, levelDb }) => ({
    frequencyHz,
    levelDb,
    window: suspectWindow(frequencyHz, own.link.spread, other.link.spread, leastHz, tolerancePpm),
  }));
}

const holds = ({ startHz, stopHz }: FrequencyRange, hz: number) => startHz <= hz && hz <= stopHz;

const isSame = (a: Candidate, b: Candidate) =>
  holds(a.window, b.frequencyHz) || holds(b.window, a.frequencyHz);

const measured = (traces: readonly (Trace | undefined)[], window: FrequencyRange) =>
  traces.map((trace) => (trace ? highestIn(trace, window) : null));

function strongestHz(found: readonly ({ levelDb: number; atHz: number } | null)[]): number | null {
  let best: { levelDb: number; atHz: number } | null = null;
  for (const one of found) if (one && (!best || one.levelDb > best.levelDb)) best = one;
  return best?.atHz ?? null;
}

function followPair(
  pair: TracePair,
  before: readonly ComparedSweep[],
  after: readonly ComparedSweep[],
  levels: SideLevels,
  tolerancePpm: number,
): SuspectChanges {
  const [a, b] = [before[0], after[0]];
  if (!a || !b) return EMPTY;
  const rbwHz = Math.max(a.settings.rbwHz ?? 0, b.settings.rbwHz ?? 0);
  const stepHz = Math.max(pair.before.stepHz ?? 0, pair.after.stepHz ?? 0);
  const leastHz = 2 * Math.max(rbwHz, pair.before.kind === "spots" ? 0 : stepHz);
  const earlier = windowed(suspectsOf(before, pair.beforeIndex), a, b, leastHz, tolerancePpm);
  const later = windowed(suspectsOf(after, pair.afterIndex), b, a, leastHz, tolerancePpm);
  const beforeTraces = before.map((sweep) => levels.get(sweep.id)?.[pair.beforeIndex]);
  const afterTraces = after.map((sweep) => levels.get(sweep.id)?.[pair.afterIndex]);

  const taken = new Map<string, { of: Set<keyof SuspectChanges>; change: SuspectChange }>();
  const told = new Set<Candidate>();
  const take = (own: Candidate, others: readonly Candidate[], alone: "fresh" | "gone") => {
    // It is what became of a stronger suspect on the other side, and told there.
    if (told.has(own)) return;
    const same = others.filter((other) => isSame(own, other));
    for (const other of same) told.add(other);
    const found = measured(beforeTraces, own.window);
    const next = measured(afterTraces, own.window);
    const beforeAtHz = strongestHz(found);
    const afterAtHz = strongestHz(next);
    // Two suspects in whose windows the same samples stand highest are told as one.
    const key = `${beforeAtHz} ${afterAtHz}`;
    const kind = same.length > 0 ? "followed" : alone;
    const known = taken.get(key);
    if (known) {
      known.of.add(kind);
      return;
    }
    const change: SuspectChange = {
      detector: pair.detector,
      frequencyHz: own.frequencyHz,
      window: own.window,
      beforeAtHz,
      afterAtHz,
      ...measureChange(
        found.map((one) => one?.levelDb ?? null),
        next.map((one) => one?.levelDb ?? null),
      ),
    };
    taken.set(key, { of: new Set([kind]), change });
  };
  // The strongest names the entry, whichever side it is of: so the exchange of sides changes none.
  const all = [
    ...earlier.map((own) => ({ own, others: later, alone: "gone" as const })),
    ...later.map((own) => ({ own, others: earlier, alone: "fresh" as const })),
  ].sort(
    (x, y) =>
      y.own.levelDb - x.own.levelDb ||
      x.own.frequencyHz - y.own.frequencyHz ||
      x.own.window.startHz - y.own.window.startHz ||
      x.own.window.stopHz - y.own.window.stopHz,
  );
  for (const { own, others, alone } of all) take(own, others, alone);

  const entries = [...taken.values()];
  const only = (kind: "fresh" | "gone") =>
    entries.filter(({ of }) => of.size === 1 && of.has(kind)).map(({ change }) => change);
  const fresh = only("fresh");
  const gone = only("gone");
  const rest = entries
    .map(({ change }) => change)
    .filter((c) => !fresh.includes(c) && !gone.includes(c));
  return { followed: rest, fresh, gone };
}

const byFrequency = (a: SuspectChange, b: SuspectChange) =>
  a.frequencyHz - b.frequencyHz || a.detector.localeCompare(b.detector);

/**
 * What became of every suspect of either side. Each is looked for in one window on both sides,
 * and the highest level in it counts before and after: so the change turns its sign when the
 * sides are exchanged, and new ones become gone ones. Suspects whose levels are not at hand are
 * left out.
 */
export function changeOfSuspects(
  pairs: readonly TracePair[],
  before: readonly ComparedSweep[],
  after: readonly ComparedSweep[],
  levels: SideLevels,
  tolerancePpm: number,
): SuspectChanges {
  const has = (sweep: ComparedSweep) => levels.has(sweep.id);
  if (!before.every(has) || !after.every(has)) return EMPTY;
  const parts = pairs.map((pair) => followPair(pair, before, after, levels, tolerancePpm));
  const gather = (kind: keyof SuspectChanges) => parts.flatMap((p) => p[kind]).sort(byFrequency);
  return { followed: gather("followed"), fresh: gather("fresh"), gone: gather("gone") };
}

/** Detectors of suspects whose traces have no counterpart on the other side. */
export function unfollowedDetectors(
  pairs: readonly TracePair[],
  before: readonly ComparedSweep[],
  after: readonly ComparedSweep[],
): Detector[] {
  const found = new Set<Detector>();
  const look = (side: readonly ComparedSweep[], places: ReadonlySet<number>) => {
    for (const sweep of side)
      for (const { traceIndex } of sweep.readings.flatMap((reading) => reading.suspects)) {
        const detector = sweep.traces[traceIndex]?.detector;
        if (detector && !places.has(traceIndex)) found.add(detector);
      }
  };
  look(before, new Set(pairs.map((pair) => pair.beforeIndex)));
  look(after, new Set(pairs.map((pair) => pair.afterIndex)));
  return [...found];
}
