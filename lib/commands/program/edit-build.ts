import { and, eq } from "drizzle-orm";
import { builds } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, isDuplicate, parseInput, requirePermission } from "../run";
import { changedFields } from "./changed-fields";
import { lockOpenBuild } from "./find-open";
import { editBuildSchema } from "./schemas";

export async function editBuild(ctx: Context, input: unknown): Promise<{ buildId: string }> {
  requirePermission(ctx, "program.write");
  const { buildId, ...values } = parseInput(editBuildSchema, input);
  try {
    return await change(ctx, async (tx, audit) => {
      const before = await lockOpenBuild(ctx, tx, buildId);
      await tx
        .update(builds)
        .set(values)
        .where(and(eq(builds.teamId, ctx.teamId), eq(builds.id, buildId)));
      await audit({
        action: "build.edit",
        subjectType: "build",
        subjectId: buildId,
        detail: changedFields(before, values),
      });
      return { buildId };
    });
  } catch (error) {
    if (!isDuplicate(error, "builds_name")) throw error;
    throw new CommandError(
      "conflict",
      "This program has a build of this name, maybe an archived one.",
      { name: "Choose another name." },
    );
  }
}
