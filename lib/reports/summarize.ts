import type {
  Basis,
  Doubt,
  DoubtCode,
  LineReading,
  MarginPoint,
  Standing,
} from "@/lib/core/reading/reading";
import type { CombinedLine } from "@/lib/core/reading/combine-readings";
import { combineReadings } from "@/lib/core/reading/combine-readings";
import type { LevelUnit } from "@/lib/core/units/level-units";
import type { ReportSnapshot, SnapshotReading, SnapshotSweep } from "./report-snapshot";

export interface LineSummary {
  maskTitle: string;
  maskRevision: number;
  fromMemory: boolean;
  lineName: string;
  unit: LevelUnit;
  /** Of the sweeps together, and the sweep that it comes from. */
  standing: Standing;
  standingSweep: string;
  explanation: string | null;
  /** The lowest margin among the sweeps; it may come from another sweep than the standing. */
  worst: { point: MarginPoint; basis: Basis; sweep: string; stepHz: number | undefined } | null;
  sweepCount: number;
}

export function productSweeps(snapshot: ReportSnapshot): SnapshotSweep[] {
  return snapshot.sweeps.filter((sweep) => sweep.purpose === "product");
}

/** Over first, then what has no margin at all, then the lowest margin. */
function urgency(standing: Standing, marginDb: number | null): number {
  const within = marginDb ?? -1e6;
  return standing === "over" ? within - 1e9 : within;
}

interface HeldSweep {
  sweep: SnapshotSweep;
  held: SnapshotReading;
}

/** Readings of the product sweeps by mask revision, in the order of the sweeps. */
function byMask(snapshot: ReportSnapshot): HeldSweep[][] {
  const groups = new Map<string, HeldSweep[]>();
  for (const sweep of productSweeps(snapshot))
    for (const held of sweep.readings) {
      const { mask, maskRevision, reading } = held;
      const kind = reading.lines.length === 0 ? `whole ${sweep.sweepId}` : "lines";
      const key = `${mask.key} ${mask.title} ${maskRevision} ${kind}`;
      groups.set(key, [...(groups.get(key) ?? []), { sweep, held }]);
    }
  return [...groups.values()];
}

/** Why the combined standing of a line needs a word, in the words of the sweep that gave it. */
function explain(line: CombinedLine, source: LineReading | undefined): string | null {
  if (line.standing !== "undecided") return null;
  if (line.worst && line.worst.marginDb >= 0 && line.coverage < 1) {
    const percent = Math.min(99, Math.floor(line.coverage * 100));
    return `Within the mask on ${percent} % of it; the rest was not swept.`;
  }
  return source?.explanation ?? null;
}

function rowsOf(group: HeldSweep[]): LineSummary[] {
  const [first] = group;
  if (!first) return [];
  const { mask, maskRevision, reading } = first.held;
  const fromMemory = mask.provenance === "from memory";
  const at = {
    maskTitle: mask.title,
    maskRevision,
    fromMemory,
    unit: reading.unit,
    sweepCount: group.length,
  };
  if (reading.lines.length === 0) {
    const explanation = reading.notComparable ?? "This mask has no lines.";
    const standingSweep = first.sweep.name;
    return [
      {
        ...at,
        lineName: "whole mask",
        standing: "undecided",
        standingSweep,
        explanation,
        worst: null,
      },
    ];
  }
  const readings = group.map(({ held }) => held.reading);
  return combineReadings(mask, readings).lines.map((line, i): LineSummary => {
    const from = line.source === null ? undefined : group[line.source];
    const own = from?.held.reading.lines[i] ?? reading.lines[i];
    const inGuard = group.find(({ held }) => {
      const point = held.reading.lines[i]?.worst;
      return point && point.marginDb < held.reading.guardDb;
    });
    const decider = (line.standing === "inside-guard" ? inGuard : from) ?? first;
    const point = line.worst;
    const stepHz = (point && from?.sweep.traces[point.traceIndex]?.stepHz) ?? undefined;
    return {
      ...at,
      lineName: line.name,
      standing: line.standing,
      standingSweep: decider.sweep.name,
      explanation: explain(line, own),
      worst:
        point && from && own ? { point, basis: own.basis, sweep: from.sweep.name, stepHz } : null,
    };
  });
}

/** One row per mask line over all product sweeps, the most urgent first. */
export function summarizeLines(snapshot: ReportSnapshot): LineSummary[] {
  const rank = ({ standing, worst }: LineSummary) =>
    urgency(standing, worst?.point.marginDb ?? null);
  return byMask(snapshot)
    .flatMap(rowsOf)
    .sort((a, b) => rank(a) - rank(b));
}

export interface Deciding {
  sweep: SnapshotSweep;
  /** null: the sweep has not been held against a mask. */
  held: SnapshotReading | null;
}

/** The product reading that is over, then the one with the lowest margin: what the chart shows. */
export function decidingReading(snapshot: ReportSnapshot): Deciding | null {
  const sweeps = productSweeps(snapshot);
  const candidates = sweeps
    .flatMap((sweep) => sweep.readings.map((held) => ({ sweep, held })))
    .filter(({ held }) => held.reading.lines.some((line) => line.worst !== null))
    .map(({ sweep, held }) => {
      const ranks = held.reading.lines.flatMap(({ standing, worst }) =>
        worst ? [urgency(standing, worst.marginDb)] : [],
      );
      return { sweep, held, rank: Math.min(...ranks) };
    })
    .sort((a, b) => a.rank - b.rank);
  const [first] = candidates;
  if (first) return { sweep: first.sweep, held: first.held };
  const unheld = sweeps[0];
  return unheld ? { sweep: unheld, held: unheld.readings[0] ?? null } : null;
}

/** The line of a reading that its chart is about. */
export function decidingLine({ reading }: SnapshotReading): LineReading | null {
  const lines = reading.lines.filter((line) => line.worst !== null);
  const rank = (line: LineReading) => urgency(line.standing, line.worst?.marginDb ?? null);
  return lines.sort((a, b) => rank(a) - rank(b))[0] ?? null;
}

/** What can move a standing comes before what only blurs it. */
const IMPORTANT_FIRST: readonly DoubtCode[] = [
  "not-covered",
  "overload-suspected",
  "calibration-overdue",
  "rbw-differs",
  "rbw-unstated",
  "mask-from-memory",
  "plane-wave-assumed",
  "distance-restated",
  "step-coarse",
  "ambient-near",
  "ambient-not-taken",
  "rbw-kind-differs",
  "sweep-time-short",
];

/** Doubts of all product readings, each text once, the most important first. */
export function rankDoubts(snapshot: ReportSnapshot): Doubt[] {
  const all = productSweeps(snapshot).flatMap((s) => s.readings.flatMap((r) => r.reading.doubts));
  const once = [...new Map(all.map((doubt) => [doubt.text, doubt])).values()];
  const rank = (doubt: Doubt) => IMPORTANT_FIRST.indexOf(doubt.code);
  return once.sort(
    (a, b) => rank(a) - rank(b) || Math.abs(b.valueDb ?? 0) - Math.abs(a.valueDb ?? 0),
  );
}
