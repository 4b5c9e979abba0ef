import { and, eq } from "drizzle-orm";
import { programs } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, isDuplicate, parseInput, requirePermission } from "../run";
import { changedFields } from "./changed-fields";
import { lockOpenProgram } from "./find-open";
import { editProgramSchema } from "./schemas";

export async function editProgram(ctx: Context, input: unknown): Promise<{ programId: string }> {
  requirePermission(ctx, "program.write");
  const { programId, ...values } = parseInput(editProgramSchema, input);
  try {
    return await change(ctx, async (tx, audit) => {
      const before = await lockOpenProgram(ctx, tx, programId);
      await tx
        .update(programs)
        .set(values)
        .where(and(eq(programs.teamId, ctx.teamId), eq(programs.id, programId)));
      await audit({
        action: "program.edit",
        subjectType: "program",
        subjectId: programId,
        detail: changedFields(before, values),
      });
      return { programId };
    });
  } catch (error) {
    if (!isDuplicate(error, "programs_name")) throw error;
    throw new CommandError("conflict", "A program of this name exists, maybe an archived one.", {
      name: "Choose another name.",
    });
  }
}
