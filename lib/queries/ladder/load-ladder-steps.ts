import { and, asc, eq, inArray, isNull, max } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { builds, clocks, ladders, ladderSteps, programs, sweeps } from "@/db/schema";
import type { ComparedSweep } from "@/lib/core/delta/compared-sweep";
import type { StepState } from "@/lib/core/delta/ladder-order";
import { baseOfStep, lineOfSteps } from "@/lib/core/delta/ladder-order";
import type { Mask } from "@/lib/core/mask/mask";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { Doubt } from "@/lib/core/reading/reading";
import { DOUBT_CODES } from "@/lib/core/reading/reading";
import type { ReadingDoubts } from "../sweep/list-doubts";
import { listReadingDoubts } from "../sweep/list-doubts";
import type { HeldReading } from "../sweep/load-readings";
import { loadReadings } from "../sweep/load-readings";
import type { MaskStanding } from "../sweep/standings";
import { worstStanding } from "../sweep/standings";
import { loadComparedSweeps, loadLevels } from "../sweep/load-compared";
import { loadAcceptances } from "./load-acceptances";
import type { StepDeltas } from "./step-deltas";
import { stepDeltas } from "./step-deltas";

export interface LadderStep extends StepDeltas {
  id: string;
  position: number;
  name: string;
  description: string;
  /** The step that this one starts from, where somebody said so. */
  branchOfId: string | null;
  state: StepState;
  /** The step that it is held against; null for step 0. */
  base: { id: string; position: number; name: string } | null;
  /** Whether it led to the product as it stands: neither dropped nor left out by a branch. */
  isOnLine: boolean;
  /** The mask under which the step's product sweeps together stand worst. */
  worst: MaskStanding | null;
  /** Of the step's newest product sweep; null without one. */
  link: LinkSettings | null;
  onRecord: boolean;
  sweeps: ComparedSweep[];
  /** Doubts of the step's readings in force, each once, with how many of its sweeps have it. */
  doubts: (Doubt & { sweeps: number })[];
}

/** Doubts that say the same once, in the order of `DOUBT_CODES`. */
function gatherDoubts(readings: readonly ReadingDoubts[]): LadderStep["doubts"] {
  const found = new Map<string, { doubt: Doubt; sweepIds: Set<string> }>();
  for (const { sweepId, stored, derived } of readings) {
    for (const { partIndexes: _parts, ...doubt } of [...stored, ...derived]) {
      const key = `${doubt.code} ${doubt.text}`;
      const known = found.get(key) ?? { doubt, sweepIds: new Set<string>() };
      known.sweepIds.add(sweepId);
      found.set(key, known);
    }
  }
  return [...found.values()]
    .map(({ doubt, sweepIds }) => ({ ...doubt, sweeps: sweepIds.size }))
    .sort((x, y) => DOUBT_CODES.indexOf(x.code) - DOUBT_CODES.indexOf(y.code));
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
  const ordered = rows.map((row) => ({ ...row, sweeps: sweepsOf(row.id) }));
  const products = compared.filter((sweep) => sweep.purpose === "product").map(({ id }) => id);
  const deltas = stepDeltas(ordered, {
    // Nothing is followed while there is only one step.
    levels: await loadLevels(tx, teamId, rows.length > 1 ? products : []),
    acceptances: await loadAcceptances(tx, teamId, products),
    tolerancePpm: await largestTolerance(tx, teamId, ladder.buildId),
  });
  const line = new Set(lineOfSteps(rows).map((row) => row.id));
  const doubts =
    placed.length === 0
      ? []
      : await listReadingDoubts(
          tx,
          teamId,
          inArray(
            sweeps.id,
            placed.map((sweep) => sweep.id),
          ),
        );
  const steps: LadderStep[] = [];
  for (const [i, row] of ordered.entries()) {
    const { id, position, name, description, branchOfId, state } = row;
    const own = placed.filter((s) => s.stepId === id && s.purpose === "product");
    const base = baseOfStep(rows, i);
    steps.push({
      id,
      position,
      name,
      description,
      branchOfId,
      state,
      base: base && { id: base.id, position: base.position, name: base.name },
      isOnLine: line.has(id),
      link: own.at(-1)?.link ?? null,
      onRecord: own.some((sweep) => sweep.onRecord),
      worst: await worstStanding(
        tx,
        teamId,
        held.filter(({ sweepId }) => own.some((sweep) => sweep.id === sweepId)),
      ),
      sweeps: row.sweeps,
      doubts: gatherDoubts(doubts.filter(({ sweepId }) => own.some((s) => s.id === sweepId))),
      againstPrevious: deltas[i]?.againstPrevious ?? [],
      againstStart: deltas[i]?.againstStart ?? [],
      unpaired: deltas[i]?.unpaired ?? [],
    });
  }
  const isUnsure = ({ mask }: HeldReading) => mask.provenance === "from memory";
  const fromMemory = held.filter(isUnsure).map((row) => row.maskRevisionId);
  return { ...ladder, steps, masks: masksOf(held), fromMemory: [...new Set(fromMemory)] };
}

/** Largest stated tolerance of a build's clocks in ppm: which clock a line is of is not known. */
async function largestTolerance(tx: Transaction, teamId: string, buildId: string): Promise<number> {
  const [found] = await tx
    .select({ ppm: max(clocks.tolerancePpm) })
    .from(clocks)
    .where(and(eq(clocks.teamId, teamId), eq(clocks.buildId, buildId)));
  return found?.ppm ?? 0;
}

/** The masks that some sweep of the ladder reaches, each once. */
function masksOf(held: HeldReading[]): Mask[] {
  return [...new Map(held.map((row) => [row.maskRevisionId, row.mask])).values()];
}

export type LadderDetail = NonNullable<Awaited<ReturnType<typeof loadLadderSteps>>>;
