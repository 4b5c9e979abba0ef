import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { compareSides } from "@/lib/core/delta/compare-sides";
import type { ComparedSweep } from "@/lib/core/delta/compared-sweep";
import type { SuspectChange } from "@/lib/core/delta/delta";
import { suspectWindow } from "@/lib/core/delta/suspect-window";
import type { SpreadSpectrum } from "@/lib/core/link/link-settings";
import type { Trace } from "@/lib/core/sweep/trace";
import { hzOf, levelsOf, NO_LINK, sweep } from "./delta-fixtures";

const spread = (direction: SpreadSpectrum["direction"], depthPercent = 0.5): SpreadSpectrum => ({
  direction,
  depthPercent,
  modulationHz: 31.5e3,
  profile: "triangular",
});

describe("suspectWindow", () => {
  const at = 1e9;

  test("follows a line to where the later spread spectrum moves it", () => {
    expect(suspectWindow(at, null, spread("down"), 240e3, 0)).toEqual({
      startHz: 995e6,
      stopHz: at + 240e3,
    });
    expect(suspectWindow(at, null, spread("up"), 240e3, 0)).toEqual({
      startHz: at - 240e3,
      stopHz: expect.closeTo(1.005e9, 3),
    });
    const centre = suspectWindow(at, null, spread("centre"), 240e3, 0);
    expect(centre.startHz).toBeCloseTo(997.5e6, 3);
    expect(centre.stopHz).toBeCloseTo(1002.5e6, 3);
  });

  test("follows a spread line back to where it stands without", () => {
    const back = suspectWindow(995e6, spread("down"), null, 240e3, 0);
    expect(back.startHz).toBe(995e6 - 240e3);
    expect(back.stopHz).toBeCloseTo(1e9, 3);
  });

  test("is never narrower than the bandwidth and step ask for, nor than the clocks' tolerance", () => {
    expect(suspectWindow(at, spread("down", 0.001), null, 240e3, 0)).toEqual({
      startHz: at - 240e3,
      stopHz: at + 240e3,
    });
    expect(suspectWindow(at, null, null, 240e3, 500)).toEqual({
      startHz: at - 500e3,
      stopHz: at + 500e3,
    });
  });

  test("of a line's place in one sweep holds its place in the other, whatever the spreads", () => {
    const any = fc.option(
      fc.record({
        direction: fc.constantFrom("down", "centre", "up" as const),
        depth: fc.double({ min: 0.01, max: 5, noNaN: true }),
      }),
      { nil: null },
    );
    const placed = (
      one: { direction: string; depth: number } | null,
      hz: number,
      share: number,
    ) => {
      if (!one) return hz;
      const d = one.depth / 100;
      const low = one.direction === "down" ? -d : one.direction === "centre" ? -d / 2 : 0;
      return hz * (1 + low + share * d);
    };
    const share = fc.double({ min: 0, max: 1, noNaN: true });
    fc.assert(
      fc.property(any, any, share, share, (mine, theirs, x, y) => {
        const make = (one: typeof mine) =>
          one && spread(one.direction as SpreadSpectrum["direction"], one.depth);
        const window = suspectWindow(placed(mine, at, x), make(mine), make(theirs), 1, 0);
        const other = placed(theirs, at, y);
        expect(other).toBeGreaterThanOrEqual(window.startHz - 1e-3);
        expect(other).toBeLessThanOrEqual(window.stopHz + 1e-3);
      }),
    );
  });
});

/** A sweep of 60 kHz steps from 100 MHz with suspects at some of its samples. */
function swept(
  id: string,
  trace: Trace,
  suspects: number[],
  link: Partial<typeof NO_LINK> = {},
): { sweep: ComparedSweep; levels: [string, Trace[]] } {
  const found = suspects.map((i) => ({
    frequencyHz: hzOf(i),
    levelDb: trace.levelsDb[i] ?? Number.NaN,
    traceIndex: 0,
  }));
  return {
    sweep: sweep({
      id,
      name: id,
      link: { ...NO_LINK, spreadOff: true, ...link },
      readings: [
        { maskRevisionId: "m", maskTitle: "A mask", guardDb: 2, lines: [], suspects: found },
      ],
    }),
    levels: [id, [trace]],
  };
}

type Swept = ReturnType<typeof swept>;

const compare = (before: Swept[], after: Swept[], tolerancePpm = 0) => {
  const [a, b] = [before, after].map((side) => side.map((one) => one.sweep));
  const levels = new Map([...before, ...after].map((one) => one.levels));
  return compareSides(
    a as [ComparedSweep, ...ComparedSweep[]],
    b as [ComparedSweep, ...ComparedSweep[]],
    { levels, acceptance: null, tolerancePpm },
  );
};

describe("changes of suspects", () => {
  test("take the highest level in ± max(2·RBW, 2·step), ends included", () => {
    // 2·RBW = 240 kHz = four steps of 60 kHz.
    const before = swept("b", levelsOf(20, { 100: 50 }), [100]);
    const near = swept("a", levelsOf(20, { 104: 41, 105: 60 }), [104]);
    const { changes } = compare([before], [near]);
    expect(changes?.suspects.followed).toMatchObject([
      {
        frequencyHz: hzOf(100),
        window: { startHz: hzOf(96), stopHz: hzOf(104) },
        beforeDb: 50,
        afterDb: 41,
        changeDb: -9,
        beforeAtHz: hzOf(100),
        afterAtHz: hzOf(104),
        uncertaintyDb: null,
      },
    ]);
    expect(changes?.suspects.fresh).toEqual([]);
    expect(changes?.suspects.gone).toEqual([]);
  });

  test("new ones and gone ones are told apart, with what stands there now", () => {
    const before = swept("b", levelsOf(20, { 100: 50, 500: 45 }), [100, 500]);
    const after = swept("a", levelsOf(22, { 100: 48, 800: 44 }), [100, 800]);
    const { changes } = compare([before], [after]);
    expect(changes?.suspects.followed.map((s) => [s.frequencyHz, s.changeDb])).toEqual([
      [hzOf(100), -2],
    ]);
    expect(changes?.suspects.gone).toMatchObject([
      { frequencyHz: hzOf(500), beforeDb: 45, afterDb: 22, changeDb: -23 },
    ]);
    expect(changes?.suspects.fresh).toMatchObject([
      { frequencyHz: hzOf(800), beforeDb: 20, afterDb: 44, changeDb: 24 },
    ]);
    expect(changes?.sentence).toMatch(/\. 1 suspect is new and 1 is gone\.$/);
  });

  test("follow a line that down-spread moved by half a percent, and not above it", () => {
    // 0.5 % of 130 MHz is 650 kHz, ten steps: only below, and further than 2·RBW.
    const before = swept("b", levelsOf(20, { 500: 60 }), [500]);
    const down = { spread: spread("down"), spreadOff: null };
    const below = swept("a", levelsOf(20, { 490: 48 }), [490], down);
    const above = swept("a", levelsOf(20, { 510: 48 }), [510], down);
    expect(compare([before], [below]).changes?.suspects.followed).toMatchObject([
      { beforeDb: 60, afterDb: 48, changeDb: -12 },
    ]);
    const { suspects } = compare([before], [above]).changes!;
    expect(suspects.followed).toEqual([]);
    expect([suspects.fresh.length, suspects.gone.length]).toEqual([1, 1]);
    const still = swept("a", levelsOf(20, { 490: 48 }), [490]);
    expect(compare([before], [still]).changes?.suspects.gone).toHaveLength(1);
  });

  test("follow a clock's tolerance", () => {
    const before = swept("b", levelsOf(20, { 500: 60 }), [500]);
    const after = swept("a", levelsOf(20, { 508: 58 }), [508]);
    expect(compare([before], [after]).changes?.suspects.followed).toEqual([]);
    // 5000 ppm of 130 MHz are 650 kHz.
    expect(compare([before], [after], 5000).changes?.suspects.followed).toMatchObject([
      { changeDb: -2 },
    ]);
  });

  test("carry the ± of the repeats", () => {
    const at = (id: string, level: number) => swept(id, levelsOf(20, { 100: level }), [100]);
    const { changes } = compare([at("b1", 50), at("b2", 51)], [at("a1", 40), at("a2", 41)]);
    const [followed] = changes!.suspects.followed;
    // s² = 0.5 on both sides: √(0.5/2 + 0.5/2) = 0.70711; Student at ν = 2 is 4.302653 (scipy, C).
    expect(followed?.uncertaintyDb).toBeCloseTo(0.70710678 * 4.302653, 5);
    expect(followed).toMatchObject({ repeats: { before: 2, after: 2 }, changeDb: -10 });
  });

  test("say so when levels or the other detector's trace are missing", () => {
    const before = swept("b", levelsOf(20, { 100: 50 }), [100]);
    const after = swept("a", levelsOf(20, { 100: 40 }), [100]);
    const none = compareSides([before.sweep], [after.sweep]);
    expect(none.changes?.suspects.followed).toEqual([]);
    expect(none.doubts.join(" ")).toContain("Suspects are not followed");
    const quiet = swept("a", levelsOf(20, { 100: 40 }), [100], { spreadOff: null });
    expect(compare([before], [quiet]).doubts.join(" ")).toContain("stated only before");
  });

  test("turn their sign when the sides are exchanged; new ones become gone ones", () => {
    const peaks = fc.dictionary(
      fc.integer({ min: 1, max: 998 }).map(String),
      fc.integer({ min: 30, max: 70 }),
      { maxKeys: 12 },
    );
    const links = fc.constantFrom(null, spread("down"), spread("centre"), spread("up"));
    const make = (id: string, own: Record<string, number>, link: SpreadSpectrum | null) =>
      swept(
        id,
        levelsOf(20, own),
        Object.keys(own).map(Number),
        link ? { spread: link, spreadOff: null } : {},
      );
    const told = (list: SuspectChange[]) =>
      list.map((s) => [s.frequencyHz, s.beforeDb, s.afterDb, s.changeDb]);
    const turned = (list: SuspectChange[]) =>
      list.map((s) => [s.frequencyHz, s.afterDb, s.beforeDb, 0 - (s.changeDb ?? Number.NaN)]);
    fc.assert(
      fc.property(peaks, peaks, links, links, (x, y, p, q) => {
        const [a, b] = [make("x", x, p), make("y", y, q)];
        const there = compare([a], [b]).changes!.suspects;
        const back = compare([b], [a]).changes!.suspects;
        expect(turned(there.followed)).toEqual(told(back.followed));
        expect(turned(there.fresh)).toEqual(told(back.gone));
        expect(turned(there.gone)).toEqual(told(back.fresh));
        const own = compare([a], [a]).changes!.suspects;
        expect([own.fresh, own.gone]).toEqual([[], []]);
        expect(own.followed.every((s) => s.changeDb === 0)).toBe(true);
      }),
      { numRuns: 300 },
    );
  });
});
