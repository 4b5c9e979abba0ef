import { and, asc, desc, eq, isNotNull, sql } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { maskRevisions, masks, users } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import type { Provenance } from "@/lib/core/mask/mask";
import type { Detector, Port } from "@/lib/core/sweep/settings";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { requirePermission } from "@/lib/commands/run";
import type { MaskConfirmation } from "./confirmation";
import { confirmationOf } from "./confirmation";

export interface MaskRow {
  id: string;
  key: string;
  title: string;
  port: Port;
  document: string;
  clause: string;
  edition: string;
  provenance: Provenance;
  unit: LevelUnit;
  distanceM: number | null;
  /** Of its lines, each once. */
  detectors: Detector[];
  revision: number;
  /** The revision in force, as readings name it. */
  revisionId: string;
  /** Of the revision in force; null when nobody of the team confirmed it. */
  confirmation: MaskConfirmation | null;
  /** A newer revision that is still being put in force. */
  pendingRevision: number | null;
  origin: "shipped" | "team";
  archived: boolean;
}

/** Every mask of the team with its newest revision in force, archived ones too, by title. */
export async function listMasks(ctx: Context): Promise<MaskRow[]> {
  requirePermission(ctx, "mask.read");
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const rows = await tx
      .selectDistinctOn([masks.key], {
        id: masks.id,
        key: masks.key,
        origin: masks.origin,
        archivedAt: masks.archivedAt,
        revision: maskRevisions.revision,
        revisionId: maskRevisions.id,
        content: maskRevisions.content,
        confirmedByName: users.name,
        confirmedAt: maskRevisions.confirmedAt,
        confirmedCopy: maskRevisions.confirmedCopy,
        newest: sql<number>`(
          select max(r.revision) from mask_revisions r
          where r.team_id = ${masks.teamId} and r.mask_id = ${masks.id})`,
      })
      .from(masks)
      .innerJoin(
        maskRevisions,
        and(
          eq(maskRevisions.teamId, masks.teamId),
          eq(maskRevisions.maskId, masks.id),
          isNotNull(maskRevisions.inForceAt),
        ),
      )
      .leftJoin(users, eq(users.id, maskRevisions.confirmedBy))
      .where(eq(masks.teamId, ctx.teamId))
      .orderBy(asc(masks.key), desc(maskRevisions.revision));
    const list = rows.map((found): MaskRow => {
      const { content, archivedAt, newest, ...more } = found;
      const { confirmedByName, confirmedAt, confirmedCopy, ...row } = more;
      const { title, port, document, clause, edition, provenance, unit, distanceM } = content;
      const detectors = [...new Set(content.lines.map((line) => line.detector))];
      return {
        ...row,
        title,
        port,
        document,
        clause,
        edition,
        provenance,
        unit,
        distanceM,
        detectors,
        archived: archivedAt !== null,
        confirmation: confirmationOf({ confirmedByName, confirmedAt, confirmedCopy }),
        pendingRevision: newest > row.revision ? newest : null,
      };
    });
    return list.sort((a, b) => (a.title < b.title ? -1 : a.title > b.title ? 1 : 0));
  });
}
