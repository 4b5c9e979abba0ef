import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { sweeps } from "@/db/schema";
import { CommandError } from "../result";

/** The place of a sweep, archived or not, locked until the transaction ends. */
export async function lockSweep(tx: Transaction, teamId: string, sweepId: string) {
  const [sweep] = await tx
    .select({ buildId: sweeps.buildId, purpose: sweeps.purpose, archivedAt: sweeps.archivedAt })
    .from(sweeps)
    .where(and(eq(sweeps.teamId, teamId), eq(sweeps.id, sweepId)))
    .for("no key update");
  if (!sweep) throw new CommandError("not-found", "This sweep does not exist.");
  return sweep;
}
