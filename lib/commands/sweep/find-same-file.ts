import { and, desc, eq, isNull, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { builds, programs, storedFiles, sweeps } from "@/db/schema";

export interface SameFile {
  sweepId: string;
  name: string;
  buildName: string;
  programName: string;
}

/** Sweeps of the team that were made from the same bytes, newest first. */
export function findSameFile(tx: Transaction, teamId: string, sha256: string): Promise<SameFile[]> {
  return tx
    .select({
      sweepId: sweeps.id,
      name: sweeps.name,
      buildName: builds.name,
      programName: programs.name,
    })
    .from(storedFiles)
    .innerJoin(
      sweeps,
      and(eq(sweeps.teamId, storedFiles.teamId), eq(sweeps.fileId, storedFiles.id)),
    )
    .innerJoin(builds, and(eq(builds.teamId, sweeps.teamId), eq(builds.id, sweeps.buildId)))
    .innerJoin(programs, and(eq(programs.teamId, builds.teamId), eq(programs.id, builds.programId)))
    .where(
      and(
        eq(storedFiles.teamId, teamId),
        eq(storedFiles.sha256, sha256),
        isNull(sweeps.archivedAt),
      ),
    )
    .orderBy(desc(sweeps.createdAt));
}

/** Lets one import of the same bytes at a time see whether they are here already. */
export async function holdFile(tx: Transaction, teamId: string, sha256: string): Promise<void> {
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${teamId + sha256}, 0))`);
}
