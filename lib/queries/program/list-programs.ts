import { and, asc, eq, isNull } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { milestones, programs } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import type { Standing } from "@/lib/core/reading/reading";
import { worstOf } from "../sweep/worst-of";
import type { MaskStanding } from "../sweep/standings";
import { loadProgramTrends, newestStanding, unreachedMasks } from "./load-standings";
import type { ProgramWeek } from "./load-week";
import { loadWeek } from "./load-week";

export interface ProgramRow {
  id: string;
  name: string;
  description: string;
  targetMarginDb: number;
  builds: number;
  /** Of the newest build that has sweeps on record; null without one. */
  now:
    | (MaskStanding & {
        buildId: string;
        buildName: string;
        /** Titles of the program's masks that no sweep on record of this build reaches. */
        missing: string[];
      })
    | null;
  /** Worst margin of each build that has one, oldest first. */
  trend: { buildName: string; marginDb: number; standing: Standing }[];
  /** The next one due on the given day or later. */
  nextMilestone: { name: string; dueOn: string; requiredMarginDb: number | null } | null;
  /** What came in the seven days up to the given day. */
  week: ProgramWeek;
}

/** How much room a program has against what it aims at; below zero it is short. */
function room(program: ProgramRow): number {
  const needed = Math.max(
    program.targetMarginDb,
    program.nextMilestone?.requiredMarginDb ?? Number.NEGATIVE_INFINITY,
  );
  return (program.now?.marginDb ?? 0) - needed;
}

/**
 * First those with a level over their mask, whatever they aim at. Not knowing where a program
 * stands is a risk of its own: it comes next. The rest go by the room they have.
 */
function group({ now }: ProgramRow): number {
  if (!now || now.standing === "undecided") return 1;
  return now.standing === "over" ? 0 : 2;
}

/** Programs of the team that are not archived, the riskiest first. `today` is an ISO date. */
export async function listPrograms(ctx: Context, today: string): Promise<ProgramRow[]> {
  requirePermission(ctx, "program.read");
  const { teamId } = ctx;
  const rows = await inTeam(ctx.db, teamId, async (tx) => {
    const found = await tx
      .select({
        id: programs.id,
        name: programs.name,
        description: programs.description,
        targetMarginDb: programs.targetMarginDb,
      })
      .from(programs)
      .where(and(eq(programs.teamId, teamId), isNull(programs.archivedAt)))
      .orderBy(asc(programs.name));
    const due = await tx
      .select()
      .from(milestones)
      .where(eq(milestones.teamId, teamId))
      .orderBy(asc(milestones.dueOn), asc(milestones.name));
    const trends = await loadProgramTrends(
      tx,
      teamId,
      found.map((program) => program.id),
    );
    const weeks = await loadWeek(tx, teamId, today);
    return found.map((program, i): ProgramRow => {
      const trend = trends[i] ?? { programId: program.id, masks: [], builds: [] };
      const newest = newestStanding(trend);
      const next = due.find((m) => m.programId === program.id && m.dueOn >= today);
      return {
        ...program,
        builds: trend.builds.length,
        now: newest
          ? {
              ...newest.worst,
              buildId: newest.build.id,
              buildName: newest.build.name,
              missing: unreachedMasks(trend, newest.build),
            }
          : null,
        trend: trend.builds.flatMap((build) => {
          const worst = worstOf(build.standings);
          if (!worst) return [];
          return [{ buildName: build.name, marginDb: worst.marginDb, standing: worst.standing }];
        }),
        nextMilestone: next
          ? { name: next.name, dueOn: next.dueOn, requiredMarginDb: next.requiredMarginDb }
          : null,
        week: weeks.get(program.id) ?? { sweeps: 0, reports: [] },
      };
    });
  });
  return rows.sort(
    (a, b) => group(a) - group(b) || room(a) - room(b) || a.name.localeCompare(b.name, "en"),
  );
}
