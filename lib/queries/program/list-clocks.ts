import { and, asc, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { clocks } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";

export interface ClockRow {
  name: string;
  frequencyHz: number;
  tolerancePpm: number | null;
}

/** Known clocks of one build by frequency. */
export async function listClocks(ctx: Context, buildId: string): Promise<ClockRow[]> {
  requirePermission(ctx, "program.read");
  return inTeam(ctx.db, ctx.teamId, (tx) =>
    tx
      .select({
        name: clocks.name,
        frequencyHz: clocks.frequencyHz,
        tolerancePpm: clocks.tolerancePpm,
      })
      .from(clocks)
      .where(and(eq(clocks.teamId, ctx.teamId), eq(clocks.buildId, buildId)))
      .orderBy(asc(clocks.frequencyHz), asc(clocks.name)),
  );
}
