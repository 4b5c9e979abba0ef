import { and, eq, inArray } from "drizzle-orm";
import { masks, programMasks } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { completeReadings } from "../sweep/complete-readings";
import { lockOpenProgram } from "./find-open";
import { setProgramMasksSchema } from "./schemas";

/** Says which masks the program must fit under: exactly the given ones, in one transaction. */
export async function setProgramMasks(
  ctx: Context,
  input: unknown,
): Promise<{ added: string[]; removed: string[] }> {
  requirePermission(ctx, "program.write");
  const values = parseInput(setProgramMasksSchema, input);
  const { programId } = values;
  const wanted = [...new Set(values.maskIds)];
  return change(ctx, async (tx, audit) => {
    await lockOpenProgram(ctx, tx, programId);
    // Held until the end, so that no mask is archived between this look and the commit.
    const found = await tx
      .select({ id: masks.id, key: masks.key, archivedAt: masks.archivedAt })
      .from(masks)
      .where(and(eq(masks.teamId, ctx.teamId), inArray(masks.id, wanted)))
      .for("share");
    const archived = found.filter((mask) => mask.archivedAt !== null).map((mask) => mask.key);
    if (archived.length > 0) {
      const message = `Archived, so take off or restore: ${archived.join(", ")}.`;
      throw new CommandError("conflict", "An archived mask cannot be chosen.", {
        maskIds: message,
      });
    }
    if (found.length < wanted.length) {
      const message = "A mask of the list is not there any more: load the page again.";
      throw new CommandError("not-found", message, { maskIds: message });
    }
    const ofProgram = and(
      eq(programMasks.teamId, ctx.teamId),
      eq(programMasks.programId, programId),
    );
    const held = await tx
      .select({ id: masks.id, key: masks.key })
      .from(programMasks)
      .innerJoin(
        masks,
        and(eq(masks.teamId, programMasks.teamId), eq(masks.id, programMasks.maskId)),
      )
      .where(ofProgram);
    const before = held.map((row) => row.id);
    const added = wanted.filter((id) => !before.includes(id));
    const removed = before.filter((id) => !wanted.includes(id));
    if (removed.length > 0) {
      await tx.delete(programMasks).where(and(ofProgram, inArray(programMasks.maskId, removed)));
    }
    if (added.length > 0) {
      await tx
        .insert(programMasks)
        .values(added.map((maskId) => ({ teamId: ctx.teamId, programId, maskId })));
      await completeReadings(tx, ctx.teamId, { programId });
    }
    const keys = new Map([...held, ...found].map((mask) => [mask.id, mask.key]));
    await audit({
      action: "program.set-masks",
      subjectType: "program",
      subjectId: programId,
      // By key, so that the trail can be read without looking up ids.
      detail: {
        added: added.map((id) => keys.get(id)),
        removed: removed.map((id) => keys.get(id)),
      },
    });
    return { added, removed };
  });
}
