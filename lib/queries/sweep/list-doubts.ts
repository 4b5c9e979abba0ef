import type { SQL } from "drizzle-orm";
import { and, eq, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { readings, sweeps } from "@/db/schema";
import { reachesMask } from "@/lib/core/reading/combine-readings";
import type { Doubt, DoubtCode } from "@/lib/core/reading/reading";
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

/** The doubts of one reading in force: those stored with it, and those of its bench's day. */
export interface ReadingDoubts {
  sweepId: string;
  maskId: string;
  stored: Doubt[];
  derived: Doubt[];
}

/**
 * The doubts of the readings in force of some sweeps. Readings that cannot be compared or only touch
 * a mask say nothing, as in every list.
 */
export async function listReadingDoubts(
  tx: Transaction,
  teamId: string,
  scope: SQL | undefined,
): Promise<ReadingDoubts[]> {
  const all = await tx
    .select({
      id: readings.id,
      sweepId: readings.sweepId,
      maskId: readings.maskId,
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
  return rows.map((row) => {
    const { port } = row.settings;
    const { doubts } = deriveDoubts(
      { ...row.content, suspects: suspects.get(row.id) ?? [] },
      { port, ambients: heldOf(row.id, ambientsOf(ambients, row, port)), check: dayCheck(row) },
    );
    const { sweepId, maskId, content } = row;
    return { sweepId, maskId, stored: content.doubts, derived: doubts };
  });
}

/** Which doubts some sweeps have, in the order of `DOUBT_CODES`; by the sweep's id. */
export async function listSweepDoubts(
  tx: Transaction,
  teamId: string,
  scope: SQL,
): Promise<Map<string, DoubtCode[]>> {
  const codes = new Map<string, Set<DoubtCode>>();
  for (const { sweepId, stored, derived } of await listReadingDoubts(tx, teamId, scope)) {
    const own = codes.get(sweepId) ?? new Set<DoubtCode>();
    codes.set(sweepId, own);
    for (const { code } of [...stored, ...derived]) own.add(code);
  }
  return new Map(
    [...codes].map(([sweepId, own]) => [sweepId, DOUBT_CODES.filter((code) => own.has(code))]),
  );
}
