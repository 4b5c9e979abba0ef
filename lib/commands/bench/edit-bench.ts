import { and, eq } from "drizzle-orm";
import { benches } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, isDuplicate, parseInput, requirePermission } from "../run";
import { requireInstrument } from "./find-instrument";
import { lockOpenBench } from "./lock-bench";
import { editBenchSchema } from "./schemas";

/** Changes what a bench is called and how it stands; its signal path has a command of its own. */
export async function editBench(ctx: Context, input: unknown): Promise<{ benchId: string }> {
  requirePermission(ctx, "bench.write");
  const { benchId, ...values } = parseInput(editBenchSchema, input);
  try {
    return await change(ctx, async (tx, audit) => {
      const before = await lockOpenBench(tx, ctx, benchId);
      if (values.guardDb !== undefined && before.guardRule !== "stated") {
        throw new CommandError("conflict", "The guard of this bench follows its rule.", {
          guardDb: "Choose a stated guard with the uncertainty budget before typing one here.",
        });
      }
      if (values.instrumentId !== before.instrumentId)
        await requireInstrument(tx, ctx, values.instrumentId);
      await tx
        .update(benches)
        .set(values)
        .where(and(eq(benches.teamId, ctx.teamId), eq(benches.id, benchId)));
      const { name, site, instrument, distanceM, guardDb, notes } = before;
      const { instrumentId, checkToleranceDb } = before;
      await audit({
        action: "bench.edit",
        subjectType: "bench",
        subjectId: benchId,
        detail: {
          before: {
            name,
            site,
            instrument,
            instrumentId,
            distanceM,
            guardDb,
            checkToleranceDb,
            notes,
          },
          after: values,
        },
      });
      return { benchId };
    });
  } catch (error) {
    if (!isDuplicate(error, "benches_name")) throw error;
    throw new CommandError("conflict", "The team has a bench of this name already.", {
      name: "Choose another name.",
    });
  }
}
