import { and, eq, inArray } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { equipment } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import type { FieldErrors } from "../result";
import type { ReviseSignalPathValues } from "./schemas";

/**
 * What is wrong with the equipment that transducers name, at "transducers.n.equipmentId": it must
 * be the team's, not archived, of the transducer's kind, and each piece stands in one place only.
 */
export async function checkEquipment(
  tx: Transaction,
  ctx: Context,
  transducers: ReviseSignalPathValues["transducers"],
): Promise<FieldErrors> {
  const ids = transducers.flatMap(({ equipmentId }) => equipmentId ?? []);
  if (ids.length === 0) return {};
  const rows = await tx
    .select({ id: equipment.id, kind: equipment.kind, archivedAt: equipment.archivedAt })
    .from(equipment)
    .where(and(eq(equipment.teamId, ctx.teamId), inArray(equipment.id, ids)));
  const errors: FieldErrors = {};
  const seen = new Set<string>();
  transducers.forEach(({ equipmentId, kind }, i) => {
    if (!equipmentId) return;
    const piece = rows.find((row) => row.id === equipmentId);
    const text = !piece
      ? "Choose a piece of your team's equipment."
      : piece.archivedAt !== null
        ? "This piece of equipment is archived: restore it first."
        : piece.kind !== kind
          ? "The kind chosen here is another than that of this piece of equipment."
          : seen.has(equipmentId)
            ? "This piece of equipment stands in the path already."
            : null;
    seen.add(equipmentId);
    if (text) errors[`transducers.${i}.equipmentId`] = text;
  });
  return errors;
}
