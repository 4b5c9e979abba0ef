import type { Transaction } from "@/db/client";
import { readings, suspects } from "@/db/schema";
import type { Mask } from "@/lib/core/mask/mask";
import { decidingPoint } from "@/lib/core/reading/deciding-point";
import type { Reading } from "@/lib/core/reading/reading";
import { readSweep } from "@/lib/core/reading/read-sweep";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import type { Trace } from "@/lib/core/sweep/trace";

export interface MaskToHold {
  maskId: string;
  revisionId: string;
  content: Mask;
}

export interface SweepToRead {
  teamId: string;
  sweepId: string;
  traces: Trace[];
  settings: MeasurementSettings;
  guardDb: number;
  impedanceOhm: number;
  overdueTransducers: string[];
}

/** A statement takes at most 65,535 values, and a noisy sweep can have more suspects than that. */
const SUSPECTS_AT_ONCE = 1000;

/** Holds a sweep against one mask revision and keeps the reading with its suspects. */
export async function storeReading(
  tx: Transaction,
  sweep: SweepToRead,
  mask: MaskToHold,
): Promise<Reading> {
  const { teamId, sweepId, overdueTransducers, ...measured } = sweep;
  const reading = readSweep({
    ...measured,
    mask: mask.content,
    context: { overdueTransducers },
  });
  const { suspects: found, ...content } = reading;
  const deciding = decidingPoint(reading);
  const [row] = await tx
    .insert(readings)
    .values({
      teamId,
      sweepId,
      maskId: mask.maskId,
      maskRevisionId: mask.revisionId,
      engineVersion: reading.engineVersion,
      standing: reading.standing,
      marginDb: deciding?.point.marginDb ?? null,
      marginAtHz: deciding?.point.frequencyHz ?? null,
      lineName: deciding?.line.name ?? null,
      coverage: reading.coverage.fraction,
      notComparable: reading.notComparable,
      content,
    })
    .returning({ id: readings.id });
  if (!row) throw new Error("The reading was not stored.");
  for (let from = 0; from < found.length; from += SUSPECTS_AT_ONCE) {
    await tx.insert(suspects).values(
      found.slice(from, from + SUSPECTS_AT_ONCE).map(({ traceIndex, ...suspect }) => ({
        teamId,
        readingId: row.id,
        tracePosition: traceIndex,
        ...suspect,
      })),
    );
  }
  return reading;
}
