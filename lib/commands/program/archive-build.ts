import { and, eq, sql } from "drizzle-orm";
import { builds } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockBuild } from "./find-open";
import { buildRefSchema } from "./schemas";

/** Takes a build out of the lists; its sweeps stay and it keeps its place in the order. */
export async function archiveBuild(ctx: Context, input: unknown): Promise<{ buildId: string }> {
  requirePermission(ctx, "program.write");
  const { buildId } = parseInput(buildRefSchema, input);
  return change(ctx, async (tx, audit) => {
    const build = await lockBuild(ctx, tx, buildId);
    if (build.archivedAt) throw new CommandError("conflict", "This build is archived already.");
    await tx
      .update(builds)
      .set({ archivedAt: sql`now()` })
      .where(and(eq(builds.teamId, ctx.teamId), eq(builds.id, buildId)));
    await audit({
      action: "build.archive",
      subjectType: "build",
      subjectId: buildId,
      detail: { name: build.name },
    });
    return { buildId };
  });
}
