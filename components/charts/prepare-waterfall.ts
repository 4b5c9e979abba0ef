import type { WaterfallBar } from "@/lib/core/delta/waterfall";
import { formatDelta, formatMargin } from "@/lib/core/units/format";
import type { ChartMargin } from "./chart-plane";
import { labelLevel, levelRange, levelTicks } from "./level-ticks";

export interface WaterfallColumn {
  key: string;
  /** Position of the step, or "now" for the end. */
  label: string;
  x: number;
  width: number;
  /** What is drawn: a whole margin from zero, a change up or down, or a gap with its word. */
  kind: "margin" | "up" | "down" | "gap";
  /** Off the line of steps: an outline. */
  isBeside: boolean;
  top: number;
  bottom: number;
  /** The margin with the change's ± around it; null where no ± is known. */
  whisker: { top: number; bottom: number } | null;
  /** Written over or under the column: the change or the margin. */
  text: string;
  textY: number;
  /** Height of the margin that the next column on the line starts from. */
  endY: number | null;
}

export interface PreparedWaterfall {
  margin: ChartMargin;
  columns: WaterfallColumn[];
  /** Level lines from where one column of the line of steps ends to where the next starts. */
  joints: { x1: number; x2: number; y: number }[];
  zeroY: number;
  guardY: number | null;
  targetY: number;
  ticks: { y: number; label: string }[];
  summary: string;
}

export interface WaterfallInput {
  bars: readonly WaterfallBar[];
  guardDb: number;
  targetDb: number;
  width: number;
  height: number;
}

/** Room at the right for the names of the mask, guard and target lines. */
const MARGIN: ChartMargin = { top: 20, right: 92, bottom: 26, left: 40 };

/** How a change is written, "+3.1 dB ± 0.4". */
export function writeChange(bar: WaterfallBar): string {
  const { change, gap } = bar;
  if (gap) return gap;
  if (!change) return formatMargin(bar.toDb);
  const { changeDb, uncertaintyDb, isWithinRepeatability } = change;
  const plusMinus = uncertaintyDb === null ? "" : ` ± ${uncertaintyDb.toFixed(1)}`;
  const within = isWithinRepeatability ? ", within repeatability" : "";
  return `${formatDelta(changeDb)}${plusMinus}${within}`;
}

function describe(bars: readonly WaterfallBar[], endDb: number | null): string {
  const told = bars.map((bar) => {
    const place = bar.place === "beside" ? ", not in the product" : "";
    return `step ${bar.position} ${bar.name}: ${writeChange(bar)}${place}`;
  });
  return `What each step bought, in margin. ${told.join("; ")}. Now ${formatMargin(endDb)}.`;
}

/** Margin of the product as it stands: that of the last step on the line; null when unknown. */
export function marginNow(bars: readonly WaterfallBar[]): number | null {
  return bars.findLast((bar) => bar.place !== "beside")?.toDb ?? null;
}

/** Columns of a waterfall in px: step 0, the change of every step, and the margin now. */
export function prepareWaterfall(input: WaterfallInput): PreparedWaterfall {
  const { bars, guardDb, targetDb, width, height } = input;
  const endDb = marginNow(bars);
  const spread = bars.map((bar) => bar.change?.uncertaintyDb ?? 0);
  const reach = Math.max(0, ...spread);
  const values = [...bars.flatMap((bar) => [bar.fromDb, bar.toDb]), 0, guardDb, targetDb];
  const levels = levelRange(values, { belowDb: 2 + reach, aboveDb: 2 + reach }, 15);
  const bottom = Math.max(MARGIN.top + 1, height - MARGIN.bottom);
  const span = levels.toDb - levels.fromDb;
  const yOf = (db: number) => bottom - ((db - levels.fromDb) / span) * (bottom - MARGIN.top);
  const pitch = Math.max(1, (width - MARGIN.left - MARGIN.right) / (bars.length + 1));
  const own = Math.max(2, Math.min(56, pitch * 0.64));
  const xOf = (i: number) => MARGIN.left + pitch * (i + 0.5) - own / 2;

  const column = (
    i: number,
    key: string,
    label: string,
    fromDb: number | null,
    toDb: number | null,
  ) => {
    const [a, b] = [yOf(fromDb ?? 0), yOf(toDb ?? fromDb ?? 0)];
    const top = Math.min(a, b);
    return {
      key,
      label,
      x: xOf(i),
      width: own,
      top,
      bottom: Math.max(a, b),
      textY: top - 5,
      whisker: null,
      isBeside: false,
      endY: toDb === null ? null : b,
    };
  };
  const columns = bars.map((bar, i): WaterfallColumn => {
    const { fromDb, toDb, change, gap, place } = bar;
    const label = String(bar.position);
    const isBeside = place === "beside";
    if (gap) {
      const plain = column(i, bar.stepId, label, fromDb ?? toDb, toDb ?? fromDb);
      return { ...plain, isBeside, kind: "gap", text: gap };
    }
    if (!change || toDb === null || fromDb === null) {
      const plain = column(i, bar.stepId, label, 0, toDb);
      return { ...plain, isBeside, kind: "margin", text: formatMargin(toDb) };
    }
    const plain = column(i, bar.stepId, label, fromDb, toDb);
    const { uncertaintyDb } = change;
    const half = uncertaintyDb ?? 0;
    const whisker =
      uncertaintyDb === null ? null : { top: yOf(toDb + half), bottom: yOf(toDb - half) };
    return {
      ...plain,
      isBeside,
      kind: (change.changeDb ?? 0) < 0 ? "down" : "up",
      whisker,
      text: formatDelta(change.changeDb).replace(" dB", ""),
      textY: Math.min(plain.top, whisker?.top ?? plain.top) - 5,
    };
  });
  if (endDb !== null)
    columns.push({
      ...column(bars.length, "now", "now", 0, endDb),
      kind: "margin",
      text: formatMargin(endDb),
    });
  return {
    margin: MARGIN,
    columns,
    joints: jointsOf(columns, bars),
    zeroY: yOf(0),
    guardY: guardDb > 0 ? yOf(guardDb) : null,
    targetY: yOf(targetDb),
    ticks: levelTicks(levels, bottom - MARGIN.top).map((level) => ({
      y: yOf(level),
      label: level > 0 ? `+${labelLevel(level)}` : labelLevel(level),
    })),
    summary: describe(bars, endDb),
  };
}

function jointsOf(columns: readonly WaterfallColumn[], bars: readonly WaterfallBar[]) {
  const joints: PreparedWaterfall["joints"] = [];
  columns.forEach((column, i) => {
    const base = bars[i]?.basePosition;
    // The last column is the margin now, and hangs on the last step of the line.
    const from =
      i < bars.length
        ? columns.find((_, k) => bars[k]?.position === base)
        : columns[bars.findLastIndex((bar) => bar.place !== "beside")];
    if (!from || from === column || from.endY === null) return;
    joints.push({ x1: from.x + from.width, x2: column.x, y: from.endY });
  });
  return joints;
}
