import { and, eq } from "drizzle-orm";
import { followedSuspects } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { changedFields } from "../program/changed-fields";
import { change, parseInput, requirePermission } from "../run";
import { lockFollowed, storeNote } from "./lock-followed";
import { editSuspectSchema } from "./schemas";

/** Says what a suspect probably comes from, and how near a peak has to be to be taken for it. */
export async function editSuspect(ctx: Context, input: unknown): Promise<{ suspectId: string }> {
  requirePermission(ctx, "sweep.write");
  const { suspectId, ...values } = parseInput(editSuspectSchema, input);
  return change(ctx, async (tx, audit) => {
    const before = await lockFollowed(ctx, tx, suspectId);
    const changed = changedFields(before, values);
    if (Object.keys(changed.to).length === 0) return { suspectId };
    await tx
      .update(followedSuspects)
      .set(values)
      .where(and(eq(followedSuspects.teamId, ctx.teamId), eq(followedSuspects.id, suspectId)));
    const { source, toleranceHz } = values;
    await storeNote(ctx, tx, suspectId, {
      text: "",
      change: {
        ...(source === before.source
          ? {}
          : { source: { from: before.source || null, to: source || null } }),
        ...(toleranceHz === before.toleranceHz
          ? {}
          : { toleranceHz: { from: String(before.toleranceHz), to: String(toleranceHz) } }),
      },
    });
    await audit({
      action: "suspect.edit",
      subjectType: "suspect",
      subjectId: suspectId,
      detail: { name: before.name, ...changed },
    });
    return { suspectId };
  });
}
