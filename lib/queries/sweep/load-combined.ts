import type { SQL } from "drizzle-orm";
import { and, eq, inArray } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { StoredReading } from "@/db/schema";
import { benches, sweeps } from "@/db/schema";
import type { Mask } from "@/lib/core/mask/mask";
import { polarizationDoubts } from "@/lib/core/reading/doubts";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import { readHeldTogether } from "./combine-held";
import type { HeldReading } from "./load-readings";
import { loadReadings } from "./load-readings";

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

/** The product sweeps in scope taken together, mask by mask; masks that none reaches are left out. */
export async function loadCombined(
  tx: Transaction,
  teamId: string,
  scope: SQL | undefined,
): Promise<CombinedDetail[]> {
  const held = await loadReadings(tx, teamId, scope);
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
      reading,
      sweeps: await loadSweeps(tx, teamId, ids),
    });
  }
  return details;
}
