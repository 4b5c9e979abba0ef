import type { FrameTick } from "./chart-frame";
import type { TrendMilestone, TrendSeries } from "./trend-data";

const DAY_MS = 86_400_000;

/** Days since 1970 of an ISO date; null when it is none. */
export function dayOf(iso: string | null): number | null {
  const match = iso === null ? null : /^(\d{4})-(\d{2})-(\d{2})/.exec(iso);
  if (!match) return null;
  const [, year, month, day] = match.map(Number);
  if (year === undefined || month === undefined || day === undefined) return null;
  return Date.UTC(year, month - 1, day) / DAY_MS;
}

const isoOf = (day: number) => new Date(day * DAY_MS).toISOString().slice(0, 10);

export interface TrendAxis {
  kind: "date" | "order";
  from: number;
  to: number;
  ticks: FrameTick[];
  /** Position of a build; null when the axis does not know it. */
  at: (build: { buildName: string; builtOn: string | null }) => number | null;
}

/** A date at the very edge would run into its neighbour once it is pushed inside. */
function withoutEdgeLabels(ticks: FrameTick[], from: number, to: number, widthPx: number) {
  return ticks.map((tick) => {
    const x = ((tick.value - from) / (to - from)) * widthPx;
    const half = tick.label.length * 3.4;
    return x < half || x > widthPx - half ? { ...tick, label: "" } : tick;
  });
}

/** Round dates: days or weeks while they are few, then months, quarters, years. */
function dateTicks(from: number, to: number, widthPx: number): FrameTick[] {
  const most = Math.max(2, widthPx / 86);
  const days = [1, 2, 7, 14].find((step) => (to - from) / step <= most);
  if (days !== undefined) {
    // Weeks begin on a Monday, as 5 January 1970 did.
    const monday = days < 7 ? 0 : 4;
    const first = Math.ceil((from - monday) / days) * days + monday;
    return Array.from({ length: Math.floor((to - first) / days) + 1 }, (_, i) => ({
      value: first + i * days,
      label: isoOf(first + i * days),
    }));
  }
  const months = [1, 3, 6, 12, 24, 60].find((m) => (to - from) / (30.44 * m) <= most) ?? 120;
  const ticks: FrameTick[] = [];
  const start = new Date(from * DAY_MS);
  for (let m = 0; ; m += 1) {
    const ms = Date.UTC(start.getUTCFullYear(), start.getUTCMonth() + m, 1);
    const value = ms / DAY_MS;
    if (value > to) return ticks;
    const month = new Date(ms).getUTCMonth() + new Date(ms).getUTCFullYear() * 12;
    if (value >= from && month % months === 0)
      ticks.push({ value, label: isoOf(value).slice(0, 7) });
  }
}

function orderTicks(names: readonly string[], widthPx: number): FrameTick[] {
  const widest = Math.max(...names.map((name) => name.length), 1) * 6.7 + 12;
  const every = Math.max(1, Math.ceil((widest * names.length) / Math.max(1, widthPx)));
  return names.map((name, i) => ({ value: i, label: i % every === 0 ? name : "" }));
}

/**
 * Dates when every build has one, otherwise the order in which the builds are given. Milestones
 * and today have a place on a date axis only.
 */
export function makeTrendAxis(
  series: readonly TrendSeries[],
  milestones: readonly TrendMilestone[],
  today: string,
  widthPx: number,
): TrendAxis {
  const builds = series.flatMap((one) => one.points);
  const days = builds.map((build) => dayOf(build.builtOn));
  if (builds.length > 0 && days.every((day) => day !== null)) {
    const all = [...days, ...milestones.map((m) => dayOf(m.dueOn)), dayOf(today)];
    const known = all.filter((day) => day !== null);
    const low = Math.min(...known);
    const high = Math.max(...known);
    const air = Math.max(2, (high - low) * 0.03);
    const [from, to] = [low - air, high + air];
    const ticks = withoutEdgeLabels(dateTicks(from, to, widthPx), from, to, widthPx);
    return { kind: "date", from, to, ticks, at: (build) => dayOf(build.builtOn) };
  }
  const names = [...new Set(builds.map((build) => build.buildName))];
  const order = new Map(names.map((name, i) => [name, i]));
  return {
    kind: "order",
    from: -0.4,
    to: Math.max(1, names.length - 1) + 0.4,
    ticks: orderTicks(names, widthPx),
    at: (build) => order.get(build.buildName) ?? null,
  };
}
