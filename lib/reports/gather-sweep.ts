import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { sweeps, uncertaintyBudgets } from "@/db/schema";
import { reachesMask } from "@/lib/core/reading/combine-readings";
import { followedOf } from "@/lib/queries/suspect/followed-of";
import { loadReadingSuspects } from "@/lib/queries/suspect/load-reading-suspects";
import type { ReadingDetail } from "@/lib/queries/sweep/list-readings";
import { loadSweepDetail } from "@/lib/queries/sweep/load-sweep-detail";
import type { SweepDetail } from "@/lib/queries/sweep/load-sweep-detail";
import { viewStoredTrace } from "@/lib/queries/sweep/read-trace-view";
import type { MaskNotes } from "./mask-notes";
import type { SnapshotBudget, SnapshotFollowed, SnapshotSweep } from "./report-content";
import { snapshotBudget } from "./snapshot-budget";

/** Columns of the chart on paper: more than a printer shows, few enough for a small file. */
const COLUMNS = 700;

/** A report's sweep with everything that its own page shows; an archived one is refused. */
export async function loadReportSweep(
  tx: Transaction,
  teamId: string,
  sweepId: string,
): Promise<SweepDetail> {
  const sweep = await loadSweepDetail(tx, teamId, sweepId);
  if (!sweep || sweep.archivedAt) throw new Error("A report's sweep is gone or archived.");
  return sweep;
}

/** All that a report says about one sweep. */
export async function gatherSweep(
  tx: Transaction,
  teamId: string,
  sweep: SweepDetail,
  notes: MaskNotes,
): Promise<SnapshotSweep> {
  const readings: SnapshotSweep["readings"] = [];
  for (const detail of sweep.readings) {
    const { maskRevisionId, maskRevision, mask, reading, ambient } = detail;
    // A mask that the sweep only touches at its edge is another sweep's to decide.
    if (reading.notComparable === null && !reachesMask(reading)) continue;
    const confirmation = notes.get(maskRevisionId) ?? null;
    const followed = await gatherFollowed(tx, teamId, detail);
    readings.push({ maskRevisionId, maskRevision, mask, confirmation, reading, ambient, followed });
  }
  const { instrument } = sweep;
  return {
    sweepId: sweep.id,
    name: sweep.name,
    fileName: sweep.fileName,
    fileSha256: sweep.sha256,
    purpose: sweep.purpose,
    onRecord: sweep.onRecord,
    measuredOn: sweep.measuredOn,
    importedBy: sweep.importedBy,
    importedAt: sweep.importedAt.toISOString(),
    corrected: sweep.corrected,
    settings: sweep.settings,
    link: sweep.link,
    ambientSweeps: sweep.ambient.map(({ name }) => name),
    floorSweeps: sweep.floor.map(({ name }) => name),
    bench: {
      name: sweep.benchName,
      site: sweep.benchSite,
      instrument: sweep.benchInstrument,
      calibration: instrument && {
        name: instrument.name,
        calibratedOn: instrument.calibratedOn,
        dueOn: instrument.dueOn,
      },
      distanceM: sweep.settings.distanceM,
      guardDb: sweep.guardDb,
      budget: await gatherBudget(tx, teamId, sweep.id),
      signalPathRevision: sweep.pathRevision,
      impedanceOhm: sweep.path.impedanceOhm,
      transducers: sweep.path.transducers.map(({ name, kind, calibratedOn, dueOn }) => ({
        name,
        kind,
        calibratedOn,
        dueOn,
      })),
    },
    traces: await gatherTraces(tx, teamId, sweep),
    readings,
  };
}

async function gatherTraces(
  tx: Transaction,
  teamId: string,
  sweep: SweepDetail,
): Promise<SnapshotSweep["traces"]> {
  const traces: SnapshotSweep["traces"] = [];
  for (const trace of sweep.traces) {
    const { name, kind, detector, hold, unit, firstHz, lastHz, stepHz, maxDb, maxAtHz } = trace;
    const whole = { fromHz: firstHz, toHz: lastHz, columns: COLUMNS, scale: "log" as const };
    const view = await viewStoredTrace(tx, teamId, trace, whole);
    const described = { name, kind, detector, hold, unit, points: trace.axis.count };
    traces.push({ ...described, firstHz, lastHz, stepHz, maxDb, maxAtHz, view });
  }
  return traces;
}

async function gatherBudget(
  tx: Transaction,
  teamId: string,
  sweepId: string,
): Promise<SnapshotBudget | null> {
  const [budget] = await tx
    .select({ content: uncertaintyBudgets.content, revision: uncertaintyBudgets.revision })
    .from(sweeps)
    .innerJoin(
      uncertaintyBudgets,
      and(eq(uncertaintyBudgets.teamId, sweeps.teamId), eq(uncertaintyBudgets.id, sweeps.budgetId)),
    )
    .where(and(eq(sweeps.teamId, teamId), eq(sweeps.id, sweepId)));
  return budget && budget.content.lines.length > 0
    ? snapshotBudget(budget.content, budget.revision)
    : null;
}

async function gatherFollowed(
  tx: Transaction,
  teamId: string,
  { id }: ReadingDetail,
): Promise<SnapshotFollowed[]> {
  const found = await loadReadingSuspects(tx, teamId, id);
  if (!found || found.suspects.length === 0) return [];
  const { programId, suspects, resolution } = found;
  const marks = await followedOf(tx, teamId, programId, suspects, resolution);
  return marks.map(({ number, followedNumber, state, isSame }) => ({
    number,
    followedNumber,
    state,
    isSame,
  }));
}
