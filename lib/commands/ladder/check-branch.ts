import { CommandError } from "../result";

/** Refuses a branch that starts from a step which is not of the ladder or does not come before. */
export function checkBranch(
  steps: readonly { id: string; position: number }[],
  branchOfId: string | null,
  position: number,
): void {
  if (branchOfId === null) return;
  const base = steps.find((step) => step.id === branchOfId);
  const refuse = (message: string) =>
    new CommandError("conflict", message, { branchOfId: message });
  if (!base) throw refuse("Choose a step of this ladder to start from.");
  // An earlier base also rules out that a step starts from itself, by whatever detour.
  if (base.position >= position) throw refuse("A step can only start from an earlier one.");
}
