import type { Context } from "@/lib/auth/context";
import { createBuild } from "@/lib/commands/program/create-build";
import type { TestDatabase } from "../../support/database";
import type { Place } from "../../support/sweeps";
import { addedDb, importLevels, levelsOf } from "../../support/sweeps";

/** Readings of a bench sweep of 28 points: a peak every 10 MHz may have its margin under 50 dBµV/m. */
export function peaksAt(margins: Record<number, number>): number[] {
  const peaks = Object.entries(margins).map(([mhz, marginDb]) => {
    const hz = Number(mhz) * 1e6;
    return [(Number(mhz) - 30) / 10, 50 - marginDb - addedDb(hz)] as const;
  });
  return levelsOf(5, Object.fromEntries(peaks));
}

/** Imports a sweep with peaks at whole tens of MHz, each with its margin in dB. */
export async function importPeaks(
  ctx: Context,
  place: Pick<Place, "buildId" | "benchId">,
  margins: Record<number, number>,
  change: Record<string, unknown> = {},
  table: Parameters<typeof importLevels>[4] = {},
): Promise<string> {
  return (await importLevels(ctx, place, peaksAt(margins), change, table)).sweepId;
}

export async function addBuild(ctx: Context, place: Place, name: string): Promise<Place> {
  const input = { programId: place.programId, name, builtOn: null, notes: "" };
  return { ...place, buildId: (await createBuild(ctx, input)).buildId };
}

/** The reading of a sweep and its suspects' numbers by frequency in MHz. */
export async function readingOf(database: TestDatabase, sweepId: string) {
  const found = await database.owner.query<{ id: string; number: number; mhz: number }>(
    `select r.id, s.number, round(s.sample_hz / 1e6)::int as mhz
       from readings r left join suspects s on s.reading_id = r.id
      where r.sweep_id = $1 order by s.number`,
    [sweepId],
  );
  const readingId = found.rows[0]?.id ?? "";
  const numberAt = (mhz: number) => found.rows.find((row) => row.mhz === mhz)?.number ?? 0;
  return { readingId, numberAt };
}
