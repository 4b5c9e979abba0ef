import { and, eq, inArray } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { sweeps } from "@/db/schema";
import type { SuspectAmbient } from "@/lib/core/reading/ambient-check";
import type { Doubt, Suspect } from "@/lib/core/reading/reading";
import { readHeldTogether } from "@/lib/queries/sweep/combine-held";
import type { HeldReading } from "@/lib/queries/sweep/load-readings";
import { loadReadings } from "@/lib/queries/sweep/load-readings";
import type { ReadingDetail } from "@/lib/queries/sweep/list-readings";
import type { SweepDetail } from "@/lib/queries/sweep/load-sweep-detail";
import type { MaskNotes } from "./mask-notes";
import type { SnapshotCombined } from "./report-content";

/**
 * The product sweeps of a report held together against each mask that they reach, level by level:
 * the same that the build's standing comes from, with its doubts and what is to be measured again.
 */
export async function gatherCombined(
  tx: Transaction,
  teamId: string,
  details: readonly SweepDetail[],
  notes: MaskNotes,
): Promise<SnapshotCombined[]> {
  const ids = details.filter(({ purpose }) => purpose === "product").map(({ id }) => id);
  if (ids.length === 0) return [];
  const held = await loadReadings(
    tx,
    teamId,
    and(inArray(sweeps.id, ids), eq(sweeps.purpose, "product")),
  );
  const combined: SnapshotCombined[] = [];
  for (const maskRevisionId of new Set(held.map((row) => row.maskRevisionId))) {
    const own = held.filter((row) => row.maskRevisionId === maskRevisionId);
    const [first] = own;
    if (!first) continue;
    const parts = own.map((row) => detailOf(details, row));
    const reading = await readHeldTogether(tx, teamId, own);
    combined.push({
      maskRevisionId,
      maskRevision: parts[0]?.maskRevision ?? 0,
      mask: first.mask,
      confirmation: notes.get(maskRevisionId) ?? null,
      sweepIds: own.map((row) => row.sweepId),
      reading: { ...reading, doubts: [...reading.doubts, ...dayDoubts(own, parts)] },
      ambient: reading.suspects.flatMap((suspect) => ambientOf(suspect, parts)),
    });
  }
  return combined;
}

function detailOf(
  details: readonly SweepDetail[],
  { sweepId, maskRevisionId }: HeldReading,
): ReadingDetail | undefined {
  return details
    .find(({ id }) => id === sweepId)
    ?.readings.find((reading) => reading.maskRevisionId === maskRevisionId);
}

/** The doubts of each bench's day, which no reading stores; each once, with the sweeps that have it. */
function dayDoubts(
  held: readonly HeldReading[],
  parts: readonly (ReadingDetail | undefined)[],
): Doubt[] {
  const found = new Map<string, { doubt: Doubt; partIndexes: number[] }>();
  held.forEach(({ reading }, partIndex) => {
    const stored = new Set(reading.doubts.map(({ code, text }) => `${code} ${text}`));
    for (const doubt of parts[partIndex]?.reading.doubts ?? []) {
      const key = `${doubt.code} ${doubt.text}`;
      if (stored.has(key)) continue;
      const known = found.get(key) ?? { doubt, partIndexes: [] };
      found.set(key, { ...known, partIndexes: [...known.partIndexes, partIndex] });
    }
  });
  return [...found.values()].map(({ doubt, partIndexes }) =>
    partIndexes.length === held.length ? doubt : { ...doubt, partIndexes },
  );
}

/** What the ambient of its own sweep's day says about a suspect; empty when it says nothing. */
function ambientOf(
  suspect: Suspect,
  parts: readonly (ReadingDetail | undefined)[],
): SuspectAmbient[] {
  const part = parts[suspect.partIndex];
  const alone = part?.reading.suspects.find(
    ({ sampleHz, traceIndex }) =>
      sampleHz === suspect.sampleHz && traceIndex === suspect.traceIndex,
  );
  const ambient = part?.ambient.find(({ number }) => number === alone?.number);
  return ambient ? [{ ...ambient, number: suspect.number }] : [];
}
