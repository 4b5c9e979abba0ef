import { benches, signalPathRevisions } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, isDuplicate, parseInput, requirePermission } from "../run";
import { requireInstrument } from "./find-instrument";
import { createBenchSchema } from "./schemas";

/** Adds a bench; revision 1 of its signal path has the stated impedance and no transducers. */
export async function createBench(ctx: Context, input: unknown): Promise<{ benchId: string }> {
  requirePermission(ctx, "bench.write");
  const { impedanceOhm, ...values } = parseInput(createBenchSchema, input);
  try {
    return await change(ctx, async (tx, audit) => {
      await requireInstrument(tx, ctx, values.instrumentId);
      const [row] = await tx
        .insert(benches)
        .values({ teamId: ctx.teamId, ...values })
        .returning({ id: benches.id });
      if (!row) throw new Error("The bench was not stored.");
      await tx.insert(signalPathRevisions).values({
        teamId: ctx.teamId,
        benchId: row.id,
        revision: 1,
        content: { version: 1, impedanceOhm, transducers: [] },
      });
      await audit({
        action: "bench.create",
        subjectType: "bench",
        subjectId: row.id,
        detail: { ...values, impedanceOhm },
      });
      return { benchId: row.id };
    });
  } catch (error) {
    if (!isDuplicate(error, "benches_name")) throw error;
    throw new CommandError("conflict", "The team has a bench of this name already.", {
      name: "Choose another name.",
    });
  }
}
