import { sweeps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { applySignalPath } from "@/lib/core/bench/apply-signal-path";
import type { SignalPath } from "@/lib/core/bench/signal-path";
import { reachesMask } from "@/lib/core/reading/combine-readings";
import { decidingPoint } from "@/lib/core/reading/deciding-point";
import { prepareParts } from "@/lib/core/reading/prepare-parts";
import type { Standing } from "@/lib/core/reading/reading";
import { pointCount } from "@/lib/core/sweep/axis";
import type { Trace } from "@/lib/core/sweep/trace";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import { parseSweepFile } from "@/lib/formats/parse-sweep-file";
import { loadBenchQuality } from "../bench/load-bench-quality";
import { sha256Of, storeFile } from "../file/store-file";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { findBench, findBuild } from "./find-place";
import { findSameFile, holdFile } from "./find-same-file";
import { holdAmbientBesideReadings, loadAmbients } from "./hold-ambient";
import { listProgramMasks } from "./list-program-masks";
import type { ImportSweepInput } from "./schemas";
import { importSweepSchema } from "./schemas";
import { storeReading } from "./store-reading";
import { storeTrace } from "./store-trace";
import { partOf } from "./sweep-to-read";

/** The traces of the file, or the reason why they cannot be had, standing at the file. */
function readTraces({ bytes, fileName, answers }: ImportSweepInput): Trace[] {
  const parsed = parseSweepFile(bytes, fileName, answers);
  if (parsed.ok) return parsed.traces;
  const { reason, line, questions } = parsed.preview;
  const why = reason ?? questions.map((question) => question.why).join(" ");
  const text = line === null ? why : `Line ${line}: ${why}`;
  throw new CommandError("invalid", `${fileName} was not stored. ${text}`, { file: text });
}

/** Levels as they are held against masks: after the signal path, unless the instrument did it. */
function throughPath(traces: Trace[], path: SignalPath, corrected: boolean): Trace[] {
  if (corrected) return traces;
  return traces.map((trace) => {
    const applied = applySignalPath(trace, path);
    if (applied) return applied;
    const unit = LEVEL_UNIT_LABELS[trace.unit];
    throw new CommandError(
      "invalid",
      `"${trace.name}" is in ${unit}, which is not a level at the instrument's input.`,
      {
        corrected: `"${trace.name}" is in ${unit}. If the instrument applied the factors itself, mark the file as corrected.`,
      },
    );
  });
}

/** Highest level of a trace; null without any. */
function highestLevel({ axis, levelsDb }: Trace): number | null {
  let highest = Number.NEGATIVE_INFINITY;
  for (const level of levelsDb.subarray(0, pointCount(axis))) if (level > highest) highest = level;
  return Number.isFinite(highest) ? highest : null;
}

export interface ImportedSweep {
  sweepId: string;
  name: string;
  /** One for each mask of the program that the sweep can be held against. */
  readings: { maskTitle: string; standing: Standing; marginDb: number }[];
}

/**
 * Takes one file in: the original bytes, its traces after the signal path, and a reading against
 * each mask of the program, in one transaction. Whatever is not understood stores nothing.
 */
export async function importSweep(ctx: Context, input: unknown): Promise<ImportedSweep> {
  requirePermission(ctx, "sweep.write");
  const values = parseInput(importSweepSchema, input);
  const read = readTraces(values);
  const { teamId } = ctx;
  return change(ctx, async (tx, audit) => {
    const { programId } = await findBuild(tx, teamId, values.buildId, values.stepId);
    const bench = await findBench(tx, teamId, values.benchId);
    const fileHash = sha256Of(values.bytes);
    await holdFile(tx, teamId, fileHash);
    const [same] = await findSameFile(tx, teamId, fileHash);
    if (same && !values.again) {
      const where = `${same.name} on ${same.programName} ${same.buildName}`;
      throw new CommandError("conflict", `This file is here already, as ${where}.`, {
        file: `The same bytes were imported before, as ${where}. Choose to import them again if you mean it.`,
      });
    }
    const { instrument, budgetId } = await loadBenchQuality(
      tx,
      teamId,
      values.benchId,
      values.measuredOn,
    );
    const fileLevels = read.map(highestLevel);
    const traces = throughPath(read, bench.path, values.corrected);
    const { fileId, sha256 } = await storeFile(tx, ctx, values.bytes, "text/csv");
    const { bytes: _bytes, answers: _answers, again: _again, ...kept } = values;
    const [row] = await tx
      .insert(sweeps)
      .values({
        ...kept,
        teamId,
        fileId,
        signalPathRevisionId: bench.pathRevisionId,
        guardDb: bench.guardDb,
        instrument,
        budgetId,
        onRecord: values.onRecord && values.purpose === "product",
        importedBy: ctx.userId,
      })
      .returning({ id: sweeps.id });
    if (!row) throw new Error("The sweep was not stored.");
    const place = { teamId, sweepId: row.id };
    for (const [position, trace] of traces.entries()) {
      const fileUnit = read[position]?.unit ?? trace.unit;
      const fileMaxDb = fileLevels[position] ?? null;
      const rbwHz = values.settings.rbwHz;
      await storeTrace(tx, { ...place, position, fileUnit, fileMaxDb, rbwHz }, trace);
    }
    const readings: ImportedSweep["readings"] = [];
    if (values.purpose === "product") {
      const { guardDb, path } = bench;
      const facts = { ...values, guardDb, path, instrument };
      const sweep = {
        ...place,
        prepared: prepareParts([partOf(facts, traces, fileLevels)]),
        ambients: await loadAmbients(tx, teamId, values),
      };
      for (const mask of await listProgramMasks(tx, teamId, programId)) {
        const reading = await storeReading(tx, sweep, mask);
        // A mask that the sweep does not reach says nothing about it.
        const deciding = decidingPoint(reading);
        if (!mask.isInForce || !deciding || !reachesMask(reading)) continue;
        readings.push({
          maskTitle: mask.content.title,
          standing: reading.standing,
          marginDb: deciding.point.marginDb,
        });
      }
    }
    if (values.purpose === "ambient") await holdAmbientBesideReadings(tx, teamId, row.id);
    await audit({
      action: "sweep.import",
      subjectType: "sweep",
      subjectId: row.id,
      detail: { name: values.name, fileName: values.fileName, sha256, buildId: values.buildId },
    });
    return { sweepId: row.id, name: values.name, readings };
  });
}
