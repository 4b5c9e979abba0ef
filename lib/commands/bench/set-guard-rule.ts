import { and, eq } from "drizzle-orm";
import { benches } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { guardOf, MAX_GUARD_DB } from "@/lib/core/bench/guard";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockOpenBench } from "./lock-bench";
import { newestBudget } from "./newest-budget";
import { setGuardRuleSchema } from "./schemas";

/** Says where the guard of a bench comes from, and puts the guard that follows in force. */
export async function setGuardRule(
  ctx: Context,
  input: unknown,
): Promise<{ benchId: string; guardDb: number }> {
  requirePermission(ctx, "bench.write");
  const { benchId, guardRule, guardDb: stated } = parseInput(setGuardRuleSchema, input);
  return change(ctx, async (tx, audit) => {
    const bench = await lockOpenBench(tx, ctx, benchId);
    const budget = (await newestBudget(tx, ctx.teamId, benchId))?.content ?? null;
    const guardDb = guardOf(guardRule, budget, stated ?? 0);
    if (guardDb === null) {
      const noLines = budget === null || budget.lines.length === 0;
      refuse(
        noLines
          ? "This rule needs an uncertainty budget with at least one line: save the budget first."
          : "This rule needs the measurement that U_CISPR is taken from: choose it in the budget first.",
      );
    }
    if (guardDb > MAX_GUARD_DB)
      refuse(`The guard would be ${guardDb} dB; above ${MAX_GUARD_DB} dB no margin is left.`);
    if (guardRule === bench.guardRule && guardDb === bench.guardDb)
      throw new CommandError("conflict", "Nothing differs from the rule in force.");
    await tx
      .update(benches)
      .set({ guardRule, guardDb })
      .where(and(eq(benches.teamId, ctx.teamId), eq(benches.id, benchId)));
    await audit({
      action: "bench.set-guard-rule",
      subjectType: "bench",
      subjectId: benchId,
      detail: {
        from: { guardRule: bench.guardRule, guardDb: bench.guardDb },
        to: { guardRule, guardDb },
      },
    });
    return { benchId, guardDb };
  });
}

function refuse(text: string): never {
  throw new CommandError("invalid", "Some fields need another look.", { guardRule: text });
}
