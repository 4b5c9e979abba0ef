import { isDeepStrictEqual } from "node:util";
import { and, eq } from "drizzle-orm";
import { benches, uncertaintyBudgets } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { guardOf, MAX_GUARD_DB } from "@/lib/core/bench/guard";
import { readBudget, validateBudget } from "@/lib/core/bench/validate-budget";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockOpenBench } from "./lock-bench";
import { newestBudget } from "./newest-budget";
import { reviseBudgetSchema } from "./schemas";

/**
 * Adds the next revision of a bench's uncertainty budget and puts the guard that its rule computes
 * from it in force; sweeps keep the budget and the guard they were imported with.
 */
export async function reviseBudget(
  ctx: Context,
  input: unknown,
): Promise<{ benchId: string; revision: number; guardDb: number }> {
  requirePermission(ctx, "bench.write");
  const { benchId, basedOnRevision, ...draft } = parseInput(reviseBudgetSchema, input);
  return change(ctx, async (tx, audit) => {
    // The lock keeps two revisions saved at once from taking the same number.
    const bench = await lockOpenBench(tx, ctx, benchId);
    const problems = validateBudget(draft, bench.guardRule);
    if (problems.length > 0) {
      throw new CommandError(
        "invalid",
        "Some fields need another look.",
        Object.fromEntries(problems.map(({ path, text }) => [path, text])),
      );
    }
    const content = readBudget(draft);
    const last = await newestBudget(tx, ctx.teamId, benchId);
    const lastRevision = last?.revision ?? 0;
    if (basedOnRevision !== undefined && lastRevision !== basedOnRevision) {
      throw new CommandError(
        "conflict",
        `Revision ${lastRevision} was saved while you were editing. Open the bench in another tab, compare, and carry your change over.`,
      );
    }
    if (last && isDeepStrictEqual(last.content, content))
      throw new CommandError("conflict", "Nothing differs from the current revision.");
    const guardDb = guardOf(bench.guardRule, content, bench.guardDb);
    if (guardDb === null) throw new Error("A budget that was checked gives no guard.");
    if (guardDb > MAX_GUARD_DB) {
      throw new CommandError("invalid", "Some fields need another look.", {
        lines: `The guard would be ${guardDb} dB, and one above ${MAX_GUARD_DB} dB leaves no margin to read.`,
      });
    }
    const revision = lastRevision + 1;
    await tx
      .insert(uncertaintyBudgets)
      .values({ teamId: ctx.teamId, benchId, revision, content, createdBy: ctx.userId });
    await tx
      .update(benches)
      .set({ guardDb })
      .where(and(eq(benches.teamId, ctx.teamId), eq(benches.id, benchId)));
    await audit({
      action: "bench.revise-budget",
      subjectType: "bench",
      subjectId: benchId,
      detail: {
        revision,
        title: content.title,
        lines: content.lines.length,
        reference: content.reference,
        guardDb: `${bench.guardDb} → ${guardDb}`,
      },
    });
    return { benchId, revision, guardDb };
  });
}
