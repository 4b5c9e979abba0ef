import { and, eq } from "drizzle-orm";
import { benchChecks } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { benchCheckIdSchema } from "./schemas";

/**
 * Puts a check aside: it leaves the drift chart and says nothing about its day any more. Checks
 * that were compared with an archived reference keep what they found.
 */
export async function archiveBenchCheck(
  ctx: Context,
  input: unknown,
): Promise<{ checkId: string; benchId: string }> {
  requirePermission(ctx, "bench.write");
  const { checkId } = parseInput(benchCheckIdSchema, input);
  return change(ctx, async (tx, audit) => {
    const own = and(eq(benchChecks.teamId, ctx.teamId), eq(benchChecks.id, checkId));
    const [check] = await tx
      .select({
        benchId: benchChecks.benchId,
        source: benchChecks.source,
        measuredOn: benchChecks.measuredOn,
        archivedAt: benchChecks.archivedAt,
      })
      .from(benchChecks)
      .where(own)
      .for("update");
    if (!check) throw new CommandError("not-found", "This bench check does not exist.");
    if (check.archivedAt !== null)
      throw new CommandError("conflict", "This bench check is archived already.");
    await tx.update(benchChecks).set({ archivedAt: new Date() }).where(own);
    await audit({
      action: "bench-check.archive",
      subjectType: "bench-check",
      subjectId: checkId,
      detail: { name: `${check.source} of ${check.measuredOn}`, benchId: check.benchId },
    });
    return { checkId, benchId: check.benchId };
  });
}
