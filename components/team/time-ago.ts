const STEPS = [
  { unit: "minute", seconds: 60 },
  { unit: "hour", seconds: 3600 },
  { unit: "day", seconds: 86_400 },
  { unit: "month", seconds: 2_629_800 },
  { unit: "year", seconds: 31_557_600 },
] as const;

const format = new Intl.RelativeTimeFormat("en", { numeric: "auto" });

/** How long ago in the largest unit that fits, "3 hours ago"; under a minute "just now". */
export function timeAgo(at: Date, now: Date): string {
  const seconds = (now.getTime() - at.getTime()) / 1000;
  const step = STEPS.findLast((candidate) => seconds >= candidate.seconds);
  return step ? format.format(-Math.floor(seconds / step.seconds), step.unit) : "just now";
}

/** The exact time, "2026-03-31 14:05:09 UTC". */
export function exactTime(at: Date): string {
  return `${at.toISOString().slice(0, 19).replace("T", " ")} UTC`;
}
