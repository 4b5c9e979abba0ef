import { powerMeanMarginDb } from "../stats/power-mean";
import type { Detector } from "../sweep/settings";
import type { ComparedMargin, ComparedSweep } from "./compared-sweep";
import type { MeasuredChange, SidedDelta } from "./delta";
import type { OrderedStep } from "./ladder-order";
import { baseOfStep, lineOfSteps } from "./ladder-order";
import { changeOf, measureChange } from "./measured-change";
import { groupRepeats } from "./repeats";

/** A step with its sweeps and its deltas against the step that it is held against. */
export interface WaterfallStep extends OrderedStep {
  position: number;
  name: string;
  sweeps: readonly ComparedSweep[];
  againstPrevious: readonly SidedDelta[];
}

/** A line of a mask or, with frequencies, one of its bands. */
export interface WaterfallSubject {
  maskRevisionId: string;
  lineName: string;
  band: { startHz: number; stopHz: number } | null;
}

export interface WaterfallBar {
  stepId: string;
  position: number;
  name: string;
  /** "line": led to the product as it stands; "beside": dropped, or left out by a branch. */
  place: "start" | "line" | "beside";
  /** Position of the step that it is held against; null for step 0. */
  basePosition: number | null;
  /** Margin of the step that it is held against and its own, dB. */
  fromDb: number | null;
  toDb: number | null;
  /** null for step 0 and where `gap` says why there is none. */
  change: MeasuredChange | null;
  /** Short, "not comparable"; null when there is a change or nothing to say. */
  gap: string | null;
  /** A mismatch was accepted with a reason. */
  isAccepted: boolean;
}

interface StepMargin {
  ids: string[];
  marginDb: number;
  marginsDb: number[];
  decidedBy: Detector | null;
}

function marginIn(sweep: ComparedSweep, subject: WaterfallSubject): ComparedMargin | null {
  const { maskRevisionId, lineName, band } = subject;
  const reading = sweep.readings.find((r) => r.maskRevisionId === maskRevisionId);
  const line = reading?.lines.find((l) => l.name === lineName);
  if (!line || !band) return line ?? null;
  return line.bands.find((b) => b.startHz === band.startHz && b.stopHz === band.stopHz) ?? null;
}

/** Margins of a step's product sweeps, repeats together; the lowest first. */
function marginsOf(step: WaterfallStep, subject: WaterfallSubject): StepMargin[] {
  return groupRepeats(step.sweeps.filter((sweep) => sweep.purpose === "product"))
    .flatMap((group): StepMargin[] => {
      const found = group.map((sweep) => marginIn(sweep, subject));
      const marginsDb = found.flatMap((margin) => margin?.marginDb ?? []);
      if (marginsDb.length < group.length) return [];
      const [decidedBy = null] = found.map((margin) => margin?.decidedBy ?? null);
      const isOne = found.every((margin) => margin?.decidedBy === decidedBy);
      return [
        {
          ids: group.map((sweep) => sweep.id),
          marginDb: powerMeanMarginDb(marginsDb),
          marginsDb,
          decidedBy: isOne ? decidedBy : null,
        },
      ];
    })
    .sort((a, b) => a.marginDb - b.marginDb);
}

/** Why the difference of two steps' lowest margins is no change of the product; null when it is. */
function whyGap(
  before: readonly StepMargin[],
  after: readonly StepMargin[],
  deltas: readonly SidedDelta[],
): string | null {
  const has = (ids: readonly string[], margin: StepMargin) =>
    margin.ids.some((id) => ids.includes(id));
  const held = deltas.filter((delta) => after.some((margin) => has(delta.afterIds, margin)));
  if (held.some((delta) => !delta.changes)) return "not comparable";
  const isPaired =
    after.every((margin) => held.some((delta) => has(delta.afterIds, margin))) &&
    before.every((margin) => held.some((delta) => has(delta.beforeIds, margin)));
  if (!isPaired) return "not the same sweeps";
  const [a, b] = [before[0]?.decidedBy, after[0]?.decidedBy];
  return a && a === b ? null : "other detector";
}

function barOf(
  step: WaterfallStep,
  base: WaterfallStep | null,
  isOnLine: boolean,
  subject: WaterfallSubject,
): WaterfallBar {
  const after = marginsOf(step, subject);
  const before = base ? marginsOf(base, subject) : [];
  const [earlier, later] = [before[0], after[0]];
  const bar: WaterfallBar = {
    stepId: step.id,
    position: step.position,
    name: step.name,
    place: base === null ? "start" : isOnLine ? "line" : "beside",
    basePosition: base?.position ?? null,
    fromDb: earlier?.marginDb ?? null,
    toDb: later?.marginDb ?? null,
    change: null,
    gap: null,
    isAccepted: step.againstPrevious.some((delta) => delta.accepted !== null),
  };
  if (!later) return { ...bar, gap: step.sweeps.length === 0 ? "no sweep" : "no margin" };
  if (!base) return bar;
  if (!earlier) return { ...bar, gap: `nothing at step ${base.position}` };
  const gap = whyGap(before, after, step.againstPrevious);
  if (gap) return { ...bar, gap };
  const measured = measureChange(earlier.marginsDb, later.marginsDb, powerMeanMarginDb);
  return { ...bar, change: changeOf(measured) };
}

/**
 * What each step of a ladder did to the worst margin of one mask line or band, in ladder order:
 * the lowest margin of the step's sweeps against that of the step it is held against. The bars
 * of the line of steps that led to the product join where nothing is missing.
 */
export function waterfallOf(
  steps: readonly WaterfallStep[],
  subject: WaterfallSubject,
): WaterfallBar[] {
  const line = new Set(lineOfSteps(steps).map((step) => step.id));
  return steps.map((step, i) => barOf(step, baseOfStep(steps, i), line.has(step.id), subject));
}

/** A mask line that some product sweep of the steps has a margin under, with its bands. */
export interface WaterfallLine {
  maskRevisionId: string;
  maskTitle: string;
  lineName: string;
  /** The largest guard that a sweep of the ladder was read with, dB. */
  guardDb: number;
  bands: { startHz: number; stopHz: number }[];
}

/** Every line that has a margin somewhere in the ladder, and its bands that have one. */
export function linesOfLadder(steps: readonly WaterfallStep[]): WaterfallLine[] {
  const lines = new Map<string, WaterfallLine>();
  for (const sweep of steps.flatMap((step) => step.sweeps)) {
    if (sweep.purpose !== "product") continue;
    for (const { maskRevisionId, maskTitle, guardDb, lines: own } of sweep.readings)
      for (const { name, marginDb, bands } of own) {
        if (marginDb === null) continue;
        const key = `${maskRevisionId} ${name}`;
        const fresh = { maskRevisionId, maskTitle, lineName: name, guardDb, bands: [] };
        const line: WaterfallLine = lines.get(key) ?? fresh;
        line.guardDb = Math.max(line.guardDb, guardDb);
        lines.set(key, line);
        for (const { startHz, stopHz, marginDb: margin } of bands) {
          const isKnown = line.bands.some((b) => b.startHz === startHz && b.stopHz === stopHz);
          if (margin !== null && !isKnown) line.bands.push({ startHz, stopHz });
        }
      }
  }
  return [...lines.values()].map((line) => ({
    ...line,
    bands: line.bands.sort((a, b) => a.startHz - b.startHz || a.stopHz - b.stopHz),
  }));
}
