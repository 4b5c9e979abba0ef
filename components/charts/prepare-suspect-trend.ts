import { STANDING_LABELS, type Standing } from "@/lib/core/reading/reading";
import { formatLevel, formatMargin } from "@/lib/core/units/format";
import type { LevelUnit } from "@/lib/core/units/level-units";
import type { FrameTick } from "./chart-frame";
import { linePath, type ScreenPoint } from "./chart-path";
import type { ChartMargin } from "./chart-plane";
import { labelLevel, levelRange, levelTicks, type LevelRange } from "./level-ticks";
import type { SuspectTrendPoint } from "./suspect-trend-data";
import { makeTrendAxis, type TrendAxis } from "./trend-axis";

export interface SuspectTrendMark {
  x: number;
  y: number;
  /** null in the panel of levels, where a mark says nothing of the mask. */
  standing: Standing | null;
  text: string;
  href: string | null;
}

export interface SuspectTrendPanel {
  levels: LevelRange;
  ticks: FrameTick[];
  margin: ChartMargin;
  path: string;
  marks: SuspectTrendMark[];
  /** Builds that were swept and did not show it, on the floor of the panel. */
  notSeen: { x: number; y: number; word: string }[];
}

export interface PreparedSuspectTrend {
  axis: TrendAxis;
  marginPanel: SuspectTrendPanel & { zeroY: number };
  levelPanel: SuspectTrendPanel;
  notes: string[];
  summary: string;
}

export interface SuspectTrendInput {
  /** In the order of builds. */
  points: readonly SuspectTrendPoint[];
  unit: LevelUnit;
  width: number;
  marginHeight: number;
  levelHeight: number;
}

const LEFT_PX = 38;
const RIGHT_PX = 18;
const TOP_PX = 20;
const BOTTOM_PX = 24;
const WORD_PX = 52;

/** A line only from one build to the next, and only between what may be subtracted. */
function joined(points: readonly SuspectTrendPoint[], at: (i: number) => ScreenPoint | null) {
  return points.flatMap((point, i): (ScreenPoint | null)[] => {
    const before = points[i - 1];
    const breaks = before !== undefined && before.comparableKey !== point.comparableKey;
    return breaks ? [null, at(i)] : [at(i)];
  });
}

function tell(point: SuspectTrendPoint, unit: LevelUnit): string {
  const { buildName, kind, standing } = point;
  if (kind !== "seen") return `${buildName} ${kind === "not-seen" ? "not seen" : "not swept"}`;
  const told = [
    formatMargin(point.marginDb),
    ...(standing ? [STANDING_LABELS[standing]] : []),
    ...(point.levelDb === null ? [] : [formatLevel(point.levelDb, unit)]),
  ];
  return `${buildName} ${told.join(", ")}`;
}

/** Margin and level of one suspect over the builds, in px, in two panels over the same builds. */
export function prepareSuspectTrend(input: SuspectTrendInput): PreparedSuspectTrend {
  const { points, unit, width, marginHeight, levelHeight } = input;
  const builds = points.map(({ buildName, marginDb, standing }) => ({
    buildName,
    // Without dates the axis is the order of builds, so that each has room of its own.
    builtOn: null,
    marginDb,
    standing: standing ?? ("undecided" as const),
  }));
  const across = Math.max(1, width - LEFT_PX - RIGHT_PX);
  const axis = makeTrendAxis([{ maskTitle: "", points: builds }], [], "", across);
  const xOf = (value: number) => LEFT_PX + ((value - axis.from) / (axis.to - axis.from)) * across;
  const xs = points.map((_, i) => xOf(i));
  const hasRoom = across / Math.max(1, axis.to - axis.from) >= WORD_PX;

  function panelOf(
    height: number,
    valueOf: (point: SuspectTrendPoint) => number | null,
    levels: LevelRange,
    isMargin: boolean,
  ) {
    const bottom = Math.max(TOP_PX + 1, height - BOTTOM_PX);
    const span = levels.toDb - levels.fromDb;
    const yOf = (db: number) => bottom - ((db - levels.fromDb) / span) * (bottom - TOP_PX);
    const at = (i: number): ScreenPoint | null => {
      const value = points[i] ? valueOf(points[i]) : null;
      const x = xs[i];
      return value === null || x === undefined ? null : { x, y: yOf(value) };
    };
    const panel: SuspectTrendPanel = {
      levels,
      ticks: levelTicks(levels, bottom - TOP_PX).map((level) => ({
        value: level,
        label: isMargin && level > 0 ? `+${labelLevel(level)}` : labelLevel(level),
      })),
      margin: { top: TOP_PX, right: RIGHT_PX, bottom: BOTTOM_PX, left: LEFT_PX },
      path: linePath(joined(points, at)),
      marks: points.flatMap((point, i) => {
        const place = at(i);
        if (!place) return [];
        const standing = isMargin ? (point.standing ?? "undecided") : null;
        return [{ ...place, standing, text: tell(point, unit), href: point.href }];
      }),
      notSeen: points.flatMap((point, i) =>
        point.kind === "not-seen"
          ? [{ x: xs[i] ?? 0, y: bottom - 7, word: hasRoom ? "not seen" : "" }]
          : [],
      ),
    };
    return { panel, zeroY: yOf(0) };
  }

  const margins = levelRange(
    [0, ...points.map((point) => point.marginDb)],
    { belowDb: 4, aboveDb: 2 },
    15,
  );
  const levels = levelRange(
    points.map((point) => point.levelDb),
    { belowDb: 5, aboveDb: 2 },
    15,
  );
  const margin = panelOf(marginHeight, (point) => point.marginDb, margins, true);
  const level = panelOf(levelHeight, (point) => point.levelDb, levels, false);
  const seen = points.filter((point) => point.kind === "seen");
  const notes: string[] = [];
  if (new Set(seen.map((point) => point.comparableKey)).size > 1) {
    notes.push(
      "The line breaks where the mask line, detector, RBW, distance or bench changed: a difference across it would not be the product's.",
    );
  }
  if (seen.some((point) => point.levelDb === null)) {
    notes.push(`Levels in another unit than that of the newest build are left out.`);
  }
  return {
    axis,
    marginPanel: { ...margin.panel, zeroY: margin.zeroY },
    levelPanel: level.panel,
    notes,
    summary: `Suspect over builds. ${points.map((point) => tell(point, unit)).join("; ")}.`,
  };
}
