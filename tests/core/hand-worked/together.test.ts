import { expect, test } from "vitest";
import { readTogether } from "@/lib/core/reading/read-together";
import { LOW_BAND } from "./masks";
import { togetherCases } from "./together";

test.each(togetherCases.map((one) => [one.name, one] as const))(
  "together, worked out by hand: %s",
  (_, { parts, mask = LOW_BAND, expected }) => {
    const reading = readTogether(parts, mask);
    expect(reading.notComparable).toBeNull();
    const [line] = reading.lines;
    const [marginDb, frequencyHz] = expected.worst!;
    expect(line?.worst?.frequencyHz).toBe(frequencyHz);
    expect(Math.abs((line?.worst?.marginDb ?? NaN) - marginDb)).toBeLessThan(6e-5);
    expect([line?.standing, line?.basis]).toEqual([expected.standing, expected.basis]);
    if (expected.partIndex !== undefined) expect(line?.worst?.partIndex).toBe(expected.partIndex);
    if (expected.coverage !== undefined)
      expect(line?.coverage.fraction).toBeCloseTo(expected.coverage, 9);
    if (expected.remeasure)
      expect(reading.remeasure.map((r) => [r.frequencyHz, r.partIndex])).toEqual(
        expected.remeasure,
      );
  },
);
