import { sweeps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { applySignalPath } from "@/lib/core/bench/apply-signal-path";
import type { SignalPath } from "@/lib/core/bench/signal-path";
import { reachesMask } from "@/lib/core/reading/combine-readings";
import { decidingPoint } from "@/lib/core/reading/deciding-point";
import type { Standing } from "@/lib/core/reading/reading";
import type { Trace } from "@/lib/core/sweep/trace";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import { parseSweepFile } from "@/lib/formats/parse-sweep-file";
import { sha256Of, storeFile } from "../file/store-file";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { findBench, findBuild } from "./find-place";
import { findSameFile, holdFile } from "./find-same-file";
import { listProgramMasks } from "./list-program-masks";
import { overdueOn } from "./overdue";
import type { ImportSweepInput } from "./schemas";
import { importSweepSchema } from "./schemas";
import { storeReading } from "./store-reading";
import { storeTrace } from "./store-trace";

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
        onRecord: values.onRecord && values.purpose === "product",
        importedBy: ctx.userId,
      })
      .returning({ id: sweeps.id });
    if (!row) throw new Error("The sweep was not stored.");
    const place = { teamId, sweepId: row.id };
    for (const [position, trace] of traces.entries()) {
      const fileUnit = read[position]?.unit ?? trace.unit;
      await storeTrace(tx, { ...place, position, fileUnit, rbwHz: values.settings.rbwHz }, trace);
    }
    const readings: ImportedSweep["readings"] = [];
    if (values.purpose === "product") {
      const sweep = {
        ...place,
        traces,
        settings: values.settings,
        guardDb: bench.guardDb,
        impedanceOhm: bench.path.impedanceOhm,
        overdueTransducers: overdueOn(bench.path, values.measuredOn),
      };
      for (const mask of await listProgramMasks(tx, teamId, programId)) {
        const reading = await storeReading(tx, sweep, mask);
        // A mask that the sweep does not reach says nothing about it.
        const deciding = decidingPoint(reading);
        if (!deciding || !reachesMask(reading)) continue;
        readings.push({
          maskTitle: mask.content.title,
          standing: reading.standing,
          marginDb: deciding.point.marginDb,
        });
      }
    }
    await audit({
      action: "sweep.import",
      subjectType: "sweep",
      subjectId: row.id,
      detail: { name: values.name, fileName: values.fileName, sha256, buildId: values.buildId },
    });
    return { sweepId: row.id, name: values.name, readings };
  });
}
