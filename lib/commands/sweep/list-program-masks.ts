import { and, desc, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { maskRevisions, masks, programMasks } from "@/db/schema";
import type { MaskToHold } from "./store-reading";

/** The masks of a program, each in its newest revision. */
export function listProgramMasks(
  tx: Transaction,
  teamId: string,
  programId: string,
): Promise<MaskToHold[]> {
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
