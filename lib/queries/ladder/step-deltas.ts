import { compareSides } from "@/lib/core/delta/compare-sides";
import type { ComparedSweep } from "@/lib/core/delta/compared-sweep";
import type { SidedDelta } from "@/lib/core/delta/delta";
import type { OrderedStep } from "@/lib/core/delta/ladder-order";
import { baseOfStep } from "@/lib/core/delta/ladder-order";
import { pairSweeps } from "@/lib/core/delta/pair-sweeps";
import type { Trace } from "@/lib/core/sweep/trace";
import type { PairAcceptance } from "./load-acceptances";
import { findAcceptance } from "./load-acceptances";

export interface StepDelta extends SidedDelta {
  /** The newest sweep of each side. */
  beforeId: string;
  afterId: string;
}

export interface StepDeltas {
  /**
   * Against the step that this one is held against (`baseOfStep`): one for each product sweep, or
   * repeats of one, that has a counterpart; empty for step 0.
   */
  againstPrevious: StepDelta[];
  againstStart: StepDelta[];
  /** Names of product sweeps that have no counterpart in the step held against. */
  unpaired: string[];
}

export interface DeltaStep extends OrderedStep {
  sweeps: ComparedSweep[];
}

interface Given {
  levels: ReadonlyMap<string, readonly Trace[]>;
  acceptances: readonly PairAcceptance[];
  tolerancePpm: number;
}

const products = (step: DeltaStep) => step.sweeps.filter((s) => s.purpose === "product");

function deltasBetween(before: DeltaStep, after: DeltaStep, given: Given): StepDelta[] {
  const { levels, acceptances, tolerancePpm } = given;
  return pairSweeps(products(before), products(after)).map((pair) => {
    const beforeIds = pair.before.map((sweep) => sweep.id);
    const afterIds = pair.after.map((sweep) => sweep.id);
    const acceptance = findAcceptance(acceptances, beforeIds, afterIds);
    return {
      beforeId: beforeIds.at(-1) ?? pair.before[0].id,
      afterId: afterIds.at(-1) ?? pair.after[0].id,
      beforeIds,
      afterIds,
      ...compareSides(pair.before, pair.after, { levels, acceptance, tolerancePpm }),
    };
  });
}

/** Deltas of each step against the one that it is held against, and against step 0. */
export function stepDeltas(steps: readonly DeltaStep[], given: Given): StepDeltas[] {
  const [start] = steps;
  return steps.map((step, i) => {
    const base = baseOfStep(steps, i);
    if (!start || !base) return { againstPrevious: [], againstStart: [], unpaired: [] };
    const againstPrevious = deltasBetween(base, step, given);
    const paired = new Set(againstPrevious.flatMap((delta) => delta.afterIds));
    return {
      againstPrevious,
      againstStart: base === start ? againstPrevious : deltasBetween(start, step, given),
      unpaired: products(step).flatMap(({ id, name }) => (paired.has(id) ? [] : [name])),
    };
  });
}
