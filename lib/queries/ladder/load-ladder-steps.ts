import { and, asc, eq, inArray, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { builds, ladders, ladderSteps, programs, sweeps } from "@/db/schema";
import type { ComparedSweep } from "@/lib/core/delta/compared-sweep";
import type { Mask } from "@/lib/core/mask/mask";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { HeldReading, MaskStanding } from "../sweep/load-readings";
import { loadReadings, worstStanding } from "../sweep/load-readings";
import { loadComparedSweeps } from "../sweep/load-compared";
import type { StepDeltas } from "./step-deltas";
import { stepDeltas } from "./step-deltas";

export interface LadderStep extends StepDeltas {
  id: string;
  position: number;
  name: string;
  description: string;
  /** The mask under which the step's product sweeps together stand worst. */
  worst: MaskStanding | null;
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
  const held = await loadReadings(
    tx,
    teamId,
    inArray(
      sweeps.id,
      placed.map((sweep) => sweep.id),
    ),
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
      worst: worstStanding(held.filter((row) => own.some((s) => s.id === row.sweepId))),
      sweeps: bySteps[i] ?? [],
      againstPrevious: deltas[i]?.againstPrevious ?? [],
      againstStart: deltas[i]?.againstStart ?? [],
    };
  });
  return { ...ladder, steps, masks: masksOf(held) };
}

/** The masks that some sweep of the ladder reaches, each once. */
function masksOf(held: HeldReading[]): Mask[] {
  return [...new Map(held.map((row) => [row.maskRevisionId, row.mask])).values()];
}

export type LadderDetail = NonNullable<Awaited<ReturnType<typeof loadLadderSteps>>>;
