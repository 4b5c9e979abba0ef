import { and, asc, eq, inArray, isNull, or } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { acceptedMismatches, builds, sweeps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import type { ComparedSweep } from "@/lib/core/delta/compared-sweep";
import type { MismatchField } from "@/lib/core/delta/delta";
import { findMismatches, NEVER_ACCEPTED } from "@/lib/core/delta/find-mismatches";
import { loadComparedSweeps } from "@/lib/queries/sweep/load-compared";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { findBuild } from "../sweep/find-place";
import { acceptMismatchSchema } from "./schemas";

const gone = () => new CommandError("not-found", "One of these sweeps does not exist.");

/** Two product sweeps of one program, locked, so that neither changes meanwhile. */
async function lockPair(
  tx: Transaction,
  teamId: string,
  beforeId: string,
  afterId: string,
): Promise<{ before: ComparedSweep; after: ComparedSweep }> {
  if (beforeId === afterId)
    throw new CommandError("conflict", "A sweep does not differ from itself.");
  const rows = await tx
    .select({ id: sweeps.id, buildId: sweeps.buildId, programId: builds.programId })
    .from(sweeps)
    .innerJoin(builds, and(eq(builds.teamId, sweeps.teamId), eq(builds.id, sweeps.buildId)))
    .where(
      and(
        eq(sweeps.teamId, teamId),
        inArray(sweeps.id, [beforeId, afterId]),
        isNull(sweeps.archivedAt),
      ),
    );
  if (rows.length < 2) throw gone();
  // The program and the builds before the sweeps, as every command locks them.
  for (const buildId of [...new Set(rows.map((row) => row.buildId))].sort())
    await findBuild(tx, teamId, buildId, null);
  if (rows[0]?.programId !== rows[1]?.programId)
    throw new CommandError("conflict", "Sweeps of two programs are not held against each other.");
  await tx
    .select({ id: sweeps.id })
    .from(sweeps)
    .where(and(eq(sweeps.teamId, teamId), inArray(sweeps.id, [beforeId, afterId])))
    .orderBy(asc(sweeps.id))
    .for("update");
  const loaded = await loadComparedSweeps(tx, teamId, [beforeId, afterId]);
  const before = loaded.find((sweep) => sweep.id === beforeId);
  const after = loaded.find((sweep) => sweep.id === afterId);
  if (!before || !after) throw gone();
  if (before.purpose !== "product" || after.purpose !== "product")
    throw new CommandError("conflict", "Only sweeps of the product have a delta.");
  return { before, after };
}

/** Refuses unless exactly what differs now was named, and all of it may be accepted. */
function checkFields(
  { before, after }: { before: ComparedSweep; after: ComparedSweep },
  fields: readonly MismatchField[],
): void {
  const mismatches = findMismatches(before, after);
  if (mismatches.length === 0)
    throw new CommandError("conflict", "These two sweeps are comparable as they are.");
  const never = mismatches.filter(({ field }) => NEVER_ACCEPTED.has(field));
  if (never.length > 0) {
    const why = never.map(({ text }) => text).join(" ");
    const message = `No reason makes these comparable: the difference would mean nothing. ${why}`;
    throw new CommandError("conflict", message, { reason: message });
  }
  const found = new Set(mismatches.map(({ field }) => field));
  const isSame = found.size === new Set(fields).size && fields.every((field) => found.has(field));
  if (!isSame)
    throw new CommandError(
      "conflict",
      "What differs between these sweeps has changed: look at it again before accepting it.",
    );
}

/**
 * Lets two sweeps be compared although something differs, with a written reason that stands
 * wherever their delta shows. Only what is named is accepted: anything else that differs later
 * forbids the delta again. Takes the place of an earlier acceptance of the same two sweeps.
 */
export async function acceptMismatch(
  ctx: Context,
  input: unknown,
): Promise<{ acceptanceId: string }> {
  requirePermission(ctx, "sweep.write");
  const { beforeSweepId, afterSweepId, reason, ...values } = parseInput(
    acceptMismatchSchema,
    input,
  );
  const fields = [...new Set(values.fields)];
  const { teamId, userId } = ctx;
  return change(ctx, async (tx, audit) => {
    checkFields(await lockPair(tx, teamId, beforeSweepId, afterSweepId), fields);
    const isPair = (before: string, after: string) =>
      and(eq(acceptedMismatches.beforeSweepId, before), eq(acceptedMismatches.afterSweepId, after));
    await tx
      .update(acceptedMismatches)
      .set({ withdrawnBy: userId, withdrawnAt: new Date() })
      .where(
        and(
          eq(acceptedMismatches.teamId, teamId),
          isNull(acceptedMismatches.withdrawnAt),
          or(isPair(beforeSweepId, afterSweepId), isPair(afterSweepId, beforeSweepId)),
        ),
      );
    const [row] = await tx
      .insert(acceptedMismatches)
      .values({ teamId, beforeSweepId, afterSweepId, fields, reason, acceptedBy: userId })
      .returning({ id: acceptedMismatches.id });
    if (!row) throw new Error("The acceptance was not stored.");
    await audit({
      action: "sweep.accept-mismatch",
      subjectType: "sweep",
      subjectId: afterSweepId,
      detail: { acceptance: row.id, before: beforeSweepId, after: afterSweepId, fields, reason },
    });
    return { acceptanceId: row.id };
  });
}
