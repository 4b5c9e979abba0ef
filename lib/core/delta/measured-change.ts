import { powerMeanDb } from "../stats/power-mean";
import { welchHalfWidth } from "../stats/welch";
import type { MeasuredChange } from "./delta";

export interface MeasuredPair extends MeasuredChange {
  beforeDb: number | null;
  afterDb: number | null;
}

const known = (values: readonly (number | null)[]) =>
  values.filter((value) => value !== null && Number.isFinite(value)) as number[];

/**
 * Values of the repeats of two sides, dB, taken together by `meanOf`, and the change from one to
 * the other. A side on which a repeat lacks the value has none: a mean over fewer sweeps than
 * were made would hide that.
 */
export function measureChange(
  before: readonly (number | null)[],
  after: readonly (number | null)[],
  meanOf: (values: readonly number[]) => number = powerMeanDb,
): MeasuredPair {
  const [a, b] = [known(before), known(after)];
  const beforeDb = a.length > 0 && a.length === before.length ? meanOf(a) : null;
  const afterDb = b.length > 0 && b.length === after.length ? meanOf(b) : null;
  const repeats = { before: a.length, after: b.length };
  if (beforeDb === null || afterDb === null) {
    const unknown = { changeDb: null, uncertaintyDb: null, isWithinRepeatability: null };
    return { beforeDb, afterDb, repeats, ...unknown };
  }
  // Zero is plain zero whichever way round the two are taken.
  const changeDb = afterDb === beforeDb ? 0 : afterDb - beforeDb;
  const uncertaintyDb = welchHalfWidth(a, b);
  const isWithinRepeatability = uncertaintyDb === null ? null : Math.abs(changeDb) <= uncertaintyDb;
  return { beforeDb, afterDb, repeats, changeDb, uncertaintyDb, isWithinRepeatability };
}

/** The change alone. */
export function changeOf(pair: MeasuredPair): MeasuredChange {
  const { changeDb, uncertaintyDb, repeats, isWithinRepeatability } = pair;
  return { changeDb, uncertaintyDb, repeats, isWithinRepeatability };
}
