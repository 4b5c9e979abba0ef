import { isIsoDate } from "./iso-date";
import type { FactorPoint, SignalPath, Transducer, TransducerKind } from "./signal-path";
import { PICK_UPS } from "./signal-path";

/** `path` names the field ("transducers.0.factors"), `text` is a sentence for a person. */
export interface SignalPathProblem {
  path: string;
  text: string;
}

/** No transducer, amplifier or pad on a bench has a factor beyond this; a typing error has. */
const MAX_FACTOR_DB = 200;

/** Kinds whose table is a loss or a gain, which Neap adds or subtracts by itself. */
const AMOUNTS: Partial<Record<TransducerKind, string>> = {
  cable: "loss",
  attenuator: "loss",
  preamplifier: "gain",
};

/** A loss written as a transmission (−3 dB) would raise every margin by twice its size. */
function signProblem({ kind, factors }: Transducer): string | null {
  const amount = AMOUNTS[kind];
  const row = factors.findIndex((point) => point.factorDb < 0);
  if (!amount || row < 0) return null;
  return `Row ${row + 1}: ${factors[row]?.factorDb} dB is negative. Write the ${amount} as a positive number; Neap knows its sign.`;
}

function factorProblem(points: readonly FactorPoint[]): string | null {
  if (points.length < 2) {
    return points.length === 0
      ? "The factor table is empty: give at least two rows of frequency and factor."
      : "The factor table has one row: give at least two, since nothing is assumed outside it.";
  }
  let before: FactorPoint | undefined;
  for (const [i, point] of points.entries()) {
    const { frequencyHz, factorDb } = point;
    const row = `Row ${i + 1}`;
    if (!Number.isFinite(frequencyHz) || frequencyHz <= 0)
      return `${row}: the frequency must be a number above 0 Hz.`;
    if (!Number.isFinite(factorDb)) return `${row}: the factor must be a number in dB.`;
    if (Math.abs(factorDb) > MAX_FACTOR_DB)
      return `${row}: a factor of ${factorDb} dB is out of reach; at most ${MAX_FACTOR_DB} dB either way is taken.`;
    if (before && frequencyHz === before.frequencyHz)
      return `${row}: the frequency ${frequencyHz} Hz stands twice.`;
    if (before && frequencyHz < before.frequencyHz)
      return `${row}: frequencies must ascend, and ${frequencyHz} Hz lies below the row before it.`;
    before = point;
  }
  return null;
}

function dateProblems(
  transducer: Transducer,
  at: string,
  today: string | null,
): SignalPathProblem[] {
  const { calibratedOn, dueOn } = transducer;
  const problems: SignalPathProblem[] = [];
  const text = "Write the date as year-month-day, for example 2026-03-31.";
  const fine = (date: string | null) => date === null || isIsoDate(date);
  if (!fine(calibratedOn)) problems.push({ path: `${at}.calibratedOn`, text });
  if (!fine(dueOn)) problems.push({ path: `${at}.dueOn`, text });
  // Sound ISO dates compare as text.
  if (today !== null && calibratedOn !== null && fine(calibratedOn) && calibratedOn > today)
    problems.push({
      path: `${at}.calibratedOn`,
      text: "The calibration lies in the future: no day after today is taken.",
    });
  if (problems.length === 0 && calibratedOn !== null && dueOn !== null && dueOn < calibratedOn)
    problems.push({ path: `${at}.dueOn`, text: "The due date lies before the calibration." });
  return problems;
}

/**
 * Everything that keeps a signal path from being used; empty when it can be. Checked: an
 * impedance in Ω above 0, names that are there and differ, factor tables of two rows or more
 * with ascending frequencies in Hz and factors in dB, losses and gains that are not negative,
 * dates (ISO) that exist and are in order, no calibration after `today` (ISO) when it is given,
 * and no second pick-up: two antennas in a row would add both factors to one level.
 * A path without transducers is sound: the level at the instrument's input is then the result.
 */
export function validateSignalPath(
  path: SignalPath,
  today: string | null = null,
): SignalPathProblem[] {
  const problems: SignalPathProblem[] = [];
  if (!(path.impedanceOhm > 0 && Number.isFinite(path.impedanceOhm)))
    problems.push({ path: "impedanceOhm", text: "The impedance must be above 0 Ω." });
  const names = new Set<string>();
  const pickUp = path.transducers.findIndex((t) => PICK_UPS.includes(t.kind));
  path.transducers.forEach((transducer, i) => {
    const at = `transducers.${i}`;
    const name = transducer.name.trim();
    if (name === "") problems.push({ path: `${at}.name`, text: "Name this transducer." });
    else if (names.has(name))
      problems.push({
        path: `${at}.name`,
        text: `Two transducers are named "${name}": give each its own name.`,
      });
    names.add(name);
    problems.push(...dateProblems(transducer, at, today));
    if (i > pickUp && PICK_UPS.includes(transducer.kind))
      problems.push({
        path: `${at}.kind`,
        text: `A signal path has one pick-up, and "${path.transducers[pickUp]?.name.trim()}" is one already: an antenna, a loop, a LISN and a probe exclude each other.`,
      });
    const text = factorProblem(transducer.factors) ?? signProblem(transducer);
    if (text !== null) problems.push({ path: `${at}.factors`, text });
  });
  return problems;
}
