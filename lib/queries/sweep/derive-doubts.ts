import { benchCheckDoubt } from "@/lib/core/reading/bench-check-doubt";
import type { DayCheck } from "@/lib/core/reading/bench-check-doubt";
import type { SuspectAmbient } from "@/lib/core/reading/ambient-check";
import { ambientDoubt } from "@/lib/core/reading/doubts";
import type { HeldAmbient } from "@/lib/core/reading/judge-ambient";
import { judgeAmbient } from "@/lib/core/reading/judge-ambient";
import type { Doubt, Reading } from "@/lib/core/reading/reading";
import type { Port } from "@/lib/core/sweep/settings";

/** What was there on a sweep's day, which may change after its readings were made. */
interface Surroundings {
  port: Port;
  ambients: readonly HeldAmbient[];
  /** The bench check that stands for the day; null: none was made. */
  check: DayCheck | null;
}

/** What is not stored with a reading: its ambient, and the doubts of its bench's day. */
export function deriveDoubts(
  reading: Pick<Reading, "unit" | "lines" | "suspects">,
  { port, ambients, check }: Surroundings,
): { ambient: SuspectAmbient[]; doubts: Doubt[] } {
  const judged = judgeAmbient(ambients, reading);
  return {
    ambient: judged.suspects,
    doubts: [
      ...ambientDoubt(port, ambients.length > 0),
      ...judged.doubts,
      ...benchCheckDoubt(check),
    ],
  };
}
