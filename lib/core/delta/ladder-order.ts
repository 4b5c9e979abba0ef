/** Whether a step's change stayed in the product or was taken out again. */
export const STEP_STATES = ["kept", "dropped"] as const;
export type StepState = (typeof STEP_STATES)[number];

interface OrderedStep {
  id: string;
  branchOfId: string | null;
  state: StepState;
}

/**
 * The step that step `i` of a ladder is held against: the one it branched from or, without one,
 * the last step before it that was kept and lies on the same line of steps. Null for step 0.
 * `steps` is in ladder order.
 */
export function baseOfStep<T extends OrderedStep>(steps: readonly T[], i: number): T | null {
  const step = steps[i];
  if (!step || i === 0) return null;
  if (step.branchOfId !== null) return steps.find((s) => s.id === step.branchOfId) ?? null;
  for (let k = i - 1; k > 0; k -= 1) {
    const earlier = steps[k];
    if (earlier && earlier.state === "kept") return earlier;
  }
  return steps[0] ?? null;
}
