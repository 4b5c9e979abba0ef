import { describe, expect, test } from "vitest";
import { readSweep } from "@/lib/core/reading/read-sweep";
import type { Trace } from "@/lib/core/sweep/trace";
import { scan, SETTINGS } from "./hand-worked/case";
import { LOW_BAND } from "./hand-worked/masks";

/** What the numbers are is worked out in hand-worked/; here is what a reading says in words. */
const explanationOf = (traces: Trace[], guardDb = 0) =>
  readSweep({ traces, settings: SETTINGS, mask: LOW_BAND, guardDb }).lines[0]?.explanation;

describe("a standing that needs words says them", () => {
  test("clear or inside guard on a part: on how much of the mask, rounded down", () => {
    // 30 to 31.025 MHz of 30 to 32 MHz: ln(31.025/30)/ln(32/30) = 52.06 %.
    const half = [scan([30e6, 31e6, 50e3], 30, [])];
    expect(explanationOf(half)).toMatch(/^Clear on 52 % of the mask/);
    expect(explanationOf(half, 12)).toMatch(/^Inside guard on 52 % of the mask/);
    // One level missing at 31 MHz in steps of 1 kHz: 99.9 %, which is never told as 100 %.
    const nearly = [scan([30e6, 32e6, 1e3], 30, [[31e6, Number.NaN]])];
    expect(explanationOf(nearly)).toMatch(/^Clear on 99 % of the mask/);
  });

  test("a bound over the line: that the line's own detector has to be measured", () => {
    const peak = [scan([30e6, 32e6, 50e3], 20, [[31e6, 44]], { detector: "peak" })];
    expect(explanationOf(peak)).toContain("the line's own detector");
  });

  test("no trace that can decide: that there is none", () => {
    const average = [scan([30e6, 32e6, 50e3], 20, [], { detector: "average" })];
    expect(explanationOf(average)).toContain("No trace");
  });

  test("a standing that speaks for itself needs none", () => {
    expect(explanationOf([scan([30e6, 32e6, 50e3], 30, [])])).toBeNull();
    expect(explanationOf([scan([30e6, 32e6, 50e3], 45, [])])).toBeNull();
  });
});
