import { createHash } from "node:crypto";
import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { combinedReadings } from "@/db/schema";
import type { CombinedReading } from "@/lib/core/reading/combine-readings";
import { combineReadings } from "@/lib/core/reading/combine-readings";
import { decidingPoint } from "@/lib/core/reading/deciding-point";
import { polarizationDoubts } from "@/lib/core/reading/doubts";
import { mustReadTogether } from "@/lib/core/reading/must-read-together";
import { prepareParts, withRestating } from "@/lib/core/reading/prepare-parts";
import { ENGINE_VERSION, readPrepared } from "@/lib/core/reading/read-together";
import type { Reading } from "@/lib/core/reading/reading";
import { loadParts } from "./load-parts";
import type { HeldReading } from "./load-readings";

/** What a combined reading was made from; the same again gives the same. */
function keyOf(held: readonly HeldReading[]): string {
  const [first] = held;
  const made = [
    ENGINE_VERSION,
    first?.maskRevisionId,
    first?.restated,
    ...held.map((row) => row.sweepId),
  ];
  return createHash("sha256").update(JSON.stringify(made)).digest("hex");
}

/**
 * Several sweeps held against one mask revision as one reading, level by level. All of `held` is of
 * one mask; a point's `partIndex` counts in its order. Kept the first time, since sweeps and
 * revisions never change.
 */
export async function readHeldTogether(
  tx: Transaction,
  teamId: string,
  held: readonly HeldReading[],
): Promise<Reading> {
  const [first] = held;
  if (!first) throw new Error("Nothing to read together.");
  const key = keyOf(held);
  const own = and(eq(combinedReadings.teamId, teamId), eq(combinedReadings.key, key));
  const [kept] = await tx
    .select({ content: combinedReadings.content })
    .from(combinedReadings)
    .where(own);
  if (kept) return kept.content;
  const parts = await loadParts(
    tx,
    teamId,
    held.map((row) => row.sweepId),
  );
  const reading = readPrepared(withRestating(prepareParts(parts), first.restated), first.mask);
  const content = {
    ...reading,
    doubts: [...reading.doubts, ...polarizationDoubts(first.mask, parts)],
  };
  await tx.insert(combinedReadings).values({ teamId, key, content }).onConflictDoNothing();
  return content;
}

function linesOf({ lines, standing, coverage, ...reading }: Reading): CombinedReading {
  const deciding = decidingPoint({ lines });
  const combined = lines.map((line) => ({
    name: line.name,
    standing: line.standing,
    worst: line.worst,
    source: line.worst?.partIndex ?? null,
    coverage: line.coverage.fraction,
  }));
  const line = combined.find(({ name }) => name === deciding?.line.name);
  return {
    standing,
    lines: combined,
    deciding:
      deciding && line
        ? { ...line, worst: deciding.point, source: deciding.point.partIndex }
        : null,
    coverage: reading.notComparable === null ? coverage.fraction : 0,
  };
}

/**
 * Where sweeps stand under one mask together. From their own readings where that says the same, and
 * from their levels where one of them silences another's upper bound.
 */
export async function combineHeld(
  tx: Transaction,
  teamId: string,
  held: readonly HeldReading[],
): Promise<CombinedReading | null> {
  const [first, ...rest] = held;
  if (!first) return null;
  if (rest.length > 0 && mustReadTogether(first.mask, held))
    return linesOf(await readHeldTogether(tx, teamId, held));
  return combineReadings(
    first.mask,
    held.map(({ reading, settings, traces }) => ({
      lines: reading.lines,
      guardDb: reading.guardDb,
      scans: traces.filter(({ kind }) => kind === "scan"),
      polarization: settings.port === "radiated" ? settings.polarization : null,
    })),
  );
}
