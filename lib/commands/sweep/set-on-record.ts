import { and, eq, isNull } from "drizzle-orm";
import { sweeps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { setOnRecordSchema } from "./schemas";

/** Takes a product sweep into its build's line of record, or out of it. */
export async function setOnRecord(ctx: Context, input: unknown): Promise<{ sweepId: string }> {
  requirePermission(ctx, "sweep.write");
  const { sweepId, onRecord } = parseInput(setOnRecordSchema, input);
  return change(ctx, async (tx, audit) => {
    const [row] = await tx
      .update(sweeps)
      .set({ onRecord })
      .where(
        and(
          eq(sweeps.teamId, ctx.teamId),
          eq(sweeps.id, sweepId),
          eq(sweeps.purpose, "product"),
          isNull(sweeps.archivedAt),
        ),
      )
      .returning({ id: sweeps.id });
    if (!row) {
      throw new CommandError(
        "not-found",
        "Only a product sweep that is not archived can be in the line of record.",
      );
    }
    await audit({
      action: onRecord ? "sweep.put-on-record" : "sweep.take-off-record",
      subjectType: "sweep",
      subjectId: sweepId,
    });
    return { sweepId };
  });
}
