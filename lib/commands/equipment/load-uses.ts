import { and, desc, eq, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { benches, signalPathRevisions } from "@/db/schema";

/** Where a piece of equipment stands now: a bench that is not archived, and in what part of it. */
export interface EquipmentUse {
  equipmentId: string;
  benchId: string;
  benchName: string;
  as: "instrument" | "signal path";
}

/** Every use of the team's equipment on open benches; of a signal path the current revision counts. */
export async function loadUses(tx: Transaction, teamId: string): Promise<EquipmentUse[]> {
  const rows = await tx
    .selectDistinctOn([benches.id], {
      benchId: benches.id,
      benchName: benches.name,
      instrumentId: benches.instrumentId,
      content: signalPathRevisions.content,
    })
    .from(benches)
    .innerJoin(
      signalPathRevisions,
      and(
        eq(signalPathRevisions.teamId, benches.teamId),
        eq(signalPathRevisions.benchId, benches.id),
      ),
    )
    .where(and(eq(benches.teamId, teamId), isNull(benches.archivedAt)))
    .orderBy(benches.id, desc(signalPathRevisions.revision));
  return rows
    .flatMap(({ benchId, benchName, instrumentId, content }): EquipmentUse[] => [
      ...(instrumentId
        ? [{ equipmentId: instrumentId, benchId, benchName, as: "instrument" as const }]
        : []),
      ...content.transducers.flatMap(({ equipmentId }) =>
        equipmentId ? [{ equipmentId, benchId, benchName, as: "signal path" as const }] : [],
      ),
    ])
    .sort((a, b) => a.benchName.localeCompare(b.benchName, "en"));
}
