import { and, eq } from "drizzle-orm";
import { alias } from "drizzle-orm/pg-core";
import { inTeam } from "@/db/client";
import { benchChecks, benches, signalPathRevisions, users } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import { checkCautions } from "@/lib/core/bench/compare-check-cautions";
import { isId } from "../is-id";

/** One check of a bench with its lines; null when the bench has no such check. */
export async function readBenchCheck(ctx: Context, benchId: string, checkId: string) {
  requirePermission(ctx, "bench.read");
  if (!isId(benchId) || !isId(checkId)) return null;
  const { teamId } = ctx;
  const reference = alias(benchChecks, "reference");
  const referencePath = alias(signalPathRevisions, "reference_path");
  const [row] = await inTeam(ctx.db, teamId, (tx) =>
    tx
      .select({
        id: benchChecks.id,
        bench: { id: benches.id, name: benches.name, toleranceDb: benches.checkToleranceDb },
        measuredOn: benchChecks.measuredOn,
        createdAt: benchChecks.createdAt,
        source: benchChecks.source,
        isReference: benchChecks.isReference,
        driftMeanDb: benchChecks.driftMeanDb,
        driftWorstDb: benchChecks.driftWorstDb,
        content: benchChecks.content,
        fileName: benchChecks.fileName,
        notes: benchChecks.notes,
        checkedBy: users.name,
        archivedAt: benchChecks.archivedAt,
        pathRevision: signalPathRevisions.revision,
        reference: {
          id: reference.id,
          measuredOn: reference.measuredOn,
          archivedAt: reference.archivedAt,
          content: reference.content,
        },
        referencePathRevision: referencePath.revision,
      })
      .from(benchChecks)
      .innerJoin(
        benches,
        and(eq(benches.teamId, benchChecks.teamId), eq(benches.id, benchChecks.benchId)),
      )
      .innerJoin(users, eq(users.id, benchChecks.checkedBy))
      .innerJoin(
        signalPathRevisions,
        and(
          eq(signalPathRevisions.teamId, benchChecks.teamId),
          eq(signalPathRevisions.id, benchChecks.signalPathRevisionId),
        ),
      )
      .leftJoin(
        reference,
        and(eq(reference.teamId, benchChecks.teamId), eq(reference.id, benchChecks.referenceId)),
      )
      .leftJoin(
        referencePath,
        and(
          eq(referencePath.teamId, reference.teamId),
          eq(referencePath.id, reference.signalPathRevisionId),
        ),
      )
      .where(
        and(
          eq(benchChecks.teamId, teamId),
          eq(benchChecks.benchId, benchId),
          eq(benchChecks.id, checkId),
        ),
      ),
  );
  if (!row) return null;
  const { reference: against, referencePathRevision, ...check } = row;
  if (!against || referencePathRevision === null)
    return { ...check, reference: null, cautions: [] };
  const cautions = checkCautions(
    { ...check.content, pathRevision: check.pathRevision },
    { ...against.content, pathRevision: referencePathRevision },
  );
  const { id, measuredOn, archivedAt } = against;
  return { ...check, reference: { id, measuredOn, archived: archivedAt !== null }, cautions };
}
