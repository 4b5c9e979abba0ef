import { describe, expect, test } from "vitest";
import { readSweep } from "@/lib/core/reading/read-sweep";
import { inputOf, JUDGED_DOUBTS, type HandWorkedCase } from "./case";
import { circumstanceCases } from "./circumstances";
import { coverageCases } from "./coverage";
import { detectorCases } from "./detectors";
import { edgeCases } from "./edges";
import { guardCases } from "./guard";
import { mainsCases } from "./mains";
import { spotCases } from "./spots";
import { unitCases } from "./units";

/** Margins are worked out to four places, and levels are kept as float32. */
const TOLERANCE_DB = 6e-5;

function check(one: HandWorkedCase): void {
  const { expected } = one;
  const reading = readSweep(inputOf(one));
  if ("notComparable" in expected) {
    expect(reading.notComparable).toMatch(expected.notComparable);
    expect(reading.standing).toBe("undecided");
    expect(reading.lines).toEqual([]);
    return;
  }
  expect(reading.notComparable).toBeNull();
  expect(reading.lines).toHaveLength(expected.lines.length);
  expected.lines.forEach((line, i) => {
    const found = reading.lines[i];
    if (line.worst) {
      expect(found?.worst?.frequencyHz).toBe(line.worst[1]);
      expect(Math.abs((found?.worst?.marginDb ?? NaN) - line.worst[0])).toBeLessThan(TOLERANCE_DB);
    } else expect(found?.worst).toBeNull();
    expect(found?.basis).toBe(line.basis);
    expect(found?.standing).toBe(line.standing);
    if (line.coverage !== undefined) expect(found?.coverage.fraction).toBeCloseTo(line.coverage, 9);
  });
  expect(reading.standing).toBe(expected.standing);
  const doubts = reading.doubts.filter((doubt) => JUDGED_DOUBTS.has(doubt.code));
  if (expected.doubts) expect(doubts.map((doubt) => doubt.code)).toEqual(expected.doubts);
  if (expected.doubtDb !== undefined)
    expect(Math.abs(doubts[0]?.valueDb ?? NaN)).toBeCloseTo(expected.doubtDb, 4);
  if (expected.doubtText) expect(doubts[0]?.text).toMatch(expected.doubtText);
  if (expected.remeasureHz)
    expect(reading.remeasure.map((point) => point.frequencyHz)).toEqual(expected.remeasureHz);
}

const SUBJECTS: Record<string, HandWorkedCase[]> = {
  "edges of segments and bands": edgeCases,
  "detectors and holds": detectorCases,
  spots: spotCases,
  "mains limits": mainsCases,
  "guard and zero": guardCases,
  coverage: coverageCases,
  "units, ports and distances": unitCases,
  doubts: circumstanceCases,
};

for (const [subject, cases] of Object.entries(SUBJECTS))
  describe(`worked out by hand: ${subject}`, () => {
    test.each(cases.map((one) => [one.name, one] as const))("%s", (_, one) => check(one));
  });
