import { and, desc, eq, isNull, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { benchChecks, signalPathRevisions, storedFiles } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import type { BenchCheckContent } from "@/lib/core/bench/bench-check";
import { checkStepHz, checkToleranceHz, compareCheck } from "@/lib/core/bench/compare-check";
import { lockOpenBench } from "../bench/lock-bench";
import { sha256Of, storeFile } from "../file/store-file";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { findReference, refuseDifferent } from "./find-reference";
import { readCheckLines, readCheckTrace, throughCheckPath } from "./read-check-trace";
import { recordBenchCheckSchema } from "./schemas";

/** The revision in force of the bench's signal path. */
async function findPath(tx: Transaction, teamId: string, benchId: string) {
  const [path] = await tx
    .select({ id: signalPathRevisions.id, content: signalPathRevisions.content })
    .from(signalPathRevisions)
    .where(and(eq(signalPathRevisions.teamId, teamId), eq(signalPathRevisions.benchId, benchId)))
    .orderBy(desc(signalPathRevisions.revision))
    .limit(1);
  if (!path) throw new Error("The bench has no signal path.");
  return path;
}

/** The database's day is the one that everybody of the team shares. */
async function refuseFuture(tx: Transaction, measuredOn: string): Promise<void> {
  const { rows } = await tx.execute<{ future: boolean }>(
    sql`select ${measuredOn}::date > current_date as future`,
  );
  if (rows[0]?.future)
    throw new CommandError("invalid", "The check was not stored: its day is still to come.", {
      measuredOn: "This day is still to come.",
    });
}

/** The same sweep a second time would show a drift of zero, however far the bench is off. */
async function refuseSameFile(tx: Transaction, teamId: string, benchId: string, sha256: string) {
  const [same] = await tx
    .select({ source: benchChecks.source, measuredOn: benchChecks.measuredOn })
    .from(benchChecks)
    .innerJoin(
      storedFiles,
      and(eq(storedFiles.teamId, benchChecks.teamId), eq(storedFiles.id, benchChecks.fileId)),
    )
    .where(
      and(
        eq(benchChecks.teamId, teamId),
        eq(benchChecks.benchId, benchId),
        eq(storedFiles.sha256, sha256),
        isNull(benchChecks.archivedAt),
      ),
    )
    .limit(1);
  if (!same) return;
  const text = `The same bytes are here already, as the sweep of ${same.source} of ${same.measuredOn}. Take a new sweep.`;
  throw new CommandError("conflict", text, { file: text });
}

export interface RecordedBenchCheck {
  checkId: string;
  driftMeanDb: number | null;
  driftWorstDb: number | null;
}

/**
 * Takes in a sweep of a known source: the original bytes, its lines after the signal path in
 * force and, unless it is a reference itself, its drift from the bench's newest reference of the
 * source. Whatever cannot be compared stores nothing.
 */
export async function recordBenchCheck(ctx: Context, input: unknown): Promise<RecordedBenchCheck> {
  requirePermission(ctx, "bench.write");
  const values = parseInput(recordBenchCheckSchema, input);
  const { benchId, source, measuredOn, corrected, rbwHz, isReference, fileName, notes } = values;
  const read = readCheckTrace(values);
  const { teamId } = ctx;
  return change(ctx, async (tx, audit) => {
    // Of two at once the second waits, and is compared with the reference that the first became.
    await lockOpenBench(tx, ctx, benchId);
    await refuseFuture(tx, measuredOn);
    await refuseSameFile(tx, teamId, benchId, sha256Of(values.bytes));
    const path = await findPath(tx, teamId, benchId);
    const trace = throughCheckPath(read, path.content, corrected);
    const reference = isReference ? null : await findReference(tx, teamId, benchId, source);
    const { unit, detector, hold } = trace;
    if (reference) refuseDifferent({ unit, detector, rbwHz }, reference);
    const lines = readCheckLines(trace, rbwHz, isReference);
    const stepHz = checkStepHz(trace);
    const compared = reference
      ? compareCheck(
          trace,
          lines,
          reference.content.lines,
          checkToleranceHz(rbwHz, stepHz, reference.content.stepHz),
        )
      : { lines, missingHz: [], driftMeanDb: null, driftWorstDb: null };
    if (reference && compared.driftWorstDb === null) {
      const text = `None of the ${reference.content.lines.length} lines of the reference lies where this sweep has levels: it is another span.`;
      throw new CommandError("conflict", `The check was not stored. ${text}`, { file: text });
    }
    const { driftMeanDb, driftWorstDb } = compared;
    const content: BenchCheckContent = {
      version: 1,
      unit,
      detector,
      hold,
      rbwHz,
      stepHz,
      corrected,
      lines: compared.lines,
      missingHz: compared.missingHz,
    };
    const { fileId, sha256 } = await storeFile(tx, ctx, values.bytes, "text/csv");
    const [row] = await tx
      .insert(benchChecks)
      .values({
        teamId,
        benchId,
        signalPathRevisionId: path.id,
        fileId,
        fileName,
        source,
        measuredOn,
        isReference,
        referenceId: reference?.id ?? null,
        content,
        driftMeanDb,
        driftWorstDb,
        notes,
        checkedBy: ctx.userId,
      })
      .returning({ id: benchChecks.id });
    if (!row) throw new Error("The check was not stored.");
    await audit({
      action: "bench-check.record",
      subjectType: "bench-check",
      subjectId: row.id,
      detail: {
        name: `${source} of ${measuredOn}`,
        benchId,
        isReference,
        fileName,
        sha256,
        ...(reference ? { referenceId: reference.id, driftMeanDb, driftWorstDb } : {}),
      },
    });
    return { checkId: row.id, driftMeanDb, driftWorstDb };
  });
}
