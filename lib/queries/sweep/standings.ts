import type { Transaction } from "@/db/client";
import type { Provenance } from "@/lib/core/mask/mask";
import type { Standing } from "@/lib/core/reading/reading";
import { combineHeld } from "./combine-held";
import type { HeldReading } from "./load-readings";
import { worstOf } from "./worst-of";

/** Where some sweeps together stand under one mask. */
export interface MaskStanding {
  maskId: string;
  maskTitle: string;
  /** Limits from memory stay marked wherever a margin under them is shown. */
  provenance: Provenance;
  standing: Standing;
  marginDb: number;
  marginAtHz: number;
  lineName: string;
  /** The sweep that gave the margin. */
  sweepId: string;
  coverage: number;
}

/** Readings taken together mask by mask, in their order. */
export async function standingsOf(
  tx: Transaction,
  teamId: string,
  held: readonly HeldReading[],
): Promise<MaskStanding[]> {
  const standings: MaskStanding[] = [];
  for (const maskId of new Set(held.map((row) => row.maskId))) {
    const own = held.filter((row) => row.maskId === maskId);
    const [first] = own;
    const combined = await combineHeld(tx, teamId, own);
    const deciding = combined?.deciding;
    const decidedBy = deciding ? own[deciding.source] : undefined;
    if (!first || !combined || !deciding || !decidedBy) continue;
    standings.push({
      maskId,
      maskTitle: first.mask.title,
      provenance: first.mask.provenance,
      standing: combined.standing,
      marginDb: deciding.worst.marginDb,
      marginAtHz: deciding.worst.frequencyHz,
      lineName: deciding.name,
      sweepId: decidedBy.sweepId,
      coverage: combined.coverage,
    });
  }
  return standings;
}

/** The mask under which some sweeps stand worst; null when they reach none. */
export async function worstStanding(
  tx: Transaction,
  teamId: string,
  held: readonly HeldReading[],
): Promise<MaskStanding | null> {
  return worstOf(await standingsOf(tx, teamId, held));
}
