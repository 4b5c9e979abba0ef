import { programs } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, isDuplicate, parseInput, requirePermission } from "../run";
import { createProgramSchema } from "./schemas";

export async function createProgram(ctx: Context, input: unknown): Promise<{ programId: string }> {
  requirePermission(ctx, "program.write");
  const values = parseInput(createProgramSchema, input);
  try {
    return await change(ctx, async (tx, audit) => {
      const [row] = await tx
        .insert(programs)
        .values({ teamId: ctx.teamId, ...values })
        .returning({ id: programs.id });
      if (!row) throw new Error("The program was not stored.");
      await audit({
        action: "program.create",
        subjectType: "program",
        subjectId: row.id,
        detail: values,
      });
      return { programId: row.id };
    });
  } catch (error) {
    if (!isDuplicate(error, "programs_name")) throw error;
    throw new CommandError("conflict", "A program of this name exists already.", {
      name: "Choose another name.",
    });
  }
}
