import { and, eq, isNotNull } from "drizzle-orm";
import { programs } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { programRefSchema } from "./schemas";

/** Brings an archived program back into the lists as it was. */
export async function restoreProgram(ctx: Context, input: unknown): Promise<{ programId: string }> {
  requirePermission(ctx, "program.write");
  const { programId } = parseInput(programRefSchema, input);
  return change(ctx, async (tx, audit) => {
    const [row] = await tx
      .update(programs)
      .set({ archivedAt: null })
      .where(
        and(
          eq(programs.teamId, ctx.teamId),
          eq(programs.id, programId),
          isNotNull(programs.archivedAt),
        ),
      )
      .returning({ name: programs.name });
    if (!row) {
      throw new CommandError("not-found", "This program does not exist or is not archived.");
    }
    await audit({
      action: "program.restore",
      subjectType: "program",
      subjectId: programId,
      detail: { name: row.name },
    });
    return { programId };
  });
}
