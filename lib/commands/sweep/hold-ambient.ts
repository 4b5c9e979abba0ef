import { and, asc, eq, isNull, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import {
  ambientChecks,
  maskRevisions,
  readings,
  signalPathRevisions,
  suspects,
  sweeps,
  traces,
} from "@/db/schema";
import type { AmbientSweep } from "@/lib/core/reading/comparable-ambient";
import { holdAmbient } from "@/lib/core/reading/hold-ambient";
import { restatementDb } from "@/lib/core/reading/restate-distance";
import type { BenchDay } from "@/lib/queries/sweep/list-ambient";
import { loadTraces } from "@/lib/queries/sweep/load-trace";

/** An ambient sweep with all its levels. */
export interface LoadedAmbient extends AmbientSweep {
  sweepId: string;
}

/**
 * Until the transaction ends, new readings of a bench's day (shared) and new ambient sweeps of it
 * (alone) wait for each other: made at once, neither would see the other.
 */
async function holdDay(
  tx: Transaction,
  teamId: string,
  { benchId, measuredOn }: BenchDay,
  mode: "shared" | "alone",
): Promise<void> {
  const key = sql`hashtextextended(${`ambient ${teamId} ${benchId} ${measuredOn}`}, 0)`;
  await tx.execute(
    mode === "shared"
      ? sql`select pg_advisory_xact_lock_shared(${key})`
      : sql`select pg_advisory_xact_lock(${key})`,
  );
}

const AMBIENT = {
  sweepId: sweeps.id,
  benchId: sweeps.benchId,
  measuredOn: sweeps.measuredOn,
  settings: sweeps.settings,
  path: signalPathRevisions.content,
};

function selectAmbients(tx: Transaction) {
  return tx
    .select(AMBIENT)
    .from(sweeps)
    .innerJoin(
      signalPathRevisions,
      and(
        eq(signalPathRevisions.teamId, sweeps.teamId),
        eq(signalPathRevisions.id, sweeps.signalPathRevisionId),
      ),
    );
}

type AmbientRow = Awaited<ReturnType<typeof selectAmbients>>[number];

async function loadAmbient(
  tx: Transaction,
  teamId: string,
  { sweepId, settings, path }: AmbientRow,
): Promise<LoadedAmbient> {
  const { impedanceOhm } = path;
  return { sweepId, settings, impedanceOhm, traces: await loadTraces(tx, teamId, sweepId) };
}

/** The ambient sweeps of a bench's day that are not archived, with their levels; none undated. */
export async function loadAmbients(
  tx: Transaction,
  teamId: string,
  day: BenchDay,
): Promise<LoadedAmbient[]> {
  if (day.measuredOn === null) return [];
  await holdDay(tx, teamId, day, "shared");
  const rows = await selectAmbients(tx)
    .where(
      and(
        eq(sweeps.teamId, teamId),
        eq(sweeps.benchId, day.benchId),
        eq(sweeps.measuredOn, day.measuredOn),
        eq(sweeps.purpose, "ambient"),
        isNull(sweeps.archivedAt),
      ),
    )
    .orderBy(asc(sweeps.createdAt), asc(sweeps.id));
  const loaded: LoadedAmbient[] = [];
  for (const row of rows) loaded.push(await loadAmbient(tx, teamId, row));
  return loaded;
}

function selectReadings(tx: Transaction) {
  return tx
    .select({
      id: readings.id,
      sweepId: readings.sweepId,
      content: readings.content,
      restated: readings.restated,
      mask: maskRevisions.content,
      settings: sweeps.settings,
      benchId: sweeps.benchId,
      measuredOn: sweeps.measuredOn,
    })
    .from(readings)
    .innerJoin(
      maskRevisions,
      and(eq(maskRevisions.teamId, readings.teamId), eq(maskRevisions.id, readings.maskRevisionId)),
    )
    .innerJoin(sweeps, and(eq(sweeps.teamId, readings.teamId), eq(sweeps.id, readings.sweepId)));
}

type ReadingRow = Awaited<ReturnType<typeof selectReadings>>[number];

/** What the reading adds in dB to restate the sweep's distance as the mask's; none when as taken. */
function distanceDbOf({ restated, settings, mask }: ReadingRow) {
  const [fromM, toM] = [settings.distanceM, mask.distanceM];
  if (!restated || fromM === null || toM === null) return undefined;
  return (frequencyHz: number) => restatementDb(fromM, toM, frequencyHz);
}

/** Holds ambient sweeps beside one reading; pairs that are there already stay as they are. */
async function holdBeside(
  tx: Transaction,
  teamId: string,
  row: ReadingRow,
  ambients: readonly LoadedAmbient[],
): Promise<void> {
  if (ambients.length === 0 || row.content.lines.length === 0) return;
  const found = await tx
    .select()
    .from(suspects)
    .where(and(eq(suspects.teamId, teamId), eq(suspects.readingId, row.id)))
    .orderBy(asc(suspects.number));
  const productTraces = await tx
    .select()
    .from(traces)
    .where(and(eq(traces.teamId, teamId), eq(traces.sweepId, row.sweepId)))
    .orderBy(asc(traces.position));
  const distanceDb = distanceDbOf(row);
  const product = {
    reading: {
      ...row.content,
      suspects: found.map(({ tracePosition, ...suspect }) => ({
        ...suspect,
        traceIndex: tracePosition,
        partIndex: 0,
      })),
    },
    traces: productTraces,
    settings: row.settings,
    mask: row.mask,
    ...(distanceDb ? { distanceDb } : {}),
  };
  await tx
    .insert(ambientChecks)
    .values(
      ambients.map((ambient) => ({
        teamId,
        readingId: row.id,
        ambientSweepId: ambient.sweepId,
        content: holdAmbient(ambient, product),
      })),
    )
    .onConflictDoNothing();
}

/**
 * Holds the ambient sweeps of a new reading's bench and day beside it, in the transaction that
 * made it, after its suspects are there. Who makes several readings of one sweep loads the ambient
 * sweeps once (`loadAmbients`) and hands them in.
 */
export async function holdReadingBesideAmbients(
  tx: Transaction,
  teamId: string,
  readingId: string,
  ambients?: readonly LoadedAmbient[],
): Promise<void> {
  const [row] = await selectReadings(tx).where(
    and(eq(readings.teamId, teamId), eq(readings.id, readingId)),
  );
  if (!row) throw new Error("There is no such reading to hold ambient sweeps beside.");
  await holdBeside(tx, teamId, row, ambients ?? (await loadAmbients(tx, teamId, row)));
}

/**
 * Holds a newly imported or restored ambient sweep beside every reading of its bench and day, those
 * of archived sweeps and of earlier mask revisions too, since both may come back into force.
 */
export async function holdAmbientBesideReadings(
  tx: Transaction,
  teamId: string,
  ambientSweepId: string,
): Promise<void> {
  const [ambient] = await selectAmbients(tx).where(
    and(eq(sweeps.teamId, teamId), eq(sweeps.id, ambientSweepId), eq(sweeps.purpose, "ambient")),
  );
  if (!ambient || ambient.measuredOn === null) return;
  await holdDay(tx, teamId, ambient, "alone");
  const rows = await selectReadings(tx)
    .where(
      and(
        eq(readings.teamId, teamId),
        eq(sweeps.benchId, ambient.benchId),
        eq(sweeps.measuredOn, ambient.measuredOn),
        eq(sweeps.purpose, "product"),
      ),
    )
    .orderBy(asc(readings.createdAt), asc(readings.id));
  if (rows.length === 0) return;
  const loaded = await loadAmbient(tx, teamId, ambient);
  for (const row of rows) await holdBeside(tx, teamId, row, [loaded]);
}
