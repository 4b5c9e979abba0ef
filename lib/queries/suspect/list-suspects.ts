import { and, asc, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { programs } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import type { SuspectState } from "@/lib/core/reading/suspect-state";
import { isId } from "../is-id";
import { changeSinceFirst } from "./change-since-first";
import type { FollowedSuspect } from "./load-followed";
import { loadFollowed, newestSwept } from "./load-followed";

export interface SuspectFilter {
  state: SuspectState | null;
  /** A member's id, "nobody", or null for everybody. */
  owner: string | null;
  fromHz: number | null;
  toHz: number | null;
}

function isWanted(suspect: FollowedSuspect, filter: SuspectFilter): boolean {
  const { state, owner, fromHz, toHz } = filter;
  return (
    (state === null || suspect.state === state) &&
    (owner === null ||
      (owner === "nobody" ? suspect.ownerId === null : suspect.ownerId === owner)) &&
    (fromHz === null || suspect.frequencyHz >= fromHz) &&
    (toHz === null || suspect.frequencyHz <= toHz)
  );
}

/** Seen suspects by margin, worst first; then those not seen, then those that nothing tells of. */
function byWorst(a: FollowedSuspect, b: FollowedSuspect): number {
  const rank = (suspect: FollowedSuspect) => {
    const newest = newestSwept(suspect);
    return newest === null ? 2 : newest.kind === "seen" ? 0 : 1;
  };
  const margin = (suspect: FollowedSuspect) => newestSwept(suspect)?.best?.marginDb ?? 1e9;
  return rank(a) - rank(b) || margin(a) - margin(b) || a.number - b.number;
}

const summarize = (suspect: FollowedSuspect) => ({
  ...suspect,
  newest: newestSwept(suspect),
  firstSeen: suspect.builds.find((build) => build.kind === "seen") ?? null,
  lastSeen: suspect.builds.findLast((build) => build.kind === "seen") ?? null,
  change: changeSinceFirst(suspect.builds),
});

export type SuspectSummary = ReturnType<typeof summarize>;

/** A program with the suspects that it follows, worst first; null when there is no such program. */
export async function listSuspects(ctx: Context, programId: string, filter: SuspectFilter) {
  requirePermission(ctx, "sweep.read");
  if (!isId(programId)) return null;
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const [program] = await tx
      .select({ id: programs.id, name: programs.name, archivedAt: programs.archivedAt })
      .from(programs)
      .where(and(eq(programs.teamId, ctx.teamId), eq(programs.id, programId)));
    if (!program) return null;
    const followed = await loadFollowed(tx, ctx.teamId, programId);
    return {
      program,
      total: followed.length,
      open: followed.filter((suspect) => suspect.state === "open").length,
      owners: [
        ...new Map(
          followed.flatMap(({ ownerId, ownerName }) =>
            ownerId === null || ownerName === null ? [] : [[ownerId, ownerName] as const],
          ),
        ),
      ].map(([id, name]) => ({ id, name })),
      suspects: followed
        .filter((suspect) => isWanted(suspect, filter))
        .sort(byWorst)
        .map(summarize),
    };
  });
}

/** What a program follows and has not settled yet, the worst margin first. */
export async function listOpenSuspects(ctx: Context, programId: string): Promise<SuspectSummary[]> {
  const filter = { state: "open" as const, owner: null, fromHz: null, toHz: null };
  return (await listSuspects(ctx, programId, filter))?.suspects ?? [];
}

/** Programs to look for suspects in, by name. */
export async function listSuspectPrograms(ctx: Context) {
  requirePermission(ctx, "sweep.read");
  return inTeam(ctx.db, ctx.teamId, (tx) =>
    tx
      .select({ id: programs.id, name: programs.name, archivedAt: programs.archivedAt })
      .from(programs)
      .where(eq(programs.teamId, ctx.teamId))
      .orderBy(asc(programs.name)),
  );
}
