import type { Suspect } from "@/lib/core/reading/reading";
import type { Deciding } from "./summarize";

const SHOWN_SUSPECTS = 5;

/** The five worst suspects of the mask on the chart, over all sweeps held together. */
export function worstSuspects({ combined }: Deciding): Suspect[] {
  return combined?.reading.suspects.slice(0, SHOWN_SUSPECTS) ?? [];
}

/** Whether a suspect was seen by the sweep that the chart shows. */
export function isOfSweep({ combined, sweep }: Deciding): (suspect: Suspect) => boolean {
  return ({ partIndex }) => combined?.sweepIds[partIndex] === sweep.sweepId;
}
