import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { equipment } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";

/** The team's piece of equipment, locked until the transaction ends, or a refusal. */
export async function lockEquipment(tx: Transaction, ctx: Context, equipmentId: string) {
  const [piece] = await tx
    .select()
    .from(equipment)
    .where(and(eq(equipment.teamId, ctx.teamId), eq(equipment.id, equipmentId)))
    .for("update");
  if (!piece) throw new CommandError("not-found", "This piece of equipment does not exist.");
  return piece;
}

export async function lockOpenEquipment(tx: Transaction, ctx: Context, equipmentId: string) {
  const piece = await lockEquipment(tx, ctx, equipmentId);
  if (piece.archivedAt !== null) {
    throw new CommandError("conflict", "This is archived: restore it before changing it.");
  }
  return piece;
}
