import type { SignalPath } from "@/lib/core/bench/signal-path";

/** Transducers of a path whose calibration was due before the day of a measurement (ISO dates). */
export function overdueOn(path: SignalPath, day: string | null): string[] {
  if (day === null) return [];
  return path.transducers.filter((t) => t.dueOn !== null && t.dueOn < day).map((t) => t.name);
}
