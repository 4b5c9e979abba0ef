import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { compareSides } from "@/lib/core/delta/compare-sides";
import type { ComparedSweep } from "@/lib/core/delta/compared-sweep";
import { pairSweeps } from "@/lib/core/delta/pair-sweeps";
import { reading, sweep, TRACE } from "./delta-fixtures";

const compareSweeps = (before: ComparedSweep, after: ComparedSweep) =>
  compareSides([before], [after]);

describe("compareSides, one sweep each", () => {
  test("takes after minus before for margin, peak, floor and band power", () => {
    const before = sweep({ readings: [reading(-3)] });
    const after = sweep({
      traces: [{ ...TRACE, maxDb: 40.4, floorDb: 32, powerSumDb: 120.1 }],
      readings: [reading(6.6)],
    });
    const delta = compareSweeps(before, after);
    expect(delta.mismatches).toEqual([]);
    expect(delta.changes!.margins[0]).toMatchObject({ beforeDb: -3, afterDb: 6.6, note: null });
    expect(delta.changes!.margins[0]!.changeDb).toBeCloseTo(9.6, 12);
    expect(delta.changes!.peakDb).toBeCloseTo(-9.6, 12);
    expect(delta.changes!.floorDb).toBe(12);
    expect(delta.changes!.bandPowerDb).toBeCloseTo(0.1, 12);
    expect(delta.changes!.sentence).toBe(
      "Peaks came down 9.6 dB, the floor came up 12.0 dB, the sum over the band moved 0.1 dB up: the energy was spread, not removed, as far as a sum over this detector can tell.",
    );
  });

  test("of a sweep with itself is exactly zero", () => {
    const own = sweep({ readings: [reading(4.2)] });
    const { changes, doubts } = compareSweeps(own, own);
    expect(doubts).toEqual([]);
    expect(changes).toMatchObject({ peakDb: 0, floorDb: 0, bandPowerDb: 0 });
    expect(changes!.margins[0]!.changeDb).toBe(0);
  });

  test("turns its sign when the two are exchanged", () => {
    const level = fc.double({ min: -200, max: 200, noNaN: true });
    fc.assert(
      fc.property(level, level, level, level, (a, b, c, d) => {
        const x = sweep({ traces: [{ ...TRACE, maxDb: a, floorDb: b }], readings: [reading(c)] });
        const y = sweep({ traces: [{ ...TRACE, maxDb: c, floorDb: d }], readings: [reading(a)] });
        const [there, back] = [compareSweeps(x, y).changes!, compareSweeps(y, x).changes!];
        expect(there.peakDb! + back.peakDb!).toBe(0);
        expect(there.floorDb! + back.floorDb!).toBe(0);
        expect(there.margins[0]!.changeDb! + back.margins[0]!.changeDb!).toBe(0);
      }),
    );
  });

  test.each([
    ["bench", { benchId: "other", benchName: "Other" }],
    ["signal-path", { signalPathRevisionId: "path-2", signalPathRevision: 2 }],
    ["signal-path", { corrected: true }],
    ["distance", { settings: { distanceM: 10 } }],
    ["distance", { settings: { distanceM: null } }],
    ["rbw", { settings: { rbwHz: 9e3 } }],
    ["rbw", { settings: { rbwHz: null } }],
    ["rbw-kind", { settings: { rbwKind: "3dB" as const } }],
    ["polarization", { settings: { polarization: "vertical" as const } }],
    ["position", { settings: { heightM: 2 } }],
    ["port", { settings: { port: "mains" as const } }],
    ["purpose", { purpose: "ambient" as const }],
    ["detector", { traces: [{ ...TRACE, detector: "average" as const }] }],
    ["unit", { traces: [{ ...TRACE, unit: "dBuV" as const }] }],
    ["span", { traces: [{ ...TRACE, lastHz: 900e6 }] }],
  ])("is not comparable when the %s differs, and says which values", (field, part) => {
    const delta = compareSweeps(sweep(), sweep(part));
    expect(delta.changes).toBeNull();
    expect(delta.mismatches.map((m) => m.field)).toEqual([field]);
    expect(delta.mismatches[0]!.text).toMatch(/\.$/);
  });

  test("takes other settings that differ as doubts", () => {
    const after = sweep({
      settings: { attenuationDb: 20, vbwHz: 300e3, sweepTimeS: 2, preamplifier: true },
      traces: [{ ...TRACE, hold: "none" }],
    });
    const { doubts, changes } = compareSweeps(sweep(), after);
    expect(changes).not.toBeNull();
    expect(doubts).toEqual([
      "Attenuation differs: 10 dB before, 20 dB after.",
      "The video bandwidth differs: not stated before, 300.0 kHz after.",
      "The sweep time differs: 1 s before, 2 s after.",
      "The preamplifier differs: off before, on after.",
      "The hold differs: max hold before, no hold after.",
    ]);
  });

  test("takes no change of margin between two detectors", () => {
    const before = sweep({ readings: [reading(-2, "peak")] });
    const after = sweep({ readings: [reading(5, "quasi-peak")] });
    const [margin] = compareSweeps(before, after).changes!.margins;
    expect(margin).toMatchObject({ beforeDb: -2, afterDb: 5, changeDb: null });
    expect(margin!.note).toContain("Decided by peak before and quasi-peak after");
  });

  test("compares two mask revisions not at all", () => {
    const after = sweep({ readings: [{ ...reading(9), maskRevisionId: "mask-2" }] });
    const before = sweep({ readings: [reading(1)] });
    expect(compareSweeps(before, after).changes!.margins).toEqual([]);
  });
});

describe("pairSweeps", () => {
  const high = { ...TRACE, firstHz: 1e9, lastHz: 6e9 };

  test("pairs by span, polarization and purpose, and takes repeats together", () => {
    const before = [
      sweep({ id: "low-h" }),
      sweep({ id: "low-v", settings: { polarization: "vertical" } }),
      sweep({ id: "high", traces: [high] }),
      sweep({ id: "ambient", purpose: "ambient" }),
      sweep({ id: "low-h-again" }),
    ];
    const after = [
      sweep({ id: "1", settings: { polarization: "vertical" } }),
      sweep({ id: "2", traces: [high] }),
      sweep({ id: "3" }),
    ];
    const ids = (side: readonly ComparedSweep[]) => side.map((one) => one.id).join(" ");
    const pairs = pairSweeps(before, after).map((p) => [ids(p.after), ids(p.before)]);
    expect(pairs).toEqual([
      ["1", "low-v"],
      ["2", "high"],
      ["3", "low-h low-h-again"],
    ]);
  });

  test("leaves a sweep without a counterpart alone", () => {
    expect(pairSweeps([sweep({ traces: [high] })], [sweep()])).toEqual([]);
  });
});
