import { inTeam } from "@/db/client";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";
import type { LadderDetail } from "./load-ladder-steps";
import { loadLadderSteps } from "./load-ladder-steps";

/** A ladder with the deltas of its steps; null when the team has none of this id. */
export async function readLadder(ctx: Context, ladderId: string): Promise<LadderDetail | null> {
  requirePermission(ctx, "sweep.read");
  if (!isId(ladderId)) return null;
  return inTeam(ctx.db, ctx.teamId, (tx) => loadLadderSteps(tx, ctx.teamId, ladderId));
}
