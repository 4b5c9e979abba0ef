import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { equipment } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";

/** Refuses, at its field, what is no instrument of this team that can be used. */
export async function requireInstrument(
  tx: Transaction,
  ctx: Context,
  instrumentId: string | null | undefined,
): Promise<void> {
  if (!instrumentId) return;
  const [piece] = await tx
    .select({ kind: equipment.kind, archivedAt: equipment.archivedAt })
    .from(equipment)
    .where(and(eq(equipment.teamId, ctx.teamId), eq(equipment.id, instrumentId)));
  if (piece?.kind === "instrument" && piece.archivedAt === null) return;
  throw new CommandError("invalid", "Some fields need another look.", {
    instrumentId:
      piece?.archivedAt instanceof Date
        ? "This instrument is archived: restore it first."
        : "Choose an instrument of your team's equipment.",
  });
}
