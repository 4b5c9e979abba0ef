import { and, eq } from "drizzle-orm";
import { builds } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockBuild } from "./find-open";
import { buildRefSchema } from "./schemas";

/** Brings an archived build back; its program must not be archived itself. */
export async function restoreBuild(ctx: Context, input: unknown): Promise<{ buildId: string }> {
  requirePermission(ctx, "program.write");
  const { buildId } = parseInput(buildRefSchema, input);
  return change(ctx, async (tx, audit) => {
    const build = await lockBuild(ctx, tx, buildId);
    if (!build.archivedAt) throw new CommandError("conflict", "This build is not archived.");
    await tx
      .update(builds)
      .set({ archivedAt: null })
      .where(and(eq(builds.teamId, ctx.teamId), eq(builds.id, buildId)));
    await audit({
      action: "build.restore",
      subjectType: "build",
      subjectId: buildId,
      detail: { name: build.name },
    });
    return { buildId };
  });
}
