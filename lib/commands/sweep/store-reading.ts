import type { Transaction } from "@/db/client";
import { readings } from "@/db/schema";
import type { Mask } from "@/lib/core/mask/mask";
import { decidingPoint } from "@/lib/core/reading/deciding-point";
import type { PreparedParts } from "@/lib/core/reading/prepare-parts";
import { withRestating } from "@/lib/core/reading/prepare-parts";
import { readPrepared } from "@/lib/core/reading/read-together";
import type { Reading } from "@/lib/core/reading/reading";
import type { LoadedAmbient } from "./hold-ambient";
import { holdReadingBesideAmbients } from "./hold-ambient";
import { storeSuspects } from "./store-suspects";

export interface MaskToHold {
  maskId: string;
  revisionId: string;
  content: Mask;
  /** The program asks for levels restated to the mask's distance. */
  restated: boolean;
}

export interface SweepToRead {
  teamId: string;
  sweepId: string;
  prepared: PreparedParts;
  /** Ambient sweeps of the same bench and day. */
  ambients: readonly LoadedAmbient[];
}

/** Holds a sweep against one mask revision and keeps the reading, its suspects and its ambient. */
export async function storeReading(
  tx: Transaction,
  { teamId, sweepId, prepared, ambients }: SweepToRead,
  mask: MaskToHold,
): Promise<Reading> {
  const reading = readPrepared(withRestating(prepared, mask.restated), mask.content);
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
      restated: mask.restated,
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
  if (ambients.length > 0) await holdReadingBesideAmbients(tx, teamId, row.id, ambients);
  return reading;
}
