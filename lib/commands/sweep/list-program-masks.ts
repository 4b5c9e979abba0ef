import { and, asc, eq, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { maskRevisions, masks, programMasks } from "@/db/schema";
import type { MaskToHold } from "./store-reading";

/**
 * Keeps a program's masks from being revised until the transaction ends. A revision completes the
 * readings of the sweeps that it can see; one that is just being stored or restored it cannot.
 */
export async function holdProgramMasks(
  tx: Transaction,
  teamId: string,
  programId: string,
): Promise<void> {
  await tx
    .select({ id: masks.id })
    .from(masks)
    .innerJoin(
      programMasks,
      and(eq(programMasks.teamId, masks.teamId), eq(programMasks.maskId, masks.id)),
    )
    .where(and(eq(masks.teamId, teamId), eq(programMasks.programId, programId)))
    .orderBy(masks.id)
    .for("share", { of: masks });
}

/**
 * The revision in force and, while its readings are still being made, the newest one: what is
 * stored meanwhile is held against both.
 */
export const isRevisionToRead = () => sql`(
  ${maskRevisions.revision} = (
    select max(r.revision) from mask_revisions r
    where r.team_id = ${maskRevisions.teamId} and r.mask_id = ${maskRevisions.maskId})
  or ${maskRevisions.revision} = (
    select max(r.revision) from mask_revisions r
    where r.team_id = ${maskRevisions.teamId} and r.mask_id = ${maskRevisions.maskId}
      and r.in_force_at is not null))`;

/** The masks of a program in the revisions that a sweep is held against; they stay these for now. */
export async function listProgramMasks(
  tx: Transaction,
  teamId: string,
  programId: string,
): Promise<(MaskToHold & { isInForce: boolean })[]> {
  await holdProgramMasks(tx, teamId, programId);
  return tx
    .select({
      maskId: masks.id,
      revisionId: maskRevisions.id,
      content: maskRevisions.content,
      restated: programMasks.restateDistance,
      isInForce: sql<boolean>`${maskRevisions.inForceAt} is not null`,
    })
    .from(programMasks)
    .innerJoin(masks, and(eq(masks.teamId, programMasks.teamId), eq(masks.id, programMasks.maskId)))
    .innerJoin(
      maskRevisions,
      and(
        eq(maskRevisions.teamId, masks.teamId),
        eq(maskRevisions.maskId, masks.id),
        isRevisionToRead(),
      ),
    )
    .where(and(eq(programMasks.teamId, teamId), eq(programMasks.programId, programId)))
    .orderBy(masks.id, asc(maskRevisions.revision));
}
