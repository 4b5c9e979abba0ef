import { and, eq } from "drizzle-orm";
import { sweeps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { completeReadings } from "./complete-readings";
import { sweepIdSchema } from "./schemas";

/** Fetches a sweep back; whether it counts for the trend is decided anew. */
export async function restoreSweep(ctx: Context, input: unknown): Promise<{ sweepId: string }> {
  requirePermission(ctx, "sweep.write");
  const { sweepId } = parseInput(sweepIdSchema, input);
  return change(ctx, async (tx, audit) => {
    const [row] = await tx
      .update(sweeps)
      .set({ archivedAt: null })
      .where(and(eq(sweeps.teamId, ctx.teamId), eq(sweeps.id, sweepId)))
      .returning({ id: sweeps.id });
    if (!row) throw new CommandError("not-found", "This sweep does not exist.");
    // Masks may have come or changed while it lay aside.
    await completeReadings(tx, ctx.teamId, { sweepId });
    await audit({ action: "sweep.restore", subjectType: "sweep", subjectId: sweepId });
    return { sweepId };
  });
}
