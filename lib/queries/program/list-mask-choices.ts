import { and, asc, desc, eq, isNotNull, isNull, or, sql } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { maskRevisions, masks, programMasks } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import type { Provenance } from "@/lib/core/mask/mask";
import { requirePermission } from "@/lib/commands/run";

export interface MaskChoice {
  id: string;
  title: string;
  document: string;
  clause: string;
  edition: string;
  provenance: Provenance;
  isChosen: boolean;
  /** Only a mask that the program still holds from before is listed though archived. */
  isArchived: boolean;
}

/** Masks that a program can be held against, as their newest revision in force names them, by title. */
export async function listMaskChoices(ctx: Context, programId: string): Promise<MaskChoice[]> {
  requirePermission(ctx, "mask.read");
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const content = maskRevisions.content;
    const newest = tx
      .selectDistinctOn([maskRevisions.maskId], {
        maskId: maskRevisions.maskId,
        title: sql<string>`${content}->>'title'`.as("title"),
        document: sql<string>`${content}->>'document'`.as("document"),
        clause: sql<string>`${content}->>'clause'`.as("clause"),
        edition: sql<string>`${content}->>'edition'`.as("edition"),
        provenance: sql<Provenance>`${content}->>'provenance'`.as("provenance"),
      })
      .from(maskRevisions)
      .where(and(eq(maskRevisions.teamId, ctx.teamId), isNotNull(maskRevisions.inForceAt)))
      .orderBy(maskRevisions.maskId, desc(maskRevisions.revision))
      .as("newest");
    return tx
      .select({
        id: masks.id,
        title: newest.title,
        document: newest.document,
        clause: newest.clause,
        edition: newest.edition,
        provenance: newest.provenance,
        isChosen: sql<boolean>`${programMasks.maskId} is not null`,
        isArchived: sql<boolean>`${masks.archivedAt} is not null`,
      })
      .from(masks)
      .innerJoin(newest, eq(newest.maskId, masks.id))
      .leftJoin(
        programMasks,
        and(
          eq(programMasks.teamId, masks.teamId),
          eq(programMasks.maskId, masks.id),
          eq(programMasks.programId, programId),
        ),
      )
      .where(
        and(
          eq(masks.teamId, ctx.teamId),
          or(isNull(masks.archivedAt), isNotNull(programMasks.maskId)),
        ),
      )
      .orderBy(asc(newest.title));
  });
}
