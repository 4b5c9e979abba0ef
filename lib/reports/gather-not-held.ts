import { and, asc, desc, eq, isNotNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { builds, maskRevisions, masks, programMasks } from "@/db/schema";
import type { SweepDetail } from "@/lib/queries/sweep/load-sweep-detail";
import { loadMaskNotes } from "./mask-notes";
import type { SnapshotCombined, SnapshotNotHeld } from "./report-content";

/** The program's masks in force under which no sweep of the report has a margin. */
export async function gatherNotHeld(
  tx: Transaction,
  teamId: string,
  buildId: string,
  details: readonly SweepDetail[],
  combined: readonly SnapshotCombined[],
): Promise<SnapshotNotHeld[]> {
  const named = await tx
    .selectDistinctOn([masks.key], {
      maskId: masks.id,
      maskRevisionId: maskRevisions.id,
      maskRevision: maskRevisions.revision,
      content: maskRevisions.content,
    })
    .from(builds)
    .innerJoin(
      programMasks,
      and(eq(programMasks.teamId, builds.teamId), eq(programMasks.programId, builds.programId)),
    )
    .innerJoin(masks, and(eq(masks.teamId, programMasks.teamId), eq(masks.id, programMasks.maskId)))
    .innerJoin(
      maskRevisions,
      and(
        eq(maskRevisions.teamId, masks.teamId),
        eq(maskRevisions.maskId, masks.id),
        isNotNull(maskRevisions.inForceAt),
      ),
    )
    .where(and(eq(builds.teamId, teamId), eq(builds.id, buildId)))
    .orderBy(asc(masks.key), desc(maskRevisions.revision));
  const held = new Set(combined.map(({ maskRevisionId }) => maskRevisionId));
  const open = named.filter(({ maskRevisionId }) => !held.has(maskRevisionId));
  const notes = await loadMaskNotes(
    tx,
    teamId,
    open.map(({ maskRevisionId }) => maskRevisionId),
  );
  return open.map(({ maskId, maskRevisionId, maskRevision, content }) => ({
    title: content.title,
    maskRevision,
    provenance: content.provenance,
    confirmation: notes.get(maskRevisionId) ?? null,
    reasons: reasonsOf(maskId, details),
  }));
}

function reasonsOf(maskId: string, details: readonly SweepDetail[]): string[] {
  const reasons = details.flatMap(({ name, purpose, readings }) => {
    const own = readings.find((reading) => reading.maskId === maskId)?.reading.notComparable;
    return purpose === "product" && own ? [`${name}: ${own}`] : [];
  });
  return reasons.length > 0 ? reasons : ["No product sweep of this report reaches it."];
}
