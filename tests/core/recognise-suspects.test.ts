import { describe, expect, test } from "vitest";
import type { SpreadDirection, SpreadSpectrum } from "@/lib/core/link/link-settings";
import type { FollowedFrequency, Resolution } from "@/lib/core/reading/recognise-suspects";
import {
  recogniseSuspects,
  recognitionToleranceHz,
  recognitionWindow,
} from "@/lib/core/reading/recognise-suspects";
import { standingOfSuspect } from "@/lib/core/reading/suspect-state";
import { randomFrom } from "../support/traces";

const spread = (direction: SpreadDirection, depthPercent = 0.5): SpreadSpectrum => ({
  depthPercent,
  direction,
  modulationHz: 31e3,
  profile: "triangular",
});
const SHARP: Resolution = { rbwHz: 9e3, stepHz: 4e3, spread: null };
const PLAIN: Resolution = { rbwHz: 120e3, stepHz: 60e3, spread: null };

const followed = (id: string, frequencyHz: number, toleranceHz = 240e3): FollowedFrequency => ({
  id,
  frequencyHz,
  toleranceHz,
});

function shuffled<T>(list: readonly T[], random: () => number): T[] {
  return list
    .map((item) => ({ item, at: random() }))
    .sort((a, b) => a.at - b.at)
    .map(({ item }) => item);
}

describe("tolerance", () => {
  test("is the widest of two RBW, two steps, the spread's depth and the clock's ppm", () => {
    expect(recognitionToleranceHz(148.5e6, PLAIN)).toBe(240e3);
    expect(recognitionToleranceHz(148.5e6, { ...PLAIN, stepHz: 1e6 })).toBe(2e6);
    expect(recognitionToleranceHz(600e6, { ...PLAIN, spread: spread("down") })).toBeCloseTo(3e6, 3);
    expect(recognitionToleranceHz(5e9, SHARP)).toBeCloseTo(500e3, 3);
  });

  test("counts the whole depth of a spread around the centre: the peak may stand at either end", () => {
    expect(recognitionToleranceHz(600e6, { ...PLAIN, spread: spread("centre") })).toBeCloseTo(3e6);
  });

  test("is never nothing when the sweep states neither RBW nor step", () => {
    const unstated = { rbwHz: null, stepHz: null, spread: null };
    expect(recognitionToleranceHz(100e6, unstated)).toBeCloseTo(10e3, 6);
  });
});

describe("window", () => {
  const at = followed("a", 600e6);
  test.each([
    ["down", 597e6, 600.24e6],
    ["up", 599.76e6, 603e6],
    ["centre", 598.5e6, 601.5e6],
  ] as const)("grows %s as the spread goes", (direction, startHz, stopHz) => {
    const window = recognitionWindow(at, { ...PLAIN, spread: spread(direction) });
    expect(window.startHz).toBeCloseTo(startHz, 3);
    expect(window.stopHz).toBeCloseTo(stopHz, 3);
  });

  test("keeps the stored tolerance for a sharper sweep and widens for a coarser one", () => {
    expect(recognitionWindow(at, SHARP)).toEqual({ startHz: 599.76e6, stopHz: 600.24e6 });
    const coarse = recognitionWindow(at, { ...SHARP, rbwHz: 1e6 });
    expect(coarse).toEqual({ startHz: 598e6, stopHz: 602e6 });
  });
});

describe("recognising", () => {
  test("takes what lies on the edge of the window and leaves what lies beyond it", () => {
    const found = [{ number: 1, frequencyHz: 148.74e6 }];
    expect(recogniseSuspects([followed("a", 148.5e6)], found, PLAIN)).toEqual(new Map([["a", 1]]));
    const beyond = [{ number: 1, frequencyHz: 148.740001e6 }];
    expect(recogniseSuspects([followed("a", 148.5e6)], beyond, PLAIN).size).toBe(0);
  });

  test("gives the nearest to each, also when one could have either", () => {
    const two = [followed("a", 100e6), followed("b", 100.2e6)];
    const found = [
      { number: 1, frequencyHz: 100.19e6 },
      { number: 2, frequencyHz: 100.08e6 },
    ];
    expect(recogniseSuspects(two, found, PLAIN)).toEqual(
      new Map([
        ["b", 1],
        ["a", 2],
      ]),
    );
  });

  test("gives one peak to one followed suspect only", () => {
    const two = [followed("a", 100e6), followed("b", 100.2e6)];
    const matched = recogniseSuspects(two, [{ number: 7, frequencyHz: 100.05e6 }], PLAIN);
    expect([...matched]).toEqual([["a", 7]]);
  });

  test("at the same distance the lower frequency goes first", () => {
    const two = [followed("b", 100.2e6), followed("a", 100e6)];
    const matched = recogniseSuspects(two, [{ number: 7, frequencyHz: 100.1e6 }], PLAIN);
    expect([...matched]).toEqual([["a", 7]]);
  });

  test("is one-to-one, within the window, complete, and the same in every order", () => {
    const random = randomFrom(20261201);
    let matches = 0;
    for (let round = 0; round < 200; round += 1) {
      const hz = () => 100e6 + Math.round(random() * 40) * 50e3;
      const ones = Array.from({ length: 8 }, (_, i) =>
        followed(`f${i}`, hz(), 50e3 + random() * 4e5),
      );
      const found = Array.from({ length: 10 }, (_, i) => ({ number: i + 1, frequencyHz: hz() }));
      const seenBy = { ...SHARP, spread: random() < 0.5 ? null : spread("down", 0.2) };
      const matched = recogniseSuspects(ones, found, seenBy);
      matches += matched.size;
      expect(new Set(matched.values()).size).toBe(matched.size);
      const inside = (one: FollowedFrequency, frequencyHz: number) => {
        const { startHz, stopHz } = recognitionWindow(one, seenBy);
        return frequencyHz >= startHz && frequencyHz <= stopHz;
      };
      for (const one of ones) {
        const number = matched.get(one.id);
        const free = found.filter((s) => ![...matched.values()].includes(s.number));
        if (number === undefined) {
          // Nobody stays alone beside a peak that nobody else took.
          expect(free.some((s) => inside(one, s.frequencyHz))).toBe(false);
        } else {
          expect(inside(one, found[number - 1]!.frequencyHz)).toBe(true);
        }
      }
      const again = recogniseSuspects(shuffled(ones, random), shuffled(found, random), seenBy);
      expect([...again].sort()).toEqual([...matched].sort());
    }
    expect(matches).toBeGreaterThan(500);
  });
});

describe("where a suspect stands by itself", () => {
  test.each([
    [-0.1, "like-for-like", "over"],
    [0, "like-for-like", "inside-guard"],
    [1.9, "like-for-like", "inside-guard"],
    [2, "like-for-like", "clear"],
    [-0.1, "upper-bound", "undecided"],
    [1.9, "upper-bound", "inside-guard"],
    [2, "upper-bound", "clear"],
    [9, "cannot-decide", "undecided"],
    [null, "like-for-like", null],
  ] as const)("a margin of %s dB, %s, with a guard of 2 dB: %s", (marginDb, basis, standing) => {
    expect(standingOfSuspect({ marginDb, basis }, 2)).toBe(standing);
  });
});
