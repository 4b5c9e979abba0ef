import type { SweepInstrument } from "@/lib/core/bench/equipment";
import type { SignalPath } from "@/lib/core/bench/signal-path";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { CalibrationState, SweepPart } from "@/lib/core/reading/sweep-part";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import type { Trace } from "@/lib/core/sweep/trace";

/** What a sweep is known by when it is held against a mask, besides its levels. */
export interface SweepFacts {
  settings: MeasurementSettings;
  guardDb: number;
  /** ISO date; null: not stated. */
  measuredOn: string | null;
  corrected: boolean;
  instrument: SweepInstrument | null;
  path: SignalPath;
}

/** The calibrations behind a sweep, as of its day; ISO dates compare as text. */
function calibrationOf({ measuredOn, corrected, instrument, path }: SweepFacts): CalibrationState {
  const named = [
    { name: "the instrument", calibratedOn: null, dueOn: null, ...instrument },
    // Levels that the instrument corrected itself do not rest on the path's tables.
    ...(corrected ? [] : path.transducers),
  ];
  return {
    isDateKnown: measuredOn !== null,
    isCorrected: corrected,
    overdue: named
      .filter(({ dueOn }) => measuredOn !== null && dueOn !== null && dueOn < measuredOn)
      .map(({ name }) => name),
    calibratedLater: named
      .filter(
        ({ calibratedOn }) =>
          measuredOn !== null && calibratedOn !== null && calibratedOn > measuredOn,
      )
      .map(({ name }) => name),
    unstated: named.filter(({ dueOn }) => dueOn === null).map(({ name }) => name),
  };
}

/** Bench, distance and link settings as one text; what differs in one of them differs in all. */
export function arrangementOf(sweep: {
  benchId: string;
  settings: MeasurementSettings;
  link: LinkSettings;
}): string {
  const link = Object.entries(sweep.link).sort(([a], [b]) => (a < b ? -1 : 1));
  return JSON.stringify([sweep.benchId, sweep.settings.distanceM, link]);
}

/** A sweep as the core holds it against masks; `fileMaxDb` are its levels before the path. */
export function partOf(
  facts: SweepFacts,
  traces: Trace[],
  fileMaxDb: (number | null)[],
): SweepPart {
  return {
    traces,
    settings: facts.settings,
    guardDb: facts.guardDb,
    impedanceOhm: facts.path.impedanceOhm,
    context: { calibration: calibrationOf(facts), instrumentLevelsDb: fileMaxDb },
  };
}
