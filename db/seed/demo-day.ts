/** The day on which the demo's story is told. */
const TOLD_ON = "2026-12-01";

const DAY_MS = 24 * 60 * 60 * 1000;

/**
 * A day of the story (ISO date) as it goes into the database. Where the clock says that the story
 * is still to come, all of it happened some weeks earlier: nothing is measured in the future.
 */
export function onDay(day: string, now: Date = new Date()): string {
  const earlyMs = Date.parse(TOLD_ON) - now.getTime();
  if (earlyMs <= 0) return day;
  const weeks = Math.ceil(earlyMs / (7 * DAY_MS));
  return new Date(Date.parse(day) - weeks * 7 * DAY_MS).toISOString().slice(0, 10);
}
