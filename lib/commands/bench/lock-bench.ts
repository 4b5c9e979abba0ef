import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { benches } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";

/** The team's bench, locked until the transaction ends, or a refusal. */
export async function lockBench(tx: Transaction, ctx: Context, benchId: string) {
  const [bench] = await tx
    .select()
    .from(benches)
    .where(and(eq(benches.teamId, ctx.teamId), eq(benches.id, benchId)))
    .for("update");
  if (!bench) throw new CommandError("not-found", "This bench does not exist.");
  return bench;
}

export async function lockOpenBench(tx: Transaction, ctx: Context, benchId: string) {
  const bench = await lockBench(tx, ctx, benchId);
  if (bench.archivedAt !== null) {
    throw new CommandError("conflict", "This bench is archived: restore it before changing it.");
  }
  return bench;
}
