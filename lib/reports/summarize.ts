import type {
  Basis,
  Doubt,
  DoubtCode,
  LineReading,
  MarginPoint,
  Standing,
} from "@/lib/core/reading/reading";
import type { LevelUnit } from "@/lib/core/units/level-units";
import type { ReportSnapshot, SnapshotReading, SnapshotSweep } from "./report-snapshot";

const WORST_FIRST: readonly Standing[] = ["over", "undecided", "inside-guard", "clear"];

function standingRank(standing: Standing): number {
  return WORST_FIRST.indexOf(standing);
}

export interface LineSummary {
  maskTitle: string;
  maskRevision: number;
  lineName: string;
  unit: LevelUnit;
  /** The worst standing among the sweeps, and the sweep it comes from. */
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

function rowsOf(sweep: SnapshotSweep, { mask, maskRevision, reading }: SnapshotReading) {
  const at = {
    maskTitle: mask.title,
    maskRevision,
    unit: reading.unit,
    standingSweep: sweep.name,
    sweepCount: 1,
  };
  const key = `${mask.key} ${mask.title} ${maskRevision}`;
  if (reading.lines.length === 0) {
    const explanation = reading.notComparable ?? "This mask has no lines.";
    const standing: Standing = "undecided";
    const row = { ...at, lineName: "whole mask", standing, explanation, worst: null };
    return [{ key: `${key} -`, row }];
  }
  return reading.lines.map(({ lineIndex, name, standing, explanation, worst: point, basis }) => {
    const stepHz = (point && sweep.traces[point.traceIndex]?.stepHz) ?? undefined;
    const worst = point ? { point, basis, sweep: sweep.name, stepHz } : null;
    const row: LineSummary = { ...at, lineName: name, standing, explanation, worst };
    return { key: `${key} ${lineIndex}`, row };
  });
}

/** Over first, then what has no margin at all, then the lowest margin. */
function urgency(standing: Standing, marginDb: number | null): number {
  const within = marginDb ?? -1e6;
  return standing === "over" ? within - 1e9 : within;
}

/** One row per mask line over all product sweeps, the most urgent first. */
export function summarizeLines(snapshot: ReportSnapshot): LineSummary[] {
  const byLine = new Map<string, LineSummary>();
  for (const sweep of productSweeps(snapshot))
    for (const { key, row } of sweep.readings.flatMap((reading) => rowsOf(sweep, reading))) {
      const known = byLine.get(key);
      if (!known) {
        byLine.set(key, row);
        continue;
      }
      known.sweepCount += 1;
      const ranked = standingRank(row.standing) - standingRank(known.standing);
      const lower = marginOf(row) < marginOf(known);
      if (ranked < 0 || (ranked === 0 && lower)) {
        known.standing = row.standing;
        known.standingSweep = row.standingSweep;
        known.explanation = row.explanation;
      }
      if (lower) known.worst = row.worst;
    }
  const rank = ({ standing, worst }: LineSummary) =>
    urgency(standing, worst?.point.marginDb ?? null);
  return [...byLine.values()].sort((a, b) => rank(a) - rank(b));
}

function marginOf(row: LineSummary): number {
  return row.worst?.point.marginDb ?? Number.POSITIVE_INFINITY;
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
