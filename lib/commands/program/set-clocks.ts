import { and, asc, eq } from "drizzle-orm";
import { clocks } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { change, parseInput, requirePermission } from "../run";
import { lockOpenBuild } from "./find-open";
import { setClocksSchema } from "./schemas";

/** Replaces the build's known clocks by the given list, all of them or none. */
export async function setClocks(ctx: Context, input: unknown): Promise<{ count: number }> {
  requirePermission(ctx, "program.write");
  const { buildId, clocks: wanted } = parseInput(setClocksSchema, input);
  return change(ctx, async (tx, audit) => {
    await lockOpenBuild(ctx, tx, buildId);
    const ofBuild = and(eq(clocks.teamId, ctx.teamId), eq(clocks.buildId, buildId));
    const before = await tx
      .select({
        name: clocks.name,
        frequencyHz: clocks.frequencyHz,
        tolerancePpm: clocks.tolerancePpm,
      })
      .from(clocks)
      .where(ofBuild)
      .orderBy(asc(clocks.frequencyHz), asc(clocks.name));
    await tx.delete(clocks).where(ofBuild);
    if (wanted.length > 0) {
      await tx
        .insert(clocks)
        .values(wanted.map((row) => ({ teamId: ctx.teamId, buildId, ...row })));
    }
    await audit({
      action: "build.set-clocks",
      subjectType: "build",
      subjectId: buildId,
      detail: { from: before, to: wanted },
    });
    return { count: wanted.length };
  });
}
