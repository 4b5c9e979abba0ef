import { and, eq } from "drizzle-orm";
import { benches } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockBench } from "./lock-bench";
import { benchIdSchema } from "./schemas";

/** Puts an archived bench back on the list. */
export async function restoreBench(ctx: Context, input: unknown): Promise<{ benchId: string }> {
  requirePermission(ctx, "bench.write");
  const { benchId } = parseInput(benchIdSchema, input);
  return change(ctx, async (tx, audit) => {
    const bench = await lockBench(tx, ctx, benchId);
    if (bench.archivedAt === null)
      throw new CommandError("conflict", "This bench is not archived.");
    await tx
      .update(benches)
      .set({ archivedAt: null })
      .where(and(eq(benches.teamId, ctx.teamId), eq(benches.id, benchId)));
    await audit({ action: "bench.restore", subjectType: "bench", subjectId: benchId });
    return { benchId };
  });
}
