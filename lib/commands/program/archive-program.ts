import { and, eq, isNull, sql } from "drizzle-orm";
import { programs } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { programRefSchema } from "./schemas";

/** Takes a program out of the lists; everything it holds stays and can be restored. */
export async function archiveProgram(ctx: Context, input: unknown): Promise<{ programId: string }> {
  requirePermission(ctx, "program.write");
  const { programId } = parseInput(programRefSchema, input);
  return change(ctx, async (tx, audit) => {
    const [row] = await tx
      .update(programs)
      .set({ archivedAt: sql`now()` })
      .where(
        and(
          eq(programs.teamId, ctx.teamId),
          eq(programs.id, programId),
          isNull(programs.archivedAt),
        ),
      )
      .returning({ name: programs.name });
    if (!row) {
      throw new CommandError("not-found", "This program does not exist or is archived already.");
    }
    await audit({
      action: "program.archive",
      subjectType: "program",
      subjectId: programId,
      detail: { name: row.name },
    });
    return { programId };
  });
}
