import type { DoubtCode } from "@/lib/core/reading/reading";
import { DOUBT_CODES } from "@/lib/core/reading/reading";

export type SearchParams = Record<string, string | string[] | undefined>;

/** The doubt that `?doubt=step-coarse` looks for; what is not understood filters nothing. */
export function readDoubtParam(params: SearchParams): DoubtCode | null {
  return DOUBT_CODES.find((code) => code === params["doubt"]) ?? null;
}
