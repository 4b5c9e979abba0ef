import type { MeasurementSettings } from "../sweep/settings";
import type { Trace } from "../sweep/trace";

/** What is known about the circumstances of a sweep; left out means that nobody looked. */
export interface ReadingContext {
  ambientTaken?: boolean;
  calibration?: CalibrationState;
  /**
   * Highest level of each trace at the instrument, before the signal path, in the unit of the
   * reference level; null where it was not kept.
   */
  instrumentLevelsDb?: readonly (number | null)[];
}

/** The calibrations that a sweep's levels rest on, as of the day it was taken. */
export interface CalibrationState {
  /** Names of what was overdue on that day. */
  overdue: readonly string[];
  /** Names of what states no due date. */
  unstated: readonly string[];
  /** Names of what was calibrated only after that day; left out: nothing. */
  calibratedLater?: readonly string[];
  /** Without the day of the sweep nothing can be checked. */
  isDateKnown: boolean;
  /** The instrument applied the factors itself, with tables that nobody here has seen. */
  isCorrected: boolean;
}

/** One sweep as it is held against masks, alone or together with others. */
export interface SweepPart {
  traces: readonly Trace[];
  settings: MeasurementSettings;
  /** Margin in dB that the sweep's bench keeps free under the mask. */
  guardDb: number;
  /** Impedance of the instrument; null or left out: not stated, then powers are not restated. */
  impedanceOhm?: number | null;
  /**
   * Bench, distance and link settings as one text: a trace of another arrangement says nothing about
   * this sweep's. Left out: the same as that of every other sweep that leaves it out.
   */
  arrangement?: string;
  /** Restate levels to the mask's distance; only ever on request. */
  restateDistance?: boolean;
  context?: ReadingContext;
}
