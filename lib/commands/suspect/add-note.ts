import type { Context } from "@/lib/auth/context";
import { change, parseInput, requirePermission } from "../run";
import { lockFollowed, storeNote } from "./lock-followed";
import { addNoteSchema } from "./schemas";

/** Adds a remark to a followed suspect; remarks stay as they were written. */
export async function addNote(ctx: Context, input: unknown): Promise<{ suspectId: string }> {
  requirePermission(ctx, "sweep.comment");
  const { suspectId, text } = parseInput(addNoteSchema, input);
  return change(ctx, async (tx, audit) => {
    const { name } = await lockFollowed(ctx, tx, suspectId);
    await storeNote(ctx, tx, suspectId, { text, change: null });
    await audit({
      action: "suspect.add-note",
      subjectType: "suspect",
      subjectId: suspectId,
      detail: { name, text },
    });
    return { suspectId };
  });
}
