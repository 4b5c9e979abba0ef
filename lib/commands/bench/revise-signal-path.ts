import { isDeepStrictEqual } from "node:util";
import { and, desc, eq } from "drizzle-orm";
import { signalPathRevisions } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { checkEquipment } from "./check-equipment";
import { latestDay } from "./latest-day";
import { lockOpenBench } from "./lock-bench";
import { readSignalPath } from "./read-signal-path";
import { reviseSignalPathSchema } from "./schemas";

/** Adds the next revision of a bench's signal path; sweeps keep the one they were taken with. */
export async function reviseSignalPath(
  ctx: Context,
  input: unknown,
): Promise<{ benchId: string; revisionId: string; revision: number }> {
  requirePermission(ctx, "bench.write");
  const values = parseInput(reviseSignalPathSchema, input);
  const { benchId, basedOnRevision } = values;
  return change(ctx, async (tx, audit) => {
    // The lock keeps two revisions saved at once from taking the same number.
    await lockOpenBench(tx, ctx, benchId);
    const wrongEquipment = await checkEquipment(tx, ctx, values.transducers);
    const content = readSignalPath(values, await latestDay(tx), wrongEquipment);
    const [last] = await tx
      .select({ revision: signalPathRevisions.revision, content: signalPathRevisions.content })
      .from(signalPathRevisions)
      .where(
        and(eq(signalPathRevisions.teamId, ctx.teamId), eq(signalPathRevisions.benchId, benchId)),
      )
      .orderBy(desc(signalPathRevisions.revision))
      .limit(1);
    if (basedOnRevision !== undefined && last && last.revision !== basedOnRevision) {
      throw new CommandError(
        "conflict",
        `Revision ${last.revision} was saved while you were editing revision ${basedOnRevision}. Open the bench in another tab, compare, and carry your change over.`,
      );
    }
    if (last && isDeepStrictEqual(last.content, content)) {
      throw new CommandError("conflict", "Nothing differs from the current revision.");
    }
    const revision = (last?.revision ?? 0) + 1;
    const [row] = await tx
      .insert(signalPathRevisions)
      .values({ teamId: ctx.teamId, benchId, revision, content })
      .returning({ id: signalPathRevisions.id });
    if (!row) throw new Error("The signal path was not stored.");
    await audit({
      action: "bench.revise-signal-path",
      subjectType: "bench",
      subjectId: benchId,
      detail: {
        revision,
        impedanceOhm: content.impedanceOhm,
        transducers: content.transducers.map(({ name, kind, equipmentId }) => ({
          name,
          kind,
          ...(equipmentId ? { equipmentId } : {}),
        })),
      },
    });
    return { benchId, revisionId: row.id, revision };
  });
}
