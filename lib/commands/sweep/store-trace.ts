import type { Transaction } from "@/db/client";
import type { StoredAxis } from "@/db/schema";
import { traceBlocks, traces } from "@/db/schema";
import { pointCount } from "@/lib/core/sweep/axis";
import { buildPyramid } from "@/lib/core/sweep/pyramid";
import type { Trace } from "@/lib/core/sweep/trace";
import { traceStatistics } from "@/lib/core/sweep/trace-statistics";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { encodeNumbers, encodePyramid } from "@/lib/formats/trace-blocks";

interface TracePlace {
  teamId: string;
  sweepId: string;
  position: number;
  /** Unit in the file, before the signal path. */
  fileUnit: LevelUnit;
  /** Highest level in the file's unit, before the signal path. */
  fileMaxDb: number | null;
  rbwHz: number | null;
}

/** Stores a trace: what it is known by, its levels in blocks, and the pyramid over them. */
export async function storeTrace(tx: Transaction, place: TracePlace, trace: Trace): Promise<void> {
  const { teamId, sweepId, position, fileUnit, fileMaxDb, rbwHz } = place;
  const { axis } = trace;
  const stored: StoredAxis =
    axis.kind === "regular" ? axis : { kind: "listed", count: pointCount(axis) };
  const [row] = await tx
    .insert(traces)
    .values({
      teamId,
      sweepId,
      position,
      name: trace.name,
      kind: trace.kind,
      detector: trace.detector,
      hold: trace.hold,
      unit: trace.unit,
      fileUnit,
      fileMaxDb,
      axis: stored,
      ...traceStatistics(trace, rbwHz),
    })
    .returning({ id: traces.id });
  if (!row) throw new Error("The trace was not stored.");
  const owner = { teamId, traceId: row.id };
  const levels = encodeNumbers(trace.levelsDb.subarray(0, pointCount(axis)));
  const frequencies = axis.kind === "listed" ? encodeNumbers(axis.frequenciesHz) : [];
  const pyramid = buildPyramid(trace.levelsDb);
  await tx.insert(traceBlocks).values([
    ...levels.map((block) => ({ ...owner, kind: "level" as const, ...block })),
    ...frequencies.map((block) => ({ ...owner, kind: "frequency" as const, ...block })),
    ...pyramid.map((level, i) => ({
      ...owner,
      kind: "pyramid" as const,
      level: i + 1,
      ...encodePyramid(level),
    })),
  ]);
}
