import { and, asc, desc, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { maskRevisions, masks } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import type { Provenance } from "@/lib/core/mask/mask";
import type { Detector, Port } from "@/lib/core/sweep/settings";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { requirePermission } from "@/lib/commands/run";

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
  /** The current revision, as readings name it. */
  revisionId: string;
  origin: "shipped" | "team";
  archived: boolean;
}

/** Every mask of the team with its current revision, archived ones too, by title. */
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
      })
      .from(masks)
      .innerJoin(
        maskRevisions,
        and(eq(maskRevisions.teamId, masks.teamId), eq(maskRevisions.maskId, masks.id)),
      )
      .where(eq(masks.teamId, ctx.teamId))
      .orderBy(asc(masks.key), desc(maskRevisions.revision));
    const list = rows.map(({ content, archivedAt, ...row }): MaskRow => {
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
      };
    });
    return list.sort((a, b) => (a.title < b.title ? -1 : a.title > b.title ? 1 : 0));
  });
}
