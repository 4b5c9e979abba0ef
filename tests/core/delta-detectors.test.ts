import { describe, expect, test } from "vitest";
import { compareSides } from "@/lib/core/delta/compare-sides";
import type { ComparedSweep } from "@/lib/core/delta/compared-sweep";
import type { MeasuredChange } from "@/lib/core/delta/delta";
import { describeChange, describeRepeats } from "@/lib/core/delta/describe-change";
import { reading, sweep, TRACE } from "./delta-fixtures";

const trace = (detector: "peak" | "quasi-peak" | "average" | "rms-average", maxDb: number) => ({
  ...TRACE,
  name: detector,
  detector,
  maxDb,
});

const compare = (before: ComparedSweep, after: ComparedSweep) => compareSides([before], [after]);

describe("several traces in a sweep", () => {
  const before = sweep({ traces: [trace("peak", 50), trace("quasi-peak", 45)] });

  test("every detector that both have is compared, the deciding one first", () => {
    const after = sweep({ traces: [trace("quasi-peak", 43), trace("peak", 47)] });
    const told = (a: ComparedSweep, b: ComparedSweep) =>
      compare(a, b).changes?.levels.map((level) => [level.detector, level.peak.changeDb]);
    expect(told(before, after)).toEqual([
      ["peak", -3],
      ["quasi-peak", -2],
    ]);
    const decided = (one: ComparedSweep, margin: number) => ({
      ...one,
      readings: [reading(margin, "quasi-peak")],
    });
    expect(told(decided(before, 1), decided(after, 3))).toEqual([
      ["quasi-peak", -2],
      ["peak", -3],
    ]);
    expect(told(decided(after, 3), decided(before, 1))).toEqual([
      ["quasi-peak", 2],
      ["peak", 3],
    ]);
  });

  test("a pair whose span differs is left out with its reason, and its margins are no change", () => {
    const after = sweep({
      traces: [trace("peak", 47), { ...trace("quasi-peak", 43), lastHz: 900e6 }],
      readings: [reading(3, "quasi-peak")],
    });
    const held = { ...before, readings: [reading(1, "quasi-peak")] };
    const delta = compare(held, after);
    expect(delta.mismatches).toEqual([]);
    expect(delta.changes?.levels.map((level) => level.detector)).toEqual(["peak"]);
    expect(delta.doubts.join(" ")).toMatch(/quasi-peak traces are not compared\. The span differs/);
    expect(delta.changes?.margins[0]).toMatchObject({ changeDb: null, beforeDb: 1, afterDb: 3 });
    expect(delta.changes?.margins[0]?.note).toContain("not comparable");
  });

  test("an accepted span lets the pair be compared and says whose span the numbers are of", () => {
    const one = sweep({ traces: [trace("peak", 50)] });
    const other = sweep({ traces: [{ ...trace("peak", 44), lastHz: 900e6 }] });
    const acceptance = {
      id: "1",
      fields: ["span" as const],
      reason: "Nothing above 900 MHz on either.",
      by: "Mara",
      at: "2026-12-01T10:00:00.000Z",
    };
    const delta = compareSides([one], [other], { levels: new Map(), acceptance, tolerancePpm: 0 });
    expect(delta.mismatches.map((m) => m.field)).toEqual(["span"]);
    expect(delta.changes?.peakDb).toBe(-6);
    expect(delta.doubts.join(" ")).toContain("their own whole span");
    const foreign = { ...acceptance, fields: ["bench" as const] };
    const refused = { levels: new Map(), acceptance: foreign, tolerancePpm: 0 };
    expect(compareSides([one], [other], refused)).toMatchObject({ changes: null, accepted: null });
  });

  test("with an accepted bandwidth the band power counts each filter, or is not told", () => {
    const acceptance = {
      id: "1",
      fields: ["rbw" as const],
      reason: "Narrow lines only, no noise.",
      by: "Mara",
      at: "2026-12-01T10:00:00.000Z",
    };
    const context = { levels: new Map(), acceptance, tolerancePpm: 0 };
    const wide = sweep({ settings: { rbwHz: 1e6 } });
    const delta = compareSides([sweep()], [wide], context);
    expect(delta.changes?.bandPowerDb).toBeCloseTo(-10 * Math.log10(1e6 / 120e3), 10);
    const unknown = sweep({ settings: { rbwHz: 1e6, rbwKind: null } });
    expect(compareSides([sweep()], [unknown], context).changes?.bandPowerDb).toBeNull();
  });
});

const once = (changeDb: number | null): MeasuredChange => ({
  changeDb,
  uncertaintyDb: null,
  repeats: { before: 1, after: 1 },
  isWithinRepeatability: null,
});
const repeated = (changeDb: number, uncertaintyDb: number): MeasuredChange => ({
  changeDb,
  uncertaintyDb,
  repeats: { before: 3, after: 3 },
  isWithinRepeatability: Math.abs(changeDb) <= uncertaintyDb,
});

describe("describeChange", () => {
  const say = (
    peak: MeasuredChange,
    floor: MeasuredChange,
    bandPower: MeasuredChange,
    suspects?: { fresh: number; gone: number },
  ) => describeChange({ peak, floor, bandPower, bandPowerIsPower: true }, suspects);

  test("tells the spread of energy in one sentence", () => {
    expect(say(once(-9.6), once(12), once(0.1))).toBe(
      "Peaks came down 9.6 dB, the floor came up 12.0 dB, band power moved 0.1 dB up: the energy was spread, not removed.",
    );
  });

  test("concludes nothing that the repeats do not bear out", () => {
    expect(say(repeated(-1.2, 1.5), once(0), once(0))).toBe(
      "Peaks did not move beyond repeatability (± 1.5 dB), the floor did not move, band power moved 0.0 dB.",
    );
    // −0.4 ± 0.9 leaves room for a clear loss of power, so nothing is said about where it went.
    expect(say(repeated(-6, 0.8), once(0), repeated(-0.4, 0.9))).not.toContain("spread");
    expect(say(repeated(-6, 0.8), once(0), repeated(-4, 0.9))).toMatch(
      /Peaks came down 6\.0 dB ± 0\.8,.*: less energy reaches the bench\.$/,
    );
  });

  test("does not call a sum that grew over spread peaks more energy", () => {
    const change = { peak: once(-3), floor: once(6.4), bandPower: once(5.8) };
    expect(describeChange({ ...change, bandPowerIsPower: false })).toBe(
      "Peaks came down 3.0 dB, the floor came up 6.4 dB, the sum over the band moved 5.8 dB up.",
    );
    expect(describeChange({ ...change, bandPowerIsPower: true })).toMatch(/: more energy/);
  });

  test.each([
    [1, 0, " 1 suspect is new."],
    [2, 0, " 2 suspects are new."],
    [0, 1, " 1 suspect is gone."],
    [0, 3, " 3 suspects are gone."],
    [1, 1, " 1 suspect is new and 1 is gone."],
    [2, 3, " 2 suspects are new and 3 are gone."],
  ])("counts %i new and %i gone in the right number", (fresh, gone, tail) => {
    const text = say(once(-3), once(0), once(null), { fresh, gone });
    expect(text.endsWith(`the floor did not move.${tail}`)).toBe(true);
  });

  test("says so when nothing can be told", () => {
    expect(say(once(null), once(null), once(null))).toBe("Neither sweep has a level to compare.");
  });
});

test.each([
  [1, 1, "Swept once before and once after, so no repeatability is known."],
  [1, 3, "Swept once before and 3 times after, so no repeatability is known."],
  [2, 1, "Swept 2 times before and once after, so no repeatability is known."],
  [2, 3, "The ± is 95 % from 2 sweeps before and 3 after."],
])("describeRepeats: %i before and %i after", (before, after, text) => {
  expect(describeRepeats(before, after)).toBe(text);
});
