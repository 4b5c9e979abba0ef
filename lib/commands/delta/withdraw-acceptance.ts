import { and, eq } from "drizzle-orm";
import { acceptedMismatches } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { acceptanceIdSchema } from "./schemas";

/** Takes an accepted mismatch back: the two sweeps are not comparable any more. It stays on record. */
export async function withdrawAcceptance(
  ctx: Context,
  input: unknown,
): Promise<{ acceptanceId: string }> {
  requirePermission(ctx, "sweep.write");
  const { acceptanceId } = parseInput(acceptanceIdSchema, input);
  const { teamId, userId } = ctx;
  return change(ctx, async (tx, audit) => {
    const own = and(eq(acceptedMismatches.teamId, teamId), eq(acceptedMismatches.id, acceptanceId));
    const [found] = await tx.select().from(acceptedMismatches).where(own).for("update");
    if (!found) throw new CommandError("not-found", "This acceptance does not exist.");
    if (found.withdrawnAt)
      throw new CommandError("conflict", "This acceptance was withdrawn already.");
    await tx
      .update(acceptedMismatches)
      .set({ withdrawnBy: userId, withdrawnAt: new Date() })
      .where(own);
    await audit({
      action: "sweep.withdraw-acceptance",
      subjectType: "sweep",
      subjectId: found.afterSweepId,
      detail: {
        acceptance: acceptanceId,
        before: found.beforeSweepId,
        after: found.afterSweepId,
        fields: found.fields,
      },
    });
    return { acceptanceId };
  });
}
