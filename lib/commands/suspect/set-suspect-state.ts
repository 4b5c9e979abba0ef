import { and, eq } from "drizzle-orm";
import { followedSuspects } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockFollowed, storeNote } from "./lock-followed";
import { setSuspectStateSchema } from "./schemas";

/** Says what has become of a suspect; explained and accepted need their reason in a note. */
export async function setSuspectState(
  ctx: Context,
  input: unknown,
): Promise<{ suspectId: string }> {
  requirePermission(ctx, "sweep.write");
  const { suspectId, state, note } = parseInput(setSuspectStateSchema, input);
  return change(ctx, async (tx, audit) => {
    const before = await lockFollowed(ctx, tx, suspectId);
    if (before.state === state) {
      throw new CommandError("conflict", `This suspect is ${state} already.`, {
        state: "Choose another state, or add the note by itself.",
      });
    }
    await tx
      .update(followedSuspects)
      .set({ state })
      .where(and(eq(followedSuspects.teamId, ctx.teamId), eq(followedSuspects.id, suspectId)));
    const moved = { from: before.state, to: state };
    await storeNote(ctx, tx, suspectId, { text: note, change: { state: moved } });
    await audit({
      action: "suspect.set-state",
      subjectType: "suspect",
      subjectId: suspectId,
      detail: { name: before.name, note, from: { state: moved.from }, to: { state: moved.to } },
    });
    return { suspectId };
  });
}
