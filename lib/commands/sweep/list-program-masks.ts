import { and, desc, eq } from "drizzle-orm";
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

/** The masks of a program, each in its newest revision, which stays the newest for now. */
export async function listProgramMasks(
  tx: Transaction,
  teamId: string,
  programId: string,
): Promise<MaskToHold[]> {
  await holdProgramMasks(tx, teamId, programId);
  return tx
    .selectDistinctOn([masks.id], {
      maskId: masks.id,
      revisionId: maskRevisions.id,
      content: maskRevisions.content,
    })
    .from(programMasks)
    .innerJoin(masks, and(eq(masks.teamId, programMasks.teamId), eq(masks.id, programMasks.maskId)))
    .innerJoin(
      maskRevisions,
      and(eq(maskRevisions.teamId, masks.teamId), eq(maskRevisions.maskId, masks.id)),
    )
    .where(and(eq(programMasks.teamId, teamId), eq(programMasks.programId, programId)))
    .orderBy(masks.id, desc(maskRevisions.revision));
}
