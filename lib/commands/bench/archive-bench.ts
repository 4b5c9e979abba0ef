import { and, eq } from "drizzle-orm";
import { benches } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockBench } from "./lock-bench";
import { benchIdSchema } from "./schemas";

/** Takes a bench off the list; its sweeps and revisions stay. */
export async function archiveBench(ctx: Context, input: unknown): Promise<{ benchId: string }> {
  requirePermission(ctx, "bench.write");
  const { benchId } = parseInput(benchIdSchema, input);
  return change(ctx, async (tx, audit) => {
    const bench = await lockBench(tx, ctx, benchId);
    if (bench.archivedAt !== null)
      throw new CommandError("conflict", "This bench is archived already.");
    await tx
      .update(benches)
      .set({ archivedAt: new Date() })
      .where(and(eq(benches.teamId, ctx.teamId), eq(benches.id, benchId)));
    await audit({ action: "bench.archive", subjectType: "bench", subjectId: benchId });
    return { benchId };
  });
}
