import type { DoubtCode } from "@/lib/core/reading/reading";
import { DOUBT_CODES } from "@/lib/core/reading/reading";

interface Doubted {
  doubts: readonly DoubtCode[];
}

/** How many of the sweeps have each doubt, those that none has left out, in the codes' order. */
export function countDoubts(sweeps: readonly Doubted[]): { code: DoubtCode; sweeps: number }[] {
  return DOUBT_CODES.map((code) => ({
    code,
    sweeps: sweeps.filter(({ doubts }) => doubts.includes(code)).length,
  })).filter((counted) => counted.sweeps > 0);
}

/** The sweeps whose readings have a doubt; all of them without one to look for. */
export function filterByDoubt<T extends Doubted>(
  sweeps: readonly T[],
  code: DoubtCode | null,
): T[] {
  return sweeps.filter(({ doubts }) => code === null || doubts.includes(code));
}
