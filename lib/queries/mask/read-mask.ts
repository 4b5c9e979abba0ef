import { and, desc, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { maskRevisions, masks } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import type { Mask } from "@/lib/core/mask/mask";
import { requirePermission } from "@/lib/commands/run";

export interface MaskRevision {
  id: string;
  revision: number;
  content: Mask;
  createdAt: Date;
}

export interface MaskDetail {
  id: string;
  key: string;
  origin: "shipped" | "team";
  archivedAt: Date | null;
  /** Newest first. */
  revisions: MaskRevision[];
}

/** One mask with all its revisions; null when the team has none of this id. */
export async function readMask(ctx: Context, maskId: string): Promise<MaskDetail | null> {
  requirePermission(ctx, "mask.read");
  if (!/^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i.test(maskId)) return null;
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const [mask] = await tx
      .select({
        id: masks.id,
        key: masks.key,
        origin: masks.origin,
        archivedAt: masks.archivedAt,
      })
      .from(masks)
      .where(and(eq(masks.teamId, ctx.teamId), eq(masks.id, maskId)));
    if (!mask) return null;
    const revisions = await tx
      .select({
        id: maskRevisions.id,
        revision: maskRevisions.revision,
        content: maskRevisions.content,
        createdAt: maskRevisions.createdAt,
      })
      .from(maskRevisions)
      .where(and(eq(maskRevisions.teamId, ctx.teamId), eq(maskRevisions.maskId, maskId)))
      .orderBy(desc(maskRevisions.revision));
    return { ...mask, revisions };
  });
}
