import type { SQL } from "drizzle-orm";
import { and, asc, eq, inArray, isNotNull, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { StoredReading } from "@/db/schema";
import { benches, builds, readings, sweeps } from "@/db/schema";
import type { Mask } from "@/lib/core/mask/mask";
import { polarizationDoubts } from "@/lib/core/reading/doubts";
import type { Doubt } from "@/lib/core/reading/reading";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import { readHeldTogether } from "./combine-held";
import type { HeldReading } from "./load-readings";
import type { ReadingDoubts } from "./list-doubts";
import { listReadingDoubts } from "./list-doubts";
import { loadReadings } from "./load-readings";
import { isNewestRevision } from "./newest-revision";

/** A sweep that a combined reading is made of. */
export interface CombinedSweep {
  id: string;
  name: string;
  benchName: string;
  settings: MeasurementSettings;
}

/** Some sweeps held against one mask as one reading. */
export interface CombinedDetail {
  maskId: string;
  mask: Mask;
  reading: StoredReading;
  /** In the order of `partIndex`. */
  sweeps: CombinedSweep[];
  /** Sweeps in scope that cannot be held against this mask, and why. */
  notHeld: { sweepId: string; name: string; reason: string }[];
}

async function loadSweeps(
  tx: Transaction,
  teamId: string,
  ids: string[],
): Promise<CombinedSweep[]> {
  const rows = await tx
    .select({
      id: sweeps.id,
      name: sweeps.name,
      benchName: benches.name,
      settings: sweeps.settings,
    })
    .from(sweeps)
    .innerJoin(benches, and(eq(benches.teamId, sweeps.teamId), eq(benches.id, sweeps.benchId)))
    .where(and(eq(sweeps.teamId, teamId), inArray(sweeps.id, ids)));
  return ids.flatMap((id) => rows.find((row) => row.id === id) ?? []);
}

/** The reading of the only sweep, with what is missing where no other one is. */
function alone({ mask, reading, settings }: HeldReading): StoredReading {
  return { ...reading, doubts: [...reading.doubts, ...polarizationDoubts(mask, [{ settings }])] };
}

/** Sweeps in scope whose reading in force says that they cannot be held against its mask. */
async function loadNotHeld(tx: Transaction, teamId: string, scope: SQL | undefined) {
  const rows = await tx
    .select({
      sweepId: sweeps.id,
      name: sweeps.name,
      maskId: readings.maskId,
      reason: readings.notComparable,
    })
    .from(readings)
    .innerJoin(sweeps, and(eq(sweeps.teamId, readings.teamId), eq(sweeps.id, readings.sweepId)))
    .innerJoin(builds, and(eq(builds.teamId, sweeps.teamId), eq(builds.id, sweeps.buildId)))
    .where(
      and(
        eq(readings.teamId, teamId),
        isNull(sweeps.archivedAt),
        isNotNull(readings.notComparable),
        isNewestRevision(),
        scope,
      ),
    )
    .orderBy(asc(sweeps.createdAt), asc(sweeps.id));
  return rows.flatMap(({ reason, ...row }) => (reason === null ? [] : [{ ...row, reason }]));
}

/** The doubts of each bench's day, each once, with the sweeps that have it unless all do. */
function dayDoubts(held: readonly HeldReading[], all: readonly ReadingDoubts[]): Doubt[] {
  const found = new Map<string, { doubt: Doubt; partIndexes: number[] }>();
  held.forEach(({ sweepId, maskId }, partIndex) => {
    const own = all.find((row) => row.sweepId === sweepId && row.maskId === maskId);
    for (const doubt of own?.derived ?? []) {
      const key = `${doubt.code} ${doubt.text}`;
      const known = found.get(key) ?? { doubt, partIndexes: [] };
      found.set(key, { ...known, partIndexes: [...known.partIndexes, partIndex] });
    }
  });
  return [...found.values()].map(({ doubt, partIndexes }) =>
    partIndexes.length === held.length ? doubt : { ...doubt, partIndexes },
  );
}

/** The product sweeps in scope taken together, mask by mask; masks that none reaches are left out. */
export async function loadCombined(
  tx: Transaction,
  teamId: string,
  scope: SQL | undefined,
): Promise<CombinedDetail[]> {
  const held = await loadReadings(tx, teamId, scope);
  const ofDay = await listReadingDoubts(tx, teamId, scope);
  const refused = await loadNotHeld(tx, teamId, scope);
  const details: CombinedDetail[] = [];
  for (const maskId of new Set(held.map((row) => row.maskId))) {
    const own = held.filter((row) => row.maskId === maskId);
    const [first, ...rest] = own;
    if (!first) continue;
    const reading = rest.length === 0 ? alone(first) : await readHeldTogether(tx, teamId, own);
    const ids = own.map((row) => row.sweepId);
    details.push({
      maskId,
      mask: first.mask,
      reading: { ...reading, doubts: [...reading.doubts, ...dayDoubts(own, ofDay)] },
      sweeps: await loadSweeps(tx, teamId, ids),
      notHeld: refused.filter((row) => row.maskId === maskId),
    });
  }
  return details;
}
