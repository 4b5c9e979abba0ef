import { and, asc, between, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { StoredAxis } from "@/db/schema";
import { traceBlocks, traces } from "@/db/schema";
import type { FrequencyAxis, Trace } from "@/lib/core/sweep/trace";
import { decodeFrequencies, decodeLevels } from "@/lib/formats/trace-blocks";

type BlockKind = "level" | "frequency" | "pyramid";

/** Blocks of a trace in their order, all of one kind or a range of positions. */
export function selectBlocks(
  tx: Transaction,
  trace: { teamId: string; traceId: string },
  part: { kind: BlockKind; level?: number; from?: number; to?: number },
) {
  const { kind, level = 0, from = 0, to = 2_147_483_647 } = part;
  return tx
    .select({ bytes: traceBlocks.bytes, crc32: traceBlocks.crc32 })
    .from(traceBlocks)
    .where(
      and(
        eq(traceBlocks.teamId, trace.teamId),
        eq(traceBlocks.traceId, trace.traceId),
        eq(traceBlocks.kind, kind),
        eq(traceBlocks.level, level),
        between(traceBlocks.position, from, to),
      ),
    )
    .orderBy(asc(traceBlocks.position));
}

/** The frequency axis of a stored trace, with its frequencies when they are listed. */
export async function loadAxis(
  tx: Transaction,
  trace: { teamId: string; traceId: string },
  stored: StoredAxis,
): Promise<FrequencyAxis> {
  if (stored.kind === "regular") return stored;
  const blocks = await selectBlocks(tx, trace, { kind: "frequency" });
  return { kind: "listed", frequenciesHz: decodeFrequencies(blocks) };
}

/** All traces of a sweep with all their levels, in their order. */
export async function loadTraces(
  tx: Transaction,
  teamId: string,
  sweepId: string,
): Promise<Trace[]> {
  const rows = await tx
    .select()
    .from(traces)
    .where(and(eq(traces.teamId, teamId), eq(traces.sweepId, sweepId)))
    .orderBy(asc(traces.position));
  const loaded: Trace[] = [];
  for (const row of rows) {
    const place = { teamId, traceId: row.id };
    const { name, kind, detector, hold, unit } = row;
    loaded.push({
      name,
      kind,
      detector,
      hold,
      unit,
      axis: await loadAxis(tx, place, row.axis),
      levelsDb: decodeLevels(await selectBlocks(tx, place, { kind: "level" })),
    });
  }
  return loaded;
}

/** Highest level of each trace before the signal path, in the file's unit; null: not kept. */
export async function loadFileLevels(
  tx: Transaction,
  teamId: string,
  sweepId: string,
): Promise<(number | null)[]> {
  const rows = await tx
    .select({ fileMaxDb: traces.fileMaxDb })
    .from(traces)
    .where(and(eq(traces.teamId, teamId), eq(traces.sweepId, sweepId)))
    .orderBy(asc(traces.position));
  return rows.map((row) => row.fileMaxDb);
}
