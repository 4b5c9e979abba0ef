import { and, desc, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { maskRevisions, masks, users } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import type { Mask } from "@/lib/core/mask/mask";
import { requirePermission } from "@/lib/commands/run";
import type { MaskConfirmation } from "./confirmation";
import { confirmationOf } from "./confirmation";

export interface MaskRevision {
  id: string;
  revision: number;
  content: Mask;
  /** How it came to be: shipped with Neap, written by the team, or confirmed by it. */
  source: "shipped" | "team" | "confirmation";
  confirmation: MaskConfirmation | null;
  /** null while the readings of existing sweeps are still being made. */
  inForceAt: Date | null;
  createdAt: Date;
}

export interface MaskDetail {
  id: string;
  key: string;
  origin: "shipped" | "team";
  archivedAt: Date | null;
  /** Newest first. */
  revisions: MaskRevision[];
  /** The newest revision in force: what sweeps are held against. */
  current: MaskRevision;
  /** A newer one whose readings are still being made. */
  pending: MaskRevision | null;
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
    const rows = await tx
      .select({
        id: maskRevisions.id,
        revision: maskRevisions.revision,
        content: maskRevisions.content,
        source: maskRevisions.source,
        confirmedByName: users.name,
        confirmedAt: maskRevisions.confirmedAt,
        confirmedCopy: maskRevisions.confirmedCopy,
        inForceAt: maskRevisions.inForceAt,
        createdAt: maskRevisions.createdAt,
      })
      .from(maskRevisions)
      .leftJoin(users, eq(users.id, maskRevisions.confirmedBy))
      .where(and(eq(maskRevisions.teamId, ctx.teamId), eq(maskRevisions.maskId, maskId)))
      .orderBy(desc(maskRevisions.revision));
    const revisions = rows.map(
      ({ confirmedByName, confirmedAt, confirmedCopy, ...row }): MaskRevision => ({
        ...row,
        confirmation: confirmationOf({ confirmedByName, confirmedAt, confirmedCopy }),
      }),
    );
    const [newest] = revisions;
    if (!newest) throw new Error(`Mask ${maskId} has no revision.`);
    const current = revisions.find((revision) => revision.inForceAt !== null) ?? newest;
    return { ...mask, revisions, current, pending: newest === current ? null : newest };
  });
}
