import { and, eq } from "drizzle-orm";
import { sweeps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockSweep } from "./lock-sweep";
import { sweepIdSchema } from "./schemas";

/** Puts a sweep aside: it leaves lists, deltas and the line of record, and can be fetched back. */
export async function archiveSweep(ctx: Context, input: unknown): Promise<{ sweepId: string }> {
  requirePermission(ctx, "sweep.write");
  const { sweepId } = parseInput(sweepIdSchema, input);
  return change(ctx, async (tx, audit) => {
    const sweep = await lockSweep(tx, ctx.teamId, sweepId);
    if (sweep.archivedAt) throw new CommandError("conflict", "This sweep is archived already.");
    await tx
      .update(sweeps)
      .set({ archivedAt: new Date(), onRecord: false })
      .where(and(eq(sweeps.teamId, ctx.teamId), eq(sweeps.id, sweepId)));
    await audit({ action: "sweep.archive", subjectType: "sweep", subjectId: sweepId });
    return { sweepId };
  });
}
