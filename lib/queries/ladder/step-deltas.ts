import { compareSweeps } from "@/lib/core/delta/compare-sweeps";
import type { ComparedSweep } from "@/lib/core/delta/compared-sweep";
import type { SweepDelta } from "@/lib/core/delta/delta";
import { pairSweeps } from "@/lib/core/delta/pair-sweeps";

export interface StepDelta extends SweepDelta {
  beforeId: string;
  afterId: string;
}

export interface StepDeltas {
  /** One for each product sweep that has a counterpart; empty for step 0. */
  againstPrevious: StepDelta[];
  againstStart: StepDelta[];
}

function deltasBetween(before: ComparedSweep[], after: ComparedSweep[]): StepDelta[] {
  const products = (sweeps: ComparedSweep[]) => sweeps.filter((s) => s.purpose === "product");
  return pairSweeps(products(before), products(after)).map((pair) => ({
    beforeId: pair.before.id,
    afterId: pair.after.id,
    ...compareSweeps(pair.before, pair.after),
  }));
}

/** Deltas of each step against the step before and against step 0. */
export function stepDeltas(steps: ComparedSweep[][]): StepDeltas[] {
  return steps.map((own, i) => {
    if (i === 0) return { againstPrevious: [], againstStart: [] };
    return {
      againstPrevious: deltasBetween(steps[i - 1] ?? [], own),
      againstStart: deltasBetween(steps[0] ?? [], own),
    };
  });
}
