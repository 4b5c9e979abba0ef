import { and, asc, eq, inArray, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { benches, readings, signalPathRevisions, suspects, sweeps, traces } from "@/db/schema";
import type {
  ComparedReading,
  ComparedSuspect,
  ComparedSweep,
  ComparedTrace,
} from "@/lib/core/delta/compared-sweep";
import type { Trace } from "@/lib/core/sweep/trace";
import type { HeldReading } from "./load-readings";
import { loadReadings } from "./load-readings";
import { loadTraces } from "./load-trace";

/** Sweeps as a delta compares them, by the time of their import, archived ones left out. */
export async function loadComparedSweeps(
  tx: Transaction,
  teamId: string,
  sweepIds: string[],
): Promise<ComparedSweep[]> {
  if (sweepIds.length === 0) return [];
  const rows = await tx
    .select({
      id: sweeps.id,
      name: sweeps.name,
      purpose: sweeps.purpose,
      benchId: sweeps.benchId,
      benchName: benches.name,
      signalPathRevisionId: sweeps.signalPathRevisionId,
      signalPathRevision: signalPathRevisions.revision,
      corrected: sweeps.corrected,
      settings: sweeps.settings,
      link: sweeps.link,
    })
    .from(sweeps)
    .innerJoin(benches, and(eq(benches.teamId, sweeps.teamId), eq(benches.id, sweeps.benchId)))
    .innerJoin(
      signalPathRevisions,
      and(
        eq(signalPathRevisions.teamId, sweeps.teamId),
        eq(signalPathRevisions.id, sweeps.signalPathRevisionId),
      ),
    )
    .where(and(eq(sweeps.teamId, teamId), inArray(sweeps.id, sweepIds), isNull(sweeps.archivedAt)))
    .orderBy(asc(sweeps.createdAt), asc(sweeps.id));
  const traceRows = await tx
    .select({
      sweepId: traces.sweepId,
      name: traces.name,
      kind: traces.kind,
      detector: traces.detector,
      hold: traces.hold,
      unit: traces.unit,
      firstHz: traces.firstHz,
      lastHz: traces.lastHz,
      stepHz: traces.stepHz,
      maxDb: traces.maxDb,
      floorDb: traces.floorDb,
      powerSumDb: traces.powerSumDb,
    })
    .from(traces)
    .where(and(eq(traces.teamId, teamId), inArray(traces.sweepId, sweepIds)))
    .orderBy(asc(traces.position));
  const held = await loadReadings(tx, teamId, inArray(sweeps.id, sweepIds));
  const found = await loadSuspects(tx, teamId, sweepIds);
  return rows.map((row) => {
    const own = traceRows.flatMap(({ sweepId, ...trace }) => (sweepId === row.id ? [trace] : []));
    const readings = held
      .filter(({ sweepId }) => sweepId === row.id)
      .map((one) => comparedReading(one, own, found.get(`${row.id} ${one.maskRevisionId}`) ?? []));
    return { ...row, traces: own, readings };
  });
}

function comparedReading(
  { maskRevisionId, mask, reading }: HeldReading,
  own: readonly ComparedTrace[],
  suspects: ComparedSuspect[],
): ComparedReading {
  const margin = (worst: { marginDb: number; traceIndex: number } | null) => ({
    marginDb: worst?.marginDb ?? null,
    decidedBy: worst ? (own[worst.traceIndex]?.detector ?? null) : null,
  });
  return {
    maskRevisionId,
    maskTitle: mask.title,
    guardDb: reading.guardDb,
    lines: reading.lines.map((line) => ({
      name: line.name,
      standing: line.standing,
      ...margin(line.worst),
      bands: bandsOf(line).map(({ startHz, stopHz, worst }) => ({
        startHz,
        stopHz,
        ...margin(worst),
      })),
    })),
    suspects,
  };
}

/** Suspects of the sweeps' readings, by sweep and mask revision. */
async function loadSuspects(
  tx: Transaction,
  teamId: string,
  sweepIds: string[],
): Promise<Map<string, ComparedSuspect[]>> {
  const rows = await tx
    .select({
      sweepId: readings.sweepId,
      maskRevisionId: readings.maskRevisionId,
      frequencyHz: suspects.frequencyHz,
      levelDb: suspects.levelDb,
      traceIndex: suspects.tracePosition,
    })
    .from(suspects)
    .innerJoin(
      readings,
      and(eq(readings.teamId, suspects.teamId), eq(readings.id, suspects.readingId)),
    )
    .where(and(eq(suspects.teamId, teamId), inArray(readings.sweepId, sweepIds)))
    .orderBy(asc(suspects.number));
  const found = new Map<string, ComparedSuspect[]>();
  for (const { sweepId, maskRevisionId, ...suspect } of rows) {
    const key = `${sweepId} ${maskRevisionId}`;
    const own = found.get(key) ?? [];
    own.push(suspect);
    found.set(key, own);
  }
  return found;
}

type HeldLine = HeldReading["reading"]["lines"][number];

/** Bands of a line; readings that an older engine made have none. */
function bandsOf(line: Omit<HeldLine, "bands"> & Partial<Pick<HeldLine, "bands">>) {
  return line.bands ?? [];
}

/** Traces with all their levels, once for each sweep, by sweep id. */
export async function loadLevels(
  tx: Transaction,
  teamId: string,
  sweepIds: Iterable<string>,
): Promise<Map<string, Trace[]>> {
  const levels = new Map<string, Trace[]>();
  for (const id of new Set(sweepIds)) levels.set(id, await loadTraces(tx, teamId, id));
  return levels;
}
