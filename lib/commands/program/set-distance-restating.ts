import { and, eq } from "drizzle-orm";
import { masks, programMasks } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { completeReadings } from "../sweep/complete-readings";
import { lockOpenProgram } from "./find-open";
import { setDistanceRestatingSchema } from "./schemas";

/**
 * Asks for a program's sweeps to be restated to the distance of one of its masks, or takes that
 * back. Never done by itself; every reading made so carries the doubt.
 */
export async function setDistanceRestating(
  ctx: Context,
  input: unknown,
): Promise<{ programId: string; maskId: string; restate: boolean }> {
  requirePermission(ctx, "sweep.write");
  const { programId, maskId, restate } = parseInput(setDistanceRestatingSchema, input);
  const { teamId } = ctx;
  return change(ctx, async (tx, audit) => {
    await lockOpenProgram(ctx, tx, programId);
    const own = and(
      eq(programMasks.teamId, teamId),
      eq(programMasks.programId, programId),
      eq(programMasks.maskId, maskId),
    );
    const [held] = await tx
      .select({ restate: programMasks.restateDistance, key: masks.key })
      .from(programMasks)
      .innerJoin(
        masks,
        and(eq(masks.teamId, programMasks.teamId), eq(masks.id, programMasks.maskId)),
      )
      .where(own)
      // A job that puts a revision in force, or an import, sees it before or after, never between.
      .for("update");
    if (!held) throw new CommandError("not-found", "The program does not name this mask.");
    if (held.restate === restate) {
      const state = restate ? "restated already" : "held as they were taken already";
      throw new CommandError("conflict", `The program's sweeps are ${state}.`);
    }
    await tx.update(programMasks).set({ restateDistance: restate }).where(own);
    await completeReadings(tx, teamId, { programId });
    await audit({
      action: restate ? "program.restate-distance" : "program.hold-as-taken",
      subjectType: "program",
      subjectId: programId,
      detail: { mask: held.key },
    });
    return { programId, maskId, restate };
  });
}
