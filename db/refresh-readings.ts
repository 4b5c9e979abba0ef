import { and, asc, eq, lt } from "drizzle-orm";
import { completeReadings } from "@/lib/commands/sweep/complete-readings";
import { ENGINE_VERSION } from "@/lib/core/reading/read-together";
import { isNewestRevision } from "@/lib/queries/sweep/newest-revision";
import type { Database } from "./client";
import { programs, readings, teams } from "./schema";

/**
 * Makes the readings in force anew that an older engine made, a team at a time. Only the owner
 * may: to the app a reading never changes. An issued report keeps what it said.
 */
export async function refreshReadings(owner: Database): Promise<void> {
  for (const team of await owner.select({ id: teams.id }).from(teams).orderBy(asc(teams.id))) {
    await owner.transaction(async (tx) => {
      const old = await tx
        .delete(readings)
        .where(
          and(
            eq(readings.teamId, team.id),
            lt(readings.engineVersion, ENGINE_VERSION),
            isNewestRevision(),
          ),
        )
        .returning({ id: readings.id });
      if (old.length === 0) return;
      const own = await tx
        .select({ id: programs.id })
        .from(programs)
        .where(eq(programs.teamId, team.id))
        .orderBy(asc(programs.id));
      for (const program of own) await completeReadings(tx, team.id, { programId: program.id });
    });
  }
}
