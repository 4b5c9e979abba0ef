import { decidingPoint } from "@/lib/core/reading/deciding-point";
import type { Basis, MarginPoint, Standing } from "@/lib/core/reading/reading";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { markOfMask } from "./mask-mark";
import type {
  ReportContent,
  SnapshotCombined,
  SnapshotReading,
  SnapshotSweep,
} from "./report-content";

export interface LineSummary {
  maskTitle: string;
  maskRevision: number;
  /** "from memory, not confirmed", who confirmed it, or null for a mask that needs neither. */
  mark: string | null;
  isConfirmed: boolean;
  lineName: string;
  unit: LevelUnit;
  standing: Standing;
  explanation: string | null;
  /** Share of the line that was swept, 0…1. */
  coverage: number;
  worst: LineWorst | null;
}

interface LineWorst {
  point: MarginPoint;
  basis: Basis;
  /** The sweep that gave the level, with its polarization where it states one. */
  decidedBy: string;
  sweepId: string;
  stepHz: number | undefined;
}

export function productSweeps(content: Pick<ReportContent, "sweeps">): SnapshotSweep[] {
  return content.sweeps.filter((sweep) => sweep.purpose === "product");
}

/** The sweep that a `partIndex` of a combined reading means. */
export function sweepOfPart(
  content: Pick<ReportContent, "sweeps">,
  { sweepIds }: Pick<SnapshotCombined, "sweepIds">,
  partIndex: number,
): SnapshotSweep | undefined {
  const id = sweepIds[partIndex];
  return content.sweeps.find((sweep) => sweep.sweepId === id);
}

/** Name and polarization, unless the name says it already. */
export function nameWithPosition({ name, settings }: SnapshotSweep): string {
  const { polarization, port } = settings;
  if (polarization === null || port !== "radiated") return name;
  return name.toLowerCase().includes(polarization) ? name : `${name}, ${polarization}`;
}

/** Over first, then what has no margin at all, then the lowest margin. */
function urgency(standing: Standing, marginDb: number | null): number {
  const within = marginDb ?? -1e6;
  return standing === "over" ? within - 1e9 : within;
}

/** The lines of one mask as all product sweeps together stand under them. */
export function linesOfMask(
  content: Pick<ReportContent, "sweeps">,
  combined: SnapshotCombined,
): LineSummary[] {
  const { mask, maskRevision, confirmation, reading } = combined;
  return reading.lines.map((line): LineSummary => {
    const { worst: point } = line;
    const sweep = point ? sweepOfPart(content, combined, point.partIndex) : undefined;
    return {
      maskTitle: mask.title,
      maskRevision,
      mark: markOfMask(mask.provenance, confirmation),
      isConfirmed: confirmation !== null,
      lineName: line.name,
      unit: reading.unit,
      standing: line.standing,
      explanation: line.explanation,
      coverage: line.coverage.fraction,
      worst: point && {
        point,
        basis: line.basis,
        decidedBy: sweep ? nameWithPosition(sweep) : "",
        sweepId: sweep?.sweepId ?? "",
        stepHz: sweep?.traces[point.traceIndex]?.stepHz ?? undefined,
      },
    };
  });
}

/** One row per mask line over all product sweeps, the most urgent first. */
export function summarizeLines(content: ReportContent): LineSummary[] {
  const rank = ({ standing, worst }: LineSummary) =>
    urgency(standing, worst?.point.marginDb ?? null);
  return content.combined
    .flatMap((combined) => linesOfMask(content, combined))
    .sort((a, b) => rank(a) - rank(b));
}

export interface Deciding {
  /** The sweep that gave the deciding level: what the chart shows. */
  sweep: SnapshotSweep;
  /** Its own reading of the deciding mask; null: it was not held against one. */
  held: SnapshotReading | null;
  combined: SnapshotCombined | null;
  /** Where it counts, in the sweep's own traces. */
  point: MarginPoint | null;
}

/** The mask that is over, then the one with the lowest margin, and the sweep that decided it. */
export function decidingReading(content: ReportContent): Deciding | null {
  const [first] = content.combined
    .flatMap((combined) => {
      const deciding = decidingPoint(combined.reading);
      const sweep = deciding && sweepOfPart(content, combined, deciding.point.partIndex);
      if (!sweep) return [];
      const { line, point } = deciding;
      return [{ combined, sweep, point, rank: urgency(line.standing, point.marginDb) }];
    })
    .sort((a, b) => a.rank - b.rank);
  if (first) {
    const { combined, sweep, point } = first;
    const held = sweep.readings.find((one) => one.maskRevisionId === combined.maskRevisionId);
    return { sweep, held: held ?? null, combined, point };
  }
  const [unheld] = productSweeps(content);
  return unheld
    ? { sweep: unheld, held: unheld.readings[0] ?? null, combined: null, point: null }
    : null;
}
