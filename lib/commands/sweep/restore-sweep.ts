import { and, eq } from "drizzle-orm";
import { builds, programs, sweeps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { completeReadings } from "./complete-readings";
import { holdAmbientBesideReadings } from "./hold-ambient";
import { holdProgramMasks } from "./list-program-masks";
import { lockSweep } from "./lock-sweep";
import { sweepIdSchema } from "./schemas";

/** Fetches a sweep back; whether it counts for the trend is decided anew. */
export async function restoreSweep(ctx: Context, input: unknown): Promise<{ sweepId: string }> {
  requirePermission(ctx, "sweep.write");
  const { sweepId } = parseInput(sweepIdSchema, input);
  return change(ctx, async (tx, audit) => {
    const sweep = await lockSweep(tx, ctx.teamId, sweepId);
    if (!sweep.archivedAt) throw new CommandError("conflict", "This sweep is not archived.");
    await tx
      .update(sweeps)
      .set({ archivedAt: null })
      .where(and(eq(sweeps.teamId, ctx.teamId), eq(sweeps.id, sweepId)));
    const [program] = await tx
      .select({ id: programs.id })
      .from(programs)
      .innerJoin(builds, and(eq(builds.teamId, programs.teamId), eq(builds.programId, programs.id)))
      .where(and(eq(builds.teamId, ctx.teamId), eq(builds.id, sweep.buildId)))
      .for("share", { of: programs });
    if (program) await holdProgramMasks(tx, ctx.teamId, program.id);
    // Masks may have come or changed while it lay aside.
    await completeReadings(tx, ctx.teamId, { sweepId });
    if (sweep.purpose === "ambient") await holdAmbientBesideReadings(tx, ctx.teamId, sweepId);
    await audit({ action: "sweep.restore", subjectType: "sweep", subjectId: sweepId });
    return { sweepId };
  });
}
