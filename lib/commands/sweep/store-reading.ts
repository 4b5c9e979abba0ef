import type { Transaction } from "@/db/client";
import { readings } from "@/db/schema";
import type { Mask } from "@/lib/core/mask/mask";
import { decidingPoint } from "@/lib/core/reading/deciding-point";
import type { Reading } from "@/lib/core/reading/reading";
import { readSweep } from "@/lib/core/reading/read-sweep";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import type { Trace } from "@/lib/core/sweep/trace";
import { storeSuspects } from "./store-suspects";

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
  await storeSuspects(tx, { teamId, readingId: row.id }, found);
  return reading;
}
