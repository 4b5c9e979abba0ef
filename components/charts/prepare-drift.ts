import { formatDelta } from "@/lib/core/units/format";
import type { FrameTick } from "./chart-frame";
import { linePath, type ScreenPoint } from "./chart-path";
import type { ChartMargin } from "./chart-plane";
import { labelLevel, levelRange, levelTicks, type LevelRange } from "./level-ticks";
import { spreadApart } from "./spread-apart";
import { dayOf, makeTrendAxis, type TrendAxis } from "./trend-axis";

export interface DriftPoint {
  /** ISO date. */
  measuredOn: string;
  driftWorstDb: number | null;
  driftMeanDb: number | null;
  /** Drifts from different references are different curves. */
  referenceId: string | null;
  href: string;
}

export interface DriftInput {
  /** Of one source, in the order they were taken. */
  points: readonly DriftPoint[];
  /** Days (ISO) of the references. */
  references: readonly string[];
  toleranceDb: number;
  /** ISO date. */
  today: string;
  width: number;
  height: number;
}

export interface PreparedDrift {
  axis: TrendAxis;
  levels: LevelRange;
  levelTicks: FrameTick[];
  margin: ChartMargin;
  /** Edges of the tolerance and its middle, px. */
  band: { topY: number; zeroY: number; bottomY: number };
  worstPath: string;
  meanPath: string;
  marks: { x: number; y: number; drifted: boolean; text: string; href: string }[];
  referenceXs: number[];
  todayX: number | null;
  /** Beside the ends of the two lines; empty where they stand in a list below. */
  names: { key: "worst" | "mean"; text: string; x: number; y: number }[];
  compact: boolean;
  summary: string;
}

/** More than a week without a check: nobody knows how the bench was in between. */
const GAP_DAYS = 7;
const COMPACT_PX = 600;
const LEFT_PX = 38;
const TOP_PX = 22;
const BOTTOM_PX = 24;
const NAMES = { worst: "largest drift", mean: "mean drift" } as const;

/** The screen points of one line with a null wherever it must break. */
function withGaps(
  points: readonly (DriftPoint & { day: number })[],
  place: (day: number, db: number) => ScreenPoint,
  of: (point: DriftPoint) => number | null,
): (ScreenPoint | null)[] {
  return points.flatMap((point, i) => {
    const before = points[i - 1];
    const db = of(point);
    const here = db === null ? null : place(point.day, db);
    const breaks =
      before !== undefined &&
      (point.day - before.day > GAP_DAYS || point.referenceId !== before.referenceId);
    return breaks ? [null, here] : [here];
  });
}

/** Drift over dates in px: the largest and the mean of each check, and the tolerance as a band. */
export function prepareDrift(input: DriftInput): PreparedDrift {
  const { references, toleranceDb, today, width, height } = input;
  const points = input.points.flatMap((point) => {
    const day = dayOf(point.measuredOn);
    return day === null ? [] : [{ ...point, day }];
  });
  const compact = width < COMPACT_PX;
  const margin = { top: TOP_PX, right: compact ? 14 : 92, bottom: BOTTOM_PX, left: LEFT_PX };
  const dated = [...points.map((point) => point.measuredOn), ...references].map((builtOn) => ({
    buildName: "",
    builtOn,
    marginDb: null,
    standing: "undecided" as const,
  }));
  const across = Math.max(1, width - margin.left - margin.right);
  const axis = makeTrendAxis([{ maskTitle: "", points: dated }], [], today, across);
  const drifts = points.flatMap((point) => [point.driftWorstDb, point.driftMeanDb]);
  const levels = levelRange(
    [...drifts, toleranceDb, -toleranceDb],
    { belowDb: 0.5, aboveDb: 0.5 },
    10,
  );
  const bottom = Math.max(margin.top + 1, height - margin.bottom);
  const xOf = (day: number) => margin.left + ((day - axis.from) / (axis.to - axis.from)) * across;
  const yOf = (db: number) =>
    bottom - ((db - levels.fromDb) / (levels.toDb - levels.fromDb)) * (bottom - margin.top);
  const place = (day: number, db: number) => ({ x: xOf(day), y: yOf(db) });
  const worst = withGaps(points, place, (point) => point.driftWorstDb);
  const mean = withGaps(points, place, (point) => point.driftMeanDb);
  const ends = [
    { key: "worst" as const, end: worst.at(-1) },
    { key: "mean" as const, end: mean.at(-1) },
  ].flatMap(({ key, end }) => (end && !compact ? [{ key, end }] : []));
  const ys = spreadApart(
    ends.map(({ end }) => ({ at: end.y, size: 14 })),
    margin.top,
    height - 4,
  );
  const todayDay = dayOf(today);
  return {
    axis,
    levels,
    levelTicks: levelTicks(levels, bottom - margin.top).map((value) => ({
      value,
      label: value > 0 ? `+${labelLevel(value)}` : labelLevel(value),
    })),
    margin,
    band: { topY: yOf(toleranceDb), zeroY: yOf(0), bottomY: yOf(-toleranceDb) },
    worstPath: linePath(worst),
    meanPath: linePath(mean),
    marks: points.flatMap(({ day, driftWorstDb, driftMeanDb, measuredOn, href }) =>
      driftWorstDb === null
        ? []
        : [
            {
              ...place(day, driftWorstDb),
              drifted: Math.abs(driftWorstDb) > toleranceDb,
              text: `${measuredOn}: largest drift ${formatDelta(driftWorstDb)}, mean ${formatDelta(driftMeanDb)}`,
              href,
            },
          ],
    ),
    referenceXs: references.flatMap((reference) => {
      const day = dayOf(reference);
      return day === null ? [] : [xOf(day)];
    }),
    todayX: todayDay === null ? null : xOf(todayDay),
    names: ends.map(({ key, end }, i) => ({
      key,
      text: NAMES[key],
      x: Math.min(end.x + 10, width - margin.right + 8),
      y: ys[i] ?? end.y,
    })),
    compact,
    summary: `Drift over dates, tolerance ±${toleranceDb} dB. ${
      points.map((p) => `${p.measuredOn} ${formatDelta(p.driftWorstDb)}`).join(", ") || "No checks"
    }.`,
  };
}
