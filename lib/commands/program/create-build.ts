import { and, eq, isNull, max } from "drizzle-orm";
import { builds, programs } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, isDuplicate, parseInput, requirePermission } from "../run";
import { createBuildSchema } from "./schemas";

/** Adds a build after the program's newest one; the order of builds is the order of the trend. */
export async function createBuild(ctx: Context, input: unknown): Promise<{ buildId: string }> {
  requirePermission(ctx, "program.write");
  const values = parseInput(createBuildSchema, input);
  try {
    return await change(ctx, async (tx, audit) => {
      // The lock keeps two builds added at once from taking the same place in the order.
      const [program] = await tx
        .select({ id: programs.id })
        .from(programs)
        .where(
          and(
            eq(programs.teamId, ctx.teamId),
            eq(programs.id, values.programId),
            isNull(programs.archivedAt),
          ),
        )
        .for("update");
      if (!program) {
        throw new CommandError("not-found", "This program does not exist or is archived.");
      }
      const [last] = await tx
        .select({ sequence: max(builds.sequence) })
        .from(builds)
        .where(and(eq(builds.teamId, ctx.teamId), eq(builds.programId, program.id)));
      const sequence = (last?.sequence ?? 0) + 1;
      const [row] = await tx
        .insert(builds)
        .values({ teamId: ctx.teamId, sequence, ...values })
        .returning({ id: builds.id });
      if (!row) throw new Error("The build was not stored.");
      await audit({
        action: "build.create",
        subjectType: "build",
        subjectId: row.id,
        detail: { ...values, sequence },
      });
      return { buildId: row.id };
    });
  } catch (error) {
    if (!isDuplicate(error, "builds_name")) throw error;
    throw new CommandError("conflict", "This program has a build of this name already.", {
      name: "Choose another name.",
    });
  }
}
