import type { SQL } from "drizzle-orm";
import { and, eq, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { readings, sweeps } from "@/db/schema";
import { reachesMask } from "@/lib/core/reading/combine-readings";
import type { DoubtCode } from "@/lib/core/reading/reading";
import { DOUBT_CODES } from "@/lib/core/reading/reading";
import type { CheckOfDay } from "../bench-check/check-of-day";
import { checkOfDay } from "../bench-check/check-of-day";
import { deriveDoubts } from "./derive-doubts";
import type { BenchDay } from "./list-ambient";
import { ambientsOf, listAmbientSweeps, loadHeldAmbients } from "./list-ambient";
import { loadSuspects } from "./list-readings";
import { isNewestRevision } from "./newest-revision";

/** The bench checks of some benches' days, each looked up once. */
async function loadDayChecks(
  tx: Transaction,
  teamId: string,
  days: readonly BenchDay[],
): Promise<(day: BenchDay) => CheckOfDay | null> {
  const keyOf = (day: BenchDay) => `${day.benchId} ${day.measuredOn}`;
  const found = new Map<string, CheckOfDay | null>();
  for (const day of days) {
    if (day.measuredOn === null || found.has(keyOf(day))) continue;
    found.set(keyOf(day), await checkOfDay(tx, teamId, day.benchId, day.measuredOn));
  }
  return (day) => found.get(keyOf(day)) ?? null;
}

/**
 * Which doubts the readings in force of some sweeps have, stored and derived ones alike, in the
 * order of `DOUBT_CODES`; by the sweep's id. Readings that cannot be compared or only touch a mask
 * say nothing, as in every list.
 */
export async function listSweepDoubts(
  tx: Transaction,
  teamId: string,
  scope: SQL,
): Promise<Map<string, DoubtCode[]>> {
  const all = await tx
    .select({
      id: readings.id,
      sweepId: readings.sweepId,
      content: readings.content,
      settings: sweeps.settings,
      benchId: sweeps.benchId,
      measuredOn: sweeps.measuredOn,
    })
    .from(readings)
    .innerJoin(sweeps, and(eq(sweeps.teamId, readings.teamId), eq(sweeps.id, readings.sweepId)))
    .where(
      and(
        eq(readings.teamId, teamId),
        isNull(sweeps.archivedAt),
        isNull(readings.notComparable),
        isNewestRevision(),
        scope,
      ),
    );
  const rows = all.filter(({ content }) => reachesMask(content));
  const ids = rows.map((row) => row.id);
  const suspects = await loadSuspects(tx, teamId, ids);
  const heldOf = await loadHeldAmbients(tx, teamId, ids);
  const ambients = await listAmbientSweeps(tx, teamId, rows);
  const dayCheck = await loadDayChecks(tx, teamId, rows);
  const codes = new Map<string, Set<DoubtCode>>();
  for (const row of rows) {
    const own = codes.get(row.sweepId) ?? new Set<DoubtCode>();
    codes.set(row.sweepId, own);
    const { port } = row.settings;
    const derived = deriveDoubts(
      { ...row.content, suspects: suspects.get(row.id) ?? [] },
      { port, ambients: heldOf(row.id, ambientsOf(ambients, row, port)), check: dayCheck(row) },
    );
    for (const { code } of [...row.content.doubts, ...derived.doubts]) own.add(code);
  }
  return new Map(
    [...codes].map(([sweepId, own]) => [sweepId, DOUBT_CODES.filter((code) => own.has(code))]),
  );
}
