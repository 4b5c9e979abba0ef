import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { reports } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import type { ReportRow } from "./lock-report";
import { storePdf } from "./store-pdf";

/** Moves a locked report on and draws its PDF anew. */
export async function moveReport(
  tx: Transaction,
  ctx: Context,
  reportId: string,
  values: Partial<typeof reports.$inferInsert>,
): Promise<ReportRow> {
  const [moved] = await tx
    .update(reports)
    .set(values)
    .where(and(eq(reports.teamId, ctx.teamId), eq(reports.id, reportId)))
    .returning();
  if (!moved) throw new Error("A locked report is gone.");
  await storePdf(tx, ctx, moved);
  return moved;
}
