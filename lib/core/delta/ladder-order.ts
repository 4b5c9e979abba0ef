/** Whether a step's change stayed in the product or was taken out again. */
export const STEP_STATES = ["kept", "dropped"] as const;
export type StepState = (typeof STEP_STATES)[number];

export const STEP_STATE_LABELS: Record<StepState, string> = { kept: "kept", dropped: "dropped" };

export interface OrderedStep {
  id: string;
  branchOfId: string | null;
  state: StepState;
}

/**
 * The step that step `i` of a ladder is held against. One that says what it starts from ("without
 * the ferrite") is held against that; any other was made on the product as it stood, which is the
 * last step before it that was kept: a dropped step was taken out again. A kept branch is part of
 * that product, so it takes the place of the steps that it left out. Null for step 0. `steps` is
 * in ladder order.
 */
export function baseOfStep<T extends OrderedStep>(steps: readonly T[], i: number): T | null {
  const step = steps[i];
  if (!step || i === 0) return null;
  const earlier = steps.slice(0, i);
  if (step.branchOfId !== null) return earlier.find((s) => s.id === step.branchOfId) ?? null;
  return earlier.findLast((s, k) => k === 0 || s.state === "kept") ?? null;
}

/**
 * The steps that led to the product as it stands, from step 0 to the last kept one: each is the
 * base of the next. A step that is kept but lies beside it was left out by a later branch.
 */
export function lineOfSteps<T extends OrderedStep>(steps: readonly T[]): T[] {
  const line: T[] = [];
  let i = steps.findLastIndex((step, k) => k === 0 || step.state === "kept");
  while (i >= 0) {
    const step = steps[i];
    if (step) line.unshift(step);
    const base = baseOfStep(steps, i);
    i = base ? steps.indexOf(base) : -1;
  }
  return line;
}

/** The first step in `steps`, in this order, that stands before the one it branches from. */
export function misplacedBranch<T extends OrderedStep>(steps: readonly T[]): T | null {
  return (
    steps.find(
      ({ branchOfId }, i) =>
        branchOfId !== null && !steps.slice(0, i).some((s) => s.id === branchOfId),
    ) ?? null
  );
}
