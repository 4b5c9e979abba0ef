import { inTeam } from "@/db/client";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";
import type { SweepDetail } from "./load-sweep-detail";
import { loadSweepDetail } from "./load-sweep-detail";

/** One sweep with its traces and its readings; null when the team has none of this id. */
export async function readSweepDetail(ctx: Context, sweepId: string): Promise<SweepDetail | null> {
  requirePermission(ctx, "sweep.read");
  if (!isId(sweepId)) return null;
  return inTeam(ctx.db, ctx.teamId, (tx) => loadSweepDetail(tx, ctx.teamId, sweepId));
}
