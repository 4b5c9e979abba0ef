import { and, desc, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { uncertaintyBudgets } from "@/db/schema";

/** The budget of a bench that is in force, which is its newest revision. */
export async function newestBudget(tx: Transaction, teamId: string, benchId: string) {
  const [row] = await tx
    .select({
      id: uncertaintyBudgets.id,
      revision: uncertaintyBudgets.revision,
      content: uncertaintyBudgets.content,
    })
    .from(uncertaintyBudgets)
    .where(and(eq(uncertaintyBudgets.teamId, teamId), eq(uncertaintyBudgets.benchId, benchId)))
    .orderBy(desc(uncertaintyBudgets.revision))
    .limit(1);
  return row ?? null;
}
