import type { Transaction } from "@/db/client";
import { reachesMask } from "@/lib/core/reading/combine-readings";
import { loadSweepDetail } from "@/lib/queries/sweep/load-sweep-detail";
import { viewStoredTrace } from "@/lib/queries/sweep/read-trace-view";
import type { SnapshotSweep } from "./report-snapshot";

/** Columns of the chart on paper: more than a printer shows, few enough for a small file. */
const COLUMNS = 700;

/** All that a report says about one sweep. */
export async function gatherSweep(
  tx: Transaction,
  teamId: string,
  sweepId: string,
): Promise<SnapshotSweep> {
  const sweep = await loadSweepDetail(tx, teamId, sweepId);
  if (!sweep || sweep.archivedAt) throw new Error("A report's sweep is gone or archived.");
  const traces: SnapshotSweep["traces"] = [];
  for (const trace of sweep.traces) {
    const { name, kind, detector, hold, unit, firstHz, lastHz, stepHz, maxDb, maxAtHz } = trace;
    const whole = { fromHz: firstHz, toHz: lastHz, columns: COLUMNS, scale: "log" as const };
    const view = await viewStoredTrace(tx, teamId, trace, whole);
    const points = trace.axis.count;
    traces.push({
      name,
      kind,
      detector,
      hold,
      unit,
      points,
      firstHz,
      lastHz,
      stepHz,
      maxDb,
      maxAtHz,
      view,
    });
  }
  return {
    sweepId: sweep.id,
    name: sweep.name,
    fileName: sweep.fileName,
    fileSha256: sweep.sha256,
    purpose: sweep.purpose,
    measuredOn: sweep.measuredOn,
    importedBy: sweep.importedBy,
    importedAt: sweep.importedAt.toISOString(),
    corrected: sweep.corrected,
    settings: sweep.settings,
    link: sweep.link,
    bench: {
      name: sweep.benchName,
      site: sweep.benchSite,
      instrument: sweep.benchInstrument,
      distanceM: sweep.settings.distanceM,
      guardDb: sweep.guardDb,
      signalPathRevision: sweep.pathRevision,
      impedanceOhm: sweep.path.impedanceOhm,
      transducers: sweep.path.transducers.map(({ name, kind, calibratedOn, dueOn }) => ({
        name,
        kind,
        calibratedOn,
        dueOn,
      })),
    },
    traces,
    // A mask that the sweep only touches at its edge is another sweep's to decide.
    readings: sweep.readings
      .filter(({ reading }) => reading.notComparable !== null || reachesMask(reading))
      .map(({ maskRevision, mask, reading }) => ({ maskRevision, mask, reading })),
  };
}
