import { and, eq, inArray, isNull, ne } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { builds, ladders, reports, sweeps } from "@/db/schema";
import { CommandError } from "../result";

interface Selection {
  sweepIds: string[];
  ladderId: string | null;
  replacesId: string | null;
}

/** Refuses sweeps, a ladder or a replaced report that do not belong to the report's build. */
export async function checkSelection(
  tx: Transaction,
  teamId: string,
  buildId: string,
  selection: Selection,
): Promise<void> {
  const found = await tx
    .select({ id: sweeps.id })
    .from(sweeps)
    .where(
      and(
        eq(sweeps.teamId, teamId),
        eq(sweeps.buildId, buildId),
        inArray(sweeps.id, selection.sweepIds),
        isNull(sweeps.archivedAt),
      ),
    );
  if (found.length < selection.sweepIds.length) {
    throw new CommandError("invalid", "A chosen sweep is archived or belongs to another build.", {
      sweepIds: "A chosen sweep is archived or belongs to another build.",
    });
  }
  if (selection.ladderId !== null) {
    const [ladder] = await tx
      .select({ id: ladders.id })
      .from(ladders)
      .where(
        and(
          eq(ladders.teamId, teamId),
          eq(ladders.id, selection.ladderId),
          eq(ladders.buildId, buildId),
          isNull(ladders.archivedAt),
        ),
      );
    if (!ladder) {
      throw new CommandError("invalid", "Choose a ladder of this build.", {
        ladderId: "Choose a ladder of this build.",
      });
    }
  }
  if (selection.replacesId === null) return;
  const own = tx
    .select({ programId: builds.programId })
    .from(builds)
    .where(and(eq(builds.teamId, teamId), eq(builds.id, buildId)));
  const [replaced] = await tx
    .select({ id: reports.id })
    .from(reports)
    .innerJoin(builds, and(eq(builds.teamId, reports.teamId), eq(builds.id, reports.buildId)))
    .where(
      and(
        eq(reports.teamId, teamId),
        eq(reports.id, selection.replacesId),
        ne(reports.state, "draft"),
        inArray(builds.programId, own),
      ),
    );
  if (!replaced) {
    throw new CommandError("invalid", "Choose an issued report of the same program.", {
      replacesId: "Choose an issued report of the same program.",
    });
  }
}
