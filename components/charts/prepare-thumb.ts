import { areaPath, linePath } from "./chart-path";

const PAD_PX = 1.5;

/** A trace in a small box without axes: log frequency across when it can be, its own range up. */
export function prepareThumb(
  hz: readonly number[],
  maxDb: readonly (number | null)[],
  width: number,
  height: number,
): { edge: string; water: string } | null {
  const levels = maxDb.filter((level): level is number => level !== null && Number.isFinite(level));
  const first = hz[0];
  const last = hz.at(-1);
  if (levels.length === 0 || first === undefined || last === undefined) return null;
  let low = Infinity;
  let high = -Infinity;
  for (const level of levels) {
    low = Math.min(low, level);
    high = Math.max(high, level);
  }
  const span = Math.max(6, high - low);
  const across = (f: number) => (first > 0 ? Math.log(f / first) : f - first);
  const reach = across(last) || 1;
  const points = hz.map((f, i) => {
    const level = maxDb[i];
    if (level === null || level === undefined || !Number.isFinite(level)) return null;
    const up = (level - low) / span;
    return {
      x: PAD_PX + (across(f) / reach) * (width - 2 * PAD_PX),
      y: height - PAD_PX - up * (height - 2 * PAD_PX),
    };
  });
  return { edge: linePath(points), water: areaPath(points, height) };
}
