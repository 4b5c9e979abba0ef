import { and, asc, eq, inArray, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { builds, ladders, ladderSteps, maskRevisions, programs, sweeps } from "@/db/schema";
import type { ComparedSweep } from "@/lib/core/delta/compared-sweep";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import { loadComparedSweeps } from "../sweep/load-compared";
import type { StepDeltas } from "./step-deltas";
import { stepDeltas } from "./step-deltas";

export interface LadderStep extends StepDeltas {
  id: string;
  position: number;
  name: string;
  description: string;
  /** Of the step's newest product sweep; null without one. */
  link: LinkSettings | null;
  onRecord: boolean;
  sweeps: ComparedSweep[];
}

/** A ladder with the deltas of its steps, inside a unit of work of its team; null without one. */
export async function loadLadderSteps(tx: Transaction, teamId: string, ladderId: string) {
  const [ladder] = await tx
    .select({
      id: ladders.id,
      name: ladders.name,
      notes: ladders.notes,
      archivedAt: ladders.archivedAt,
      buildId: builds.id,
      buildName: builds.name,
      programId: programs.id,
      programName: programs.name,
      targetMarginDb: programs.targetMarginDb,
    })
    .from(ladders)
    .innerJoin(builds, and(eq(builds.teamId, ladders.teamId), eq(builds.id, ladders.buildId)))
    .innerJoin(programs, and(eq(programs.teamId, builds.teamId), eq(programs.id, builds.programId)))
    .where(and(eq(ladders.teamId, teamId), eq(ladders.id, ladderId)));
  if (!ladder) return null;
  const rows = await tx
    .select()
    .from(ladderSteps)
    .where(and(eq(ladderSteps.teamId, teamId), eq(ladderSteps.ladderId, ladderId)))
    .orderBy(asc(ladderSteps.position));
  const ids = rows.map((row) => row.id);
  const placed =
    ids.length === 0
      ? []
      : await tx
          .select({
            id: sweeps.id,
            stepId: sweeps.stepId,
            link: sweeps.link,
            purpose: sweeps.purpose,
            onRecord: sweeps.onRecord,
          })
          .from(sweeps)
          .where(
            and(eq(sweeps.teamId, teamId), inArray(sweeps.stepId, ids), isNull(sweeps.archivedAt)),
          )
          .orderBy(asc(sweeps.createdAt));
  const compared = await loadComparedSweeps(
    tx,
    teamId,
    placed.map((sweep) => sweep.id),
  );
  const sweepsOf = (stepId: string) => {
    const own = new Set(placed.filter((s) => s.stepId === stepId).map((s) => s.id));
    return compared.filter((sweep) => own.has(sweep.id));
  };
  const bySteps = rows.map((row) => sweepsOf(row.id));
  const deltas = stepDeltas(bySteps);
  const steps = rows.map(({ id, position, name, description }, i): LadderStep => {
    const own = placed.filter((s) => s.stepId === id && s.purpose === "product");
    return {
      id,
      position,
      name,
      description,
      link: own.at(-1)?.link ?? null,
      onRecord: own.some((sweep) => sweep.onRecord),
      sweeps: bySteps[i] ?? [],
      againstPrevious: deltas[i]?.againstPrevious ?? [],
      againstStart: deltas[i]?.againstStart ?? [],
    };
  });
  return { ...ladder, steps, mask: await drawnMask(tx, teamId, compared) };
}

/** The mask that the overlay draws: the one under which most of the sweeps have a margin. */
async function drawnMask(tx: Transaction, teamId: string, compared: ComparedSweep[]) {
  const counts = new Map<string, number>();
  for (const sweep of compared) {
    for (const { maskRevisionId, lines } of sweep.readings) {
      if (lines.some((line) => line.marginDb !== null))
        counts.set(maskRevisionId, (counts.get(maskRevisionId) ?? 0) + 1);
    }
  }
  const [most] = [...counts].sort((a, b) => b[1] - a[1]);
  if (!most) return null;
  const [row] = await tx
    .select({ content: maskRevisions.content })
    .from(maskRevisions)
    .where(and(eq(maskRevisions.teamId, teamId), eq(maskRevisions.id, most[0])));
  return row?.content ?? null;
}

export type LadderDetail = NonNullable<Awaited<ReturnType<typeof loadLadderSteps>>>;
