import { formatFrequency, formatLevel } from "../units/format";
import type { AmbientAtLine, AmbientCheck, SuspectAmbient } from "./ambient-check";
import type { Doubt, LineReading, Reading } from "./reading";
import { subtractPower } from "./subtract-power";

/** Within this of the limit or of a level, the ambient is a doubt; in dB (from memory). */
const NEAR_DB = 6;
/** Within this of a suspect, the suspect is likely ambient; in dB (common practice, no source). */
const LIKELY_DB = 3;
/** A worst point further under its line than a suspect may lie is the floor, and no doubt; dB. */
const FAR_DB = 20;

/** An ambient sweep of the reading's bench and day; `check` null: not held beside it yet. */
export interface HeldAmbient {
  sweepName: string;
  check: AmbientCheck | null;
}

type Judged = Pick<Reading, "unit" | "lines" | "suspects">;

const REMEDY =
  "What is read there may come from outside: measure again where or when it is quieter.";

/** Highest of those that are known to be alike or, when there are none, of those with a caveat. */
function pickHighest<T>(
  checks: readonly AmbientCheck[],
  pick: (check: AmbientCheck) => T | undefined,
  height: (one: T) => number,
): { one: T; caveat: string | null } | null {
  const found = checks.flatMap((check) => {
    const one = pick(check);
    return one === undefined ? [] : [{ one, caveat: check.caveat }];
  });
  const alike = found.filter(({ caveat }) => caveat === null);
  return (alike.length > 0 ? alike : found).reduce<(typeof found)[number] | null>(
    (best, next) => (best && height(best.one) >= height(next.one) ? best : next),
    null,
  );
}

const below = (db: number, what: string) =>
  db < 0 ? `${(-db).toFixed(1)} dB over ${what}` : `${db.toFixed(1)} dB under ${what}`;

function lineDoubt(
  line: LineReading,
  nearest: AmbientAtLine | null,
  worstAmbientDb: number | null,
  unit: Reading["unit"],
): Doubt | null {
  const parts: string[] = [];
  const isNear = nearest !== null && nearest.marginDb <= NEAR_DB;
  if (isNear)
    parts.push(
      `The ambient comes to ${formatLevel(nearest.ambientDb, unit)} at ${formatFrequency(nearest.frequencyHz)}, ${below(nearest.marginDb, `the ${line.name} line`)}.`,
    );
  const { worst } = line;
  const aboveDb =
    worst && worst.marginDb <= FAR_DB && worstAmbientDb !== null
      ? worst.levelDb - worstAmbientDb
      : null;
  if (worst && aboveDb !== null && aboveDb <= NEAR_DB)
    parts.push(
      `At ${formatFrequency(worst.frequencyHz)}, where ${line.name} has its worst margin, the ambient lies ${below(aboveDb, "the level that was read")}.`,
    );
  if (parts.length === 0) return null;
  const valueDb = isNear ? nearest.marginDb : aboveDb;
  return { code: "ambient-near", text: `${parts.join(" ")} ${REMEDY}`, valueDb };
}

const counted = (count: number, total: number) =>
  total === 1 ? "The only suspect" : `${count} of ${total} suspects`;

function suspectDoubt(reading: Judged, ambient: readonly SuspectAmbient[]): Doubt | null {
  const differences = ambient.flatMap(({ number, ambientDb }) => {
    const suspect = reading.suspects.find((s) => s.number === number);
    return suspect ? suspect.levelDb - ambientDb : [];
  });
  const near = differences.filter((db) => db <= NEAR_DB);
  if (near.length === 0) return null;
  const likely = ambient.filter((one) => one.isLikelyAmbient).length;
  const verb = near.length === 1 ? "lies" : "lie";
  const marked =
    likely === 0
      ? ""
      : ` ${likely === 1 ? "1 is" : `${likely} are`} within 3 dB of it and likely ambient.`;
  const text = `${counted(near.length, reading.suspects.length)} ${verb} within 6 dB of the ambient.${marked} ${REMEDY}`;
  return { code: "ambient-near", text, valueDb: Math.min(...near) };
}

/** What no comparable ambient sweep covers, in span or detector, is not known to be the product. */
function unreachedDoubt(
  { lines, suspects }: Judged,
  ambient: readonly SuspectAmbient[],
  reached: ReadonlySet<number>,
): Doubt | null {
  const missing = suspects.length - ambient.length;
  const parts = lines.flatMap(({ lineIndex, name, worst }) =>
    worst && worst.marginDb <= FAR_DB && !reached.has(lineIndex)
      ? `the worst point of ${name} at ${formatFrequency(worst.frequencyHz)}`
      : [],
  );
  if (missing > 0) parts.push(`${missing} of ${suspects.length} suspects`);
  if (parts.length === 0) return null;
  const text = `The ambient sweeps of the day do not reach ${parts.join(", ")}: sweep the ambient over the whole span with the same detectors.`;
  return { code: "ambient-not-comparable", text, valueDb: null };
}

/**
 * What the ambient sweeps of a reading's bench and day say together: the highest ambient at each
 * suspect that one of them covers, which suspects are likely ambient (the ambient at or above the
 * suspect − 3 dB), and the doubts, at most one for each mask line and one for the suspects. A
 * check with a caveat speaks only where no other one does. Levels are never altered.
 */
export function judgeAmbient(
  held: readonly HeldAmbient[],
  reading: Judged,
): { suspects: SuspectAmbient[]; doubts: Doubt[] } {
  if (held.length === 0 || reading.lines.length === 0) return { suspects: [], doubts: [] };
  const comparable = held.flatMap(({ check }) =>
    check && check.notComparable === null ? [check] : [],
  );
  if (comparable.length === 0) {
    const reasons = held.map(
      ({ sweepName, check }) =>
        `"${sweepName}": ${check?.notComparable ?? "it was not held beside this reading."}`,
    );
    const text = `No ambient sweep of the day can be held beside this reading. ${reasons.join(" ")} Take one with the same settings.`;
    return { suspects: [], doubts: [{ code: "ambient-not-comparable", text, valueDb: null }] };
  }
  const caveats = new Set<string>();
  const heard = <T>(found: { one: T; caveat: string | null } | null): T | null => {
    if (found?.caveat) caveats.add(found.caveat);
    return found ? found.one : null;
  };
  const suspects = reading.suspects.flatMap(({ number, levelDb }): SuspectAmbient[] => {
    const at = heard(
      pickHighest(
        comparable,
        (check) => check.suspects.find((one) => one.number === number),
        (one) => one.ambientDb,
      ),
    );
    if (!at) return [];
    return [
      {
        number,
        ambientDb: at.ambientDb,
        isLikelyAmbient: at.ambientDb >= levelDb - LIKELY_DB,
        withoutAmbientDb: subtractPower(levelDb, at.ambientDb),
      },
    ];
  });
  const doubts: Doubt[] = [];
  const reached = new Set<number>();
  for (const line of reading.lines) {
    const own = (one: { lineIndex: number }) => one.lineIndex === line.lineIndex;
    const nearest = heard(
      pickHighest(
        comparable,
        (check) => check.lines.find(own),
        (one) => -one.marginDb,
      ),
    );
    const worst = heard(
      pickHighest(
        comparable,
        (check) => check.worst.find(own),
        (one) => one.ambientDb,
      ),
    );
    if (worst) reached.add(line.lineIndex);
    const doubt = lineDoubt(line, nearest, worst?.ambientDb ?? null, reading.unit);
    if (doubt) doubts.push(doubt);
  }
  const ofSuspects = suspectDoubt(reading, suspects);
  if (ofSuspects) doubts.push(ofSuspects);
  const unreached = unreachedDoubt(reading, suspects, reached);
  if (unreached) doubts.push(unreached);
  if (caveats.size > 0) {
    const text = `The ambient is known only with reservation. ${[...caveats].join(" ")} Take an ambient sweep that states the same as the sweep.`;
    doubts.push({ code: "ambient-not-comparable", text, valueDb: null });
  }
  return { suspects, doubts };
}
