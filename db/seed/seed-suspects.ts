import type { Context } from "@/lib/auth/context";
import type { Role } from "@/lib/auth/permissions";
import { addNote } from "@/lib/commands/suspect/add-note";
import { assignSuspect } from "@/lib/commands/suspect/assign-suspect";
import { editSuspect } from "@/lib/commands/suspect/edit-suspect";
import { followSuspect } from "@/lib/commands/suspect/follow-suspect";
import { setSuspectState } from "@/lib/commands/suspect/set-suspect-state";
import { readSuspect } from "@/lib/queries/suspect/read-suspect";
import { readSweepDetail } from "@/lib/queries/sweep/read-sweep";
import { DEMO_SUSPECTS, type DemoSuspect } from "./demo-suspects";

/** The suspect of a sweep's table that lies next to a frequency. */
async function findSuspect(
  ctx: Context,
  sweepId: string,
  { frequencyHz, maskKey, sweepName }: DemoSuspect,
): Promise<{ readingId: string; number: number }> {
  const detail = await readSweepDetail(ctx, sweepId);
  const held = detail?.readings.find(({ mask }) => mask.key === maskKey);
  const away = (suspect: { frequencyHz: number }) => Math.abs(suspect.frequencyHz - frequencyHz);
  const [nearest] = held?.reading.suspects.toSorted((a, b) => away(a) - away(b)) ?? [];
  if (!held || !nearest || away(nearest) > 1e6)
    throw new Error(`${sweepName} has no suspect near ${frequencyHz} Hz.`);
  return { readingId: held.id, number: nearest.number };
}

/** Follows some suspects over the builds, with owners, states and remarks. */
export async function seedSuspects(
  contexts: ReadonlyMap<Role, Context>,
  engineer: Context,
  sweepIds: ReadonlyMap<string, string>,
): Promise<void> {
  for (const demo of DEMO_SUSPECTS) {
    const sweepId = sweepIds.get(demo.sweepName) ?? "";
    const { suspectId } = await followSuspect(engineer, await findSuspect(engineer, sweepId, demo));
    const followed = await readSuspect(engineer, suspectId);
    if (!followed) throw new Error("A followed suspect is gone.");
    const { toleranceHz } = followed;
    await editSuspect(engineer, { suspectId, source: demo.source, toleranceHz });
    await assignSuspect(engineer, { suspectId, ownerId: contexts.get(demo.owner)?.userId ?? null });
    for (const { by, text } of demo.notes)
      await addNote(contexts.get(by) ?? engineer, { suspectId, text });
    if (demo.state !== "open")
      await setSuspectState(engineer, { suspectId, state: demo.state, note: demo.reason });
  }
}
