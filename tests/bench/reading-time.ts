import { readSweep } from "@/lib/core/reading/read-sweep";
import { makeTrace } from "../support/traces";
import { inventLevels } from "./invented-sweep";
import { measureInTurns, milliseconds, minAndMedian, quotients } from "./measure";
import type { Place } from "./place";
import { SETTINGS } from "./place";
import type { Figure } from "./report";

const POINTS = 100_000;
const ROUNDS = 15;

/** Holding a sweep against one mask in memory, beside looking at each of its levels once. */
export async function measureReading({ masks }: Place): Promise<Figure[]> {
  const figures: Figure[] = [];
  for (const mask of masks) {
    const trace = makeTrace(inventLevels(POINTS, 3), {
      axis: { kind: "regular", startHz: 30e6, stepHz: 970e6 / (POINTS - 1), count: POINTS },
    });
    let highest = Number.NEGATIVE_INFINITY;
    const times = await measureInTurns(
      {
        read: () => readSweep({ traces: [trace], settings: SETTINGS, mask, guardDb: 3 }),
        pass: () => {
          for (const level of trace.levelsDb) if (level > highest) highest = level;
        },
      },
      ROUNDS,
    );
    figures.push({
      name: `Reading of ${POINTS} points against ${mask.key} ÷ one pass`,
      measured: minAndMedian(quotients(times.read, times.pass), 0),
      beside: `${milliseconds(times.read)}; pass ${milliseconds(times.pass)}`,
    });
  }
  return figures;
}
