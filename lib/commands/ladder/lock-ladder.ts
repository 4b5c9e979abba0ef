import { and, asc, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { ladders, ladderSteps } from "@/db/schema";
import { CommandError } from "../result";

/** The ladder, archived or not, locked until the transaction ends. */
export async function lockLadder(tx: Transaction, teamId: string, ladderId: string) {
  const [ladder] = await tx
    .select()
    .from(ladders)
    .where(and(eq(ladders.teamId, teamId), eq(ladders.id, ladderId)))
    .for("update");
  if (!ladder) throw new CommandError("not-found", "This ladder does not exist.");
  return ladder;
}

/** The ladder, locked; refuses when it is archived. */
export async function lockOpenLadder(tx: Transaction, teamId: string, ladderId: string) {
  const ladder = await lockLadder(tx, teamId, ladderId);
  if (ladder.archivedAt) {
    throw new CommandError("conflict", "This ladder is archived: restore it first.");
  }
  return ladder;
}

/** Steps of a ladder in their order. */
export function listSteps(tx: Transaction, teamId: string, ladderId: string) {
  return tx
    .select()
    .from(ladderSteps)
    .where(and(eq(ladderSteps.teamId, teamId), eq(ladderSteps.ladderId, ladderId)))
    .orderBy(asc(ladderSteps.position));
}

/** A step of a ladder that is not archived; the ladder is locked, so its steps stay in order. */
export async function lockStep(tx: Transaction, teamId: string, stepId: string) {
  const findStep = () =>
    tx
      .select()
      .from(ladderSteps)
      .where(and(eq(ladderSteps.teamId, teamId), eq(ladderSteps.id, stepId)));
  const gone = () => new CommandError("not-found", "This step does not exist.");
  const [found] = await findStep();
  if (!found) throw gone();
  await lockOpenLadder(tx, teamId, found.ladderId);
  // Looked for again: it may have been taken away while the ladder was waited for.
  const [step] = await findStep();
  if (!step) throw gone();
  return step;
}
