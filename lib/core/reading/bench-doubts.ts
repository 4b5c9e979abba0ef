import { firstHz, lastHz } from "../sweep/axis";
import type { MeasurementSettings } from "../sweep/settings";
import type { HeldTrace } from "./held-trace";
import type { Doubt } from "./reading";
import type { CalibrationState } from "./sweep-part";

/** Shortest scan in s, peak detector: CISPR 16-2, from memory. */
function shortestScanS(fromHz: number, toHz: number): number {
  const bands = [
    { from: 9e3, to: 150e3, perHz: 100e-6 },
    { from: 150e3, to: 30e6, perHz: 100e-9 },
    { from: 30e6, to: Number.POSITIVE_INFINITY, perHz: 1e-9 },
  ];
  return bands.reduce(
    (sum, b) => sum + Math.max(0, Math.min(toHz, b.to) - Math.max(fromHz, b.from)) * b.perHz,
    0,
  );
}

/** A sweep faster than its span allows, or of an unstated time. */
export function scanTimeDoubts(
  { sweepTimeS }: MeasurementSettings,
  scans: readonly HeldTrace[],
): Doubt[] {
  if (scans.length === 0) return [];
  const fromHz = Math.min(...scans.map(({ trace }) => firstHz(trace.axis)));
  const toHz = Math.max(...scans.map(({ trace }) => lastHz(trace.axis)));
  const neededS = shortestScanS(fromHz, toHz);
  if (sweepTimeS === null) {
    const text = `The sweep time is not stated; this span needs ${neededS.toPrecision(3)} s or more.`;
    return [{ code: "sweep-time-unchecked", text, valueDb: null }];
  }
  if (sweepTimeS >= neededS) return [];
  const text = `The sweep took ${sweepTimeS} s and this span needs ${neededS.toPrecision(3)} s or more: sweep slower or hold the maximum over several sweeps.`;
  return [{ code: "sweep-time-short", text, valueDb: null }];
}

/** Calibrations that were overdue on the day of the sweep, or that nobody can check. */
export function calibrationDoubts(state: CalibrationState): Doubt[] {
  const { overdue, unstated, calibratedLater = [], isDateKnown, isCorrected } = state;
  const doubts: Doubt[] = [];
  if (overdue.length > 0) {
    const text = `Calibration was overdue on the date of the sweep: ${overdue.join(", ")}. Have it calibrated and compare.`;
    doubts.push({ code: "calibration-overdue", text, valueDb: null });
  }
  const open = [
    isDateKnown ? null : "The date of the sweep is not stated, so calibrations cannot be checked.",
    isDateKnown && unstated.length > 0
      ? `No due date is stated for the calibration of ${unstated.join(", ")}.`
      : null,
    calibratedLater.length > 0
      ? `Calibrated only after the sweep, so nothing is known of that day: ${calibratedLater.join(", ")}.`
      : null,
    isCorrected
      ? "The instrument applied the factors itself, from tables that cannot be seen here."
      : null,
  ].filter((text) => text !== null);
  if (open.length > 0)
    doubts.push({ code: "calibration-unchecked", text: open.join(" "), valueDb: null });
  return doubts;
}

/** How near in dB to the top of its range an instrument is taken to overload. */
const NEAR_TOP_DB = 3;

/** A level at the instrument within 3 dB of its reference level, or none that can be compared. */
export function overloadDoubts(
  { referenceLevelDb, attenuationDb }: MeasurementSettings,
  levelsDb: readonly (number | null)[],
): Doubt[] {
  const known = levelsDb.filter((level) => level !== null);
  const remedy = "Add 10 dB of attenuation: no level may move.";
  if (referenceLevelDb === null || known.length === 0) {
    const why =
      referenceLevelDb === null
        ? "The reference level is not stated"
        : "The levels at the instrument are not known";
    const text = `${why}, so overload cannot be checked. ${remedy}`;
    return [{ code: "overload-unchecked", text, valueDb: null }];
  }
  const roomDb = referenceLevelDb - Math.max(...known);
  if (roomDb > NEAR_TOP_DB) return [];
  const where =
    roomDb >= 0 ? `${roomDb.toFixed(1)} dB below` : `${Math.abs(roomDb).toFixed(1)} dB above`;
  const with_ = attenuationDb === null ? "" : ` at ${attenuationDb} dB of attenuation`;
  const text = `The highest level at the instrument lies ${where} its reference level${with_}: it may be overloaded. ${remedy}`;
  return [{ code: "overload-suspected", text, valueDb: roomDb }];
}
