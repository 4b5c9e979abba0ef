import { STANDING_LABELS, type Standing } from "@/lib/core/reading/reading";
import { formatMargin } from "@/lib/core/units/format";
import type { FrameTick } from "./chart-frame";
import { linePath } from "./chart-path";
import type { ChartMargin } from "./chart-plane";
import { levelRange, levelTicks, labelLevel, type LevelRange } from "./level-ticks";
import { lineStyle, type LineStyle } from "./line-styles";
import { spreadApart } from "./spread-apart";
import { dayOf, makeTrendAxis, type TrendAxis } from "./trend-axis";
import type { TrendMilestone, TrendSeries } from "./trend-data";
import { wrapText } from "./wrap-text";

export interface TrendMark {
  x: number;
  y: number;
  standing: Standing;
  /** "B3, CISPR 32 class B: +4.2 dB, clear". */
  text: string;
  href: string | null;
}

export interface PreparedTrend {
  axis: TrendAxis;
  levels: LevelRange;
  levelTicks: FrameTick[];
  margin: ChartMargin;
  zeroY: number;
  targetY: number;
  lines: { key: string; path: string; style: LineStyle; marks: TrendMark[] }[];
  names: { key: string; rows: string[]; last: string; y: number; fromX: number; fromY: number }[];
  milestones: {
    name: string;
    detail: string;
    x: number;
    /** The text stands left of the staff, where there is no room to its right. */
    pushed: boolean;
    row: number;
    requiredY: number | null;
  }[];
  todayX: number | null;
  /** No room for names at the line ends: they stand in a list below. */
  compact: boolean;
  notes: string[];
  summary: string;
}

export interface TrendInput {
  series: readonly TrendSeries[];
  targetDb: number;
  milestones: readonly TrendMilestone[];
  /** ISO date. */
  today: string;
  width: number;
  height: number;
}

const ROW_PX = 13;
const CHARACTER_PX = 5.9;
const LEFT_PX = 38;
const BOTTOM_PX = 24;
const COMPACT_PX = 600;

function needed(milestone: TrendMilestone): string {
  const { requiredMarginDb, dueOn } = milestone;
  return requiredMarginDb === null ? dueOn : `${dueOn}, ${formatMargin(requiredMarginDb)}`;
}

/** Rows at the top so that the names of near milestones do not run into each other. */
function rowsOf(names: readonly { x: number; width: number }[]): number[] {
  const ends: number[] = [];
  return names.map(({ x, width }) => {
    const free = ends.findIndex((end) => end < x);
    const row = free < 0 ? ends.length : free;
    ends[row] = x + width + 8;
    return row;
  });
}

function describe(input: TrendInput): string {
  const lines = input.series.map(({ maskTitle, points }) => {
    const told = points.map(
      (p) => `${p.buildName} ${formatMargin(p.marginDb)} ${STANDING_LABELS[p.standing]}`,
    );
    return `${maskTitle}: ${told.join(", ") || "no builds"}`;
  });
  return `Worst margin over builds, target ${formatMargin(input.targetDb)}. ${lines.join(". ")}.`;
}

/** Margins over builds in px, with target, coast at zero, and milestones. */
export function prepareTrend(input: TrendInput): PreparedTrend {
  const { series, targetDb, milestones, today, width, height } = input;
  const compact = width < COMPACT_PX;
  const longest = Math.max(...series.map((one) => one.maskTitle.length), 10) * CHARACTER_PX + 20;
  const right = compact ? 14 : Math.round(Math.min(longest, Math.max(110, width * 0.2)));
  const axis = makeTrendAxis(series, milestones, today, width - LEFT_PX - right);
  const left = LEFT_PX;
  const across = Math.max(1, width - left - right);
  const xOf = (value: number) => left + ((value - axis.from) / (axis.to - axis.from)) * across;
  const dated = axis.kind === "date" ? milestones : [];
  const flags = dated
    .flatMap((milestone) => {
      const day = dayOf(milestone.dueOn);
      return day === null ? [] : [{ milestone, x: xOf(day) }];
    })
    .sort((a, b) => a.x - b.x)
    .map(({ milestone, x }) => {
      const detail = compact ? "" : needed(milestone);
      const wide = (milestone.name.length + detail.length + 1) * 6.3 + 8;
      const pushed = x + wide > width;
      return { milestone, detail, x, width: wide, pushed, textX: pushed ? x - wide : x };
    });
  const rows = rowsOf(flags.map((flag) => ({ x: flag.textX, width: flag.width })));
  const top = 22 + Math.max(0, ...rows.map((row) => row + 1)) * 15;
  const values = [
    ...series.flatMap((one) => one.points.map((point) => point.marginDb)),
    ...dated.map((milestone) => milestone.requiredMarginDb),
    targetDb,
    0,
  ];
  const levels = levelRange(values, { belowDb: 3, aboveDb: 2 }, 15);
  const bottom = Math.max(top + 1, height - BOTTOM_PX);
  const span = levels.toDb - levels.fromDb;
  const yOf = (db: number) => bottom - ((db - levels.fromDb) / span) * (bottom - top);
  const lines = series.map(({ maskTitle, points }, i) => {
    const placed = points.flatMap((point) => {
      const at = axis.at(point);
      return at === null ? [] : [{ point, at }];
    });
    const marks = placed
      .sort((a, b) => a.at - b.at)
      .map(({ point, at }) => ({
        x: xOf(at) + (point.marginDb === null ? i * 9 : 0),
        y: point.marginDb === null ? bottom - 8 : yOf(point.marginDb),
        standing: point.standing,
        known: point.marginDb !== null,
        margin: formatMargin(point.marginDb),
        text: `${point.buildName}, ${maskTitle}: ${formatMargin(point.marginDb)}, ${STANDING_LABELS[point.standing]}`,
        href: point.href ?? null,
      }));
    const path = linePath(marks.map((mark) => (mark.known ? mark : null)));
    return { key: `series-${i}`, maskTitle, path, style: lineStyle(i), marks };
  });
  const rowLength = Math.floor((right - 18) / CHARACTER_PX);
  const ends = lines.map(({ key, maskTitle, marks }) => {
    const end = marks.at(-1) ?? null;
    const fromX = end?.x ?? width - right;
    const fromY = end?.y ?? bottom - 8;
    const told = wrapText(maskTitle, rowLength);
    return { key, rows: told, last: end?.margin ?? "no builds", fromX, fromY };
  });
  const ys = spreadApart(
    ends.map((end) => ({ at: end.fromY, size: (end.rows.length + 1) * ROW_PX + 4 })),
    top,
    height - 4,
  );
  const notes: string[] = [];
  if (compact && flags.length > 0)
    notes.push(`${flags.map(({ milestone: m }) => `${m.name}: ${needed(m)}`).join("; ")}.`);
  if (axis.kind === "order" && milestones.length > 0) {
    const told = milestones.map((m) => `${m.name} ${needed(m)}`).join("; ");
    notes.push(`Builds without a date stand in order, so milestones have no place: ${told}.`);
  }
  const todayDay = dayOf(today);
  return {
    axis,
    levels,
    levelTicks: levelTicks(levels, bottom - top).map((level) => ({
      value: level,
      label: level > 0 ? `+${labelLevel(level)}` : labelLevel(level),
    })),
    margin: { top, right, bottom: BOTTOM_PX, left },
    zeroY: yOf(0),
    targetY: yOf(targetDb),
    lines,
    names: ends.map((end, i) => ({ ...end, y: ys[i] ?? end.fromY })),
    milestones: flags.map(({ milestone, detail, x, pushed }, i) => ({
      pushed,
      name: milestone.name,
      detail,
      x,
      row: rows[i] ?? 0,
      requiredY: milestone.requiredMarginDb === null ? null : yOf(milestone.requiredMarginDb),
    })),
    todayX: axis.kind === "date" && todayDay !== null ? xOf(todayDay) : null,
    compact,
    notes,
    summary: describe(input),
  };
}
