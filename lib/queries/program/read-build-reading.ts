import { and, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { sweeps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";
import type { CombinedDetail } from "../sweep/load-combined";
import { loadCombined } from "../sweep/load-combined";

/** The line of record of a build held against each mask of its program as one reading. */
export async function readBuildReading(ctx: Context, buildId: string): Promise<CombinedDetail[]> {
  requirePermission(ctx, "sweep.read");
  if (!isId(buildId)) return [];
  return inTeam(ctx.db, ctx.teamId, (tx) =>
    loadCombined(tx, ctx.teamId, and(eq(sweeps.buildId, buildId), eq(sweeps.onRecord, true))),
  );
}
