import { and, asc, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import {
  benches,
  builds,
  clocks,
  ladders,
  ladderSteps,
  programs,
  signalPathRevisions,
  storedFiles,
  sweeps,
  traces,
  uncertaintyBudgets,
  users,
} from "@/db/schema";
import { listAmbientSweeps, listFloorSweeps } from "./list-ambient";
import { listReadings } from "./list-readings";

const DETAIL = {
  id: sweeps.id,
  name: sweeps.name,
  fileName: sweeps.fileName,
  purpose: sweeps.purpose,
  measuredOn: sweeps.measuredOn,
  corrected: sweeps.corrected,
  settings: sweeps.settings,
  link: sweeps.link,
  guardDb: sweeps.guardDb,
  /** As it was at the import; null: the bench named none. */
  instrument: sweeps.instrument,
  /** Uncertainty budget in force at the import; null: the bench had none. */
  budget: uncertaintyBudgets.content,
  notes: sweeps.notes,
  onRecord: sweeps.onRecord,
  archivedAt: sweeps.archivedAt,
  importedAt: sweeps.createdAt,
  importedBy: users.name,
  benchId: sweeps.benchId,
  benchName: benches.name,
  benchSite: benches.site,
  benchInstrument: benches.instrument,
  signalPathRevisionId: sweeps.signalPathRevisionId,
  pathRevision: signalPathRevisions.revision,
  path: signalPathRevisions.content,
  buildId: builds.id,
  buildName: builds.name,
  programId: programs.id,
  programName: programs.name,
  ladderId: ladders.id,
  ladderName: ladders.name,
  stepId: sweeps.stepId,
  stepName: ladderSteps.name,
  stepPosition: ladderSteps.position,
  sha256: storedFiles.sha256,
  sizeBytes: storedFiles.sizeBytes,
};

/** A sweep with its traces and readings, inside a unit of work of its team; null without one. */
export async function loadSweepDetail(tx: Transaction, teamId: string, sweepId: string) {
  const [sweep] = await tx
    .select(DETAIL)
    .from(sweeps)
    .innerJoin(users, eq(users.id, sweeps.importedBy))
    .innerJoin(benches, and(eq(benches.teamId, sweeps.teamId), eq(benches.id, sweeps.benchId)))
    .innerJoin(
      signalPathRevisions,
      and(
        eq(signalPathRevisions.teamId, sweeps.teamId),
        eq(signalPathRevisions.id, sweeps.signalPathRevisionId),
      ),
    )
    .innerJoin(
      storedFiles,
      and(eq(storedFiles.teamId, sweeps.teamId), eq(storedFiles.id, sweeps.fileId)),
    )
    .innerJoin(builds, and(eq(builds.teamId, sweeps.teamId), eq(builds.id, sweeps.buildId)))
    .innerJoin(programs, and(eq(programs.teamId, builds.teamId), eq(programs.id, builds.programId)))
    .leftJoin(
      uncertaintyBudgets,
      and(eq(uncertaintyBudgets.teamId, sweeps.teamId), eq(uncertaintyBudgets.id, sweeps.budgetId)),
    )
    .leftJoin(
      ladderSteps,
      and(eq(ladderSteps.teamId, sweeps.teamId), eq(ladderSteps.id, sweeps.stepId)),
    )
    .leftJoin(
      ladders,
      and(eq(ladders.teamId, ladderSteps.teamId), eq(ladders.id, ladderSteps.ladderId)),
    )
    .where(and(eq(sweeps.teamId, teamId), eq(sweeps.id, sweepId)));
  if (!sweep) return null;
  const traceRows = await tx
    .select()
    .from(traces)
    .where(and(eq(traces.teamId, teamId), eq(traces.sweepId, sweepId)))
    .orderBy(asc(traces.position));
  const ambients = await listAmbientSweeps(tx, teamId, [sweep]);
  const floor = await listFloorSweeps(tx, teamId, {
    ...sweep,
    sweepId,
    detectors: traceRows.map((trace) => trace.detector),
  });
  const clockRows = await tx
    .select({ name: clocks.name, frequencyHz: clocks.frequencyHz })
    .from(clocks)
    .where(and(eq(clocks.teamId, teamId), eq(clocks.buildId, sweep.buildId)))
    .orderBy(asc(clocks.frequencyHz));
  const readings = await listReadings(tx, teamId, {
    sweepId,
    programId: sweep.programId,
    benchId: sweep.benchId,
    measuredOn: sweep.measuredOn,
    port: sweep.settings.port,
    ambients,
  });
  // An ambient sweep's own page names the others of its day.
  const ambient = ambients.flatMap(({ id, name }) => (id === sweepId ? [] : [{ id, name }]));
  return { ...sweep, traces: traceRows, ambient, floor, clocks: clockRows, readings };
}

export type SweepDetail = NonNullable<Awaited<ReturnType<typeof loadSweepDetail>>>;
