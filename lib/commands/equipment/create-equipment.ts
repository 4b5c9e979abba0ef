import { equipment } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, isDuplicate, parseInput, requirePermission } from "../run";
import { createEquipmentSchema } from "./schemas";

/** Adds an instrument or a transducer, which has no calibration yet. */
export async function createEquipment(
  ctx: Context,
  input: unknown,
): Promise<{ equipmentId: string }> {
  requirePermission(ctx, "bench.write");
  const values = parseInput(createEquipmentSchema, input);
  try {
    return await change(ctx, async (tx, audit) => {
      const [row] = await tx
        .insert(equipment)
        .values({ teamId: ctx.teamId, ...values })
        .returning({ id: equipment.id });
      if (!row) throw new Error("The equipment was not stored.");
      await audit({
        action: "equipment.create",
        subjectType: "equipment",
        subjectId: row.id,
        detail: values,
      });
      return { equipmentId: row.id };
    });
  } catch (error) {
    throw isDuplicate(error, "equipment_name") ? nameTaken() : error;
  }
}

export function nameTaken(): CommandError {
  return new CommandError("conflict", "The team has equipment of this name already.", {
    name: "Choose another name, for instance with its inventory number.",
  });
}
