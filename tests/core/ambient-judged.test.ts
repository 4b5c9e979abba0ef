import { describe, expect, test } from "vitest";
import type { AmbientCheck } from "@/lib/core/reading/ambient-check";
import { judgeAmbient } from "@/lib/core/reading/judge-ambient";
import type { LineReading, Suspect } from "@/lib/core/reading/reading";

const base = { traceIndex: 0, partIndex: 0, limitDb: 50 };

function suspect(number: number, levelDb: number): Suspect {
  const frequencyHz = number * 100e6;
  return {
    ...base,
    number,
    frequencyHz,
    sampleHz: frequencyHz,
    levelDb,
    marginDb: 50 - levelDb,
    prominenceDb: 10,
    lineName: "Peak",
    basis: "like-for-like",
  };
}

function line(lineIndex: number, name: string, levelDb: number): LineReading {
  return {
    lineIndex,
    name,
    detector: "peak",
    basis: "like-for-like",
    standing: "clear",
    worst: { ...base, frequencyHz: 100e6, levelDb, marginDb: 50 - levelDb },
    coverage: { fraction: 1, gaps: [] },
    bands: [],
    explanation: null,
  };
}

const READING = {
  unit: "dBuV/m" as const,
  lines: [line(0, "Peak", 45)],
  suspects: [suspect(1, 45), suspect(2, 40), suspect(3, 36)],
};

function check(change: Partial<AmbientCheck> = {}): AmbientCheck {
  return {
    version: 1,
    notComparable: null,
    caveat: null,
    suspects: [1, 2, 3].map((number) => ({ number, ambientDb: 20 })),
    lines: [{ lineIndex: 0, frequencyHz: 150e6, ambientDb: 20, marginDb: 30 }],
    worst: [{ lineIndex: 0, ambientDb: 20 }],
    ...change,
  };
}

const at = (...levels: number[]) => ({
  suspects: levels.map((ambientDb, i) => ({ number: i + 1, ambientDb })),
});

const held = (...checks: AmbientCheck[]) =>
  checks.map((one, i) => ({ sweepName: `Ambient ${i + 1}`, check: one }));

describe("judgeAmbient", () => {
  test("a quiet ambient that covers everything is no doubt", () => {
    const judged = judgeAmbient(held(check()), READING);
    expect(judged.doubts).toEqual([]);
    expect(judged.suspects.map((s) => s.isLikelyAmbient)).toEqual([false, false, false]);
  });

  test("nothing is said where no ambient sweep is, nor of a reading without lines", () => {
    const nothing = { suspects: [], doubts: [] };
    expect(judgeAmbient([], READING)).toEqual(nothing);
    expect(judgeAmbient(held(check()), { ...READING, lines: [], suspects: [] })).toEqual(nothing);
  });

  test("a suspect is likely ambient from 3 dB over the ambient downwards", () => {
    const { suspects, doubts } = judgeAmbient(held(check(at(42, 36.9, 36))), READING);
    expect(suspects).toEqual([
      {
        number: 1,
        ambientDb: 42,
        isLikelyAmbient: true,
        // 45 − 42 dB: 10 log10(10^4.5 − 10^4.2) = 45 + 10 log10(1 − 10^−0.3) = 41.9794.
        withoutAmbientDb: expect.closeTo(41.9794, 4),
      },
      {
        number: 2,
        ambientDb: 36.9,
        isLikelyAmbient: false,
        // 40 + 10 log10(1 − 10^−0.31) = 40 + 10 log10(0.510221) = 37.0776.
        withoutAmbientDb: expect.closeTo(37.0776, 4),
      },
      { number: 3, ambientDb: 36, isLikelyAmbient: true, withoutAmbientDb: null },
    ]);
    expect(doubts).toEqual([
      {
        code: "ambient-near",
        text: expect.stringMatching(
          /^3 of 3 suspects lie within 6 dB of the ambient\. 2 are within 3 dB of it and likely ambient\./,
        ),
        valueDb: 0,
      },
    ]);
  });

  test("counts the suspects within 6 dB: 6.0 is within, 6.1 is not", () => {
    const [doubt, ...more] = judgeAmbient(held(check(at(39, 33.9, 20))), READING).doubts;
    expect(more).toEqual([]);
    expect(doubt).toMatchObject({ code: "ambient-near", valueDb: 6 });
    expect(doubt?.text).toMatch(/^1 of 3 suspects lies within 6 dB of the ambient\. What/);
  });

  test("the highest of several ambient sweeps counts, whatever their order", () => {
    const [low, high] = [check(at(20, 39, 20)), check(at(41, 20, 20))];
    for (const both of [held(low, high), held(high, low)])
      expect(judgeAmbient(both, READING).suspects.map((s) => s.ambientDb)).toEqual([41, 39, 20]);
  });

  test("an ambient within 6 dB of a line is one doubt with its number and frequency", () => {
    const near = (marginDb: number, frequencyHz: number) =>
      check({ lines: [{ lineIndex: 0, frequencyHz, ambientDb: 50 - marginDb, marginDb }] });
    const { doubts } = judgeAmbient(held(near(5.9, 95.3e6), near(2.3, 187e6)), READING);
    expect(doubts).toHaveLength(1);
    expect(doubts[0]).toMatchObject({ code: "ambient-near", valueDb: 2.3 });
    expect(doubts[0]?.text).toContain(
      "The ambient comes to 47.7 dBµV/m at 187.0 MHz, 2.3 dB under the Peak line.",
    );
    expect(judgeAmbient(held(near(6.1, 95e6)), READING).doubts).toEqual([]);
    expect(judgeAmbient(held(near(-1.5, 95e6)), READING).doubts[0]?.text).toContain(
      "1.5 dB over the Peak line",
    );
  });

  test("an ambient near the worst point is the same line's doubt, not another one", () => {
    const worst = [{ lineIndex: 0, ambientDb: 41 }];
    const [doubt, ...more] = judgeAmbient(held(check({ worst })), READING).doubts;
    expect(more).toEqual([]);
    expect(doubt).toMatchObject({ code: "ambient-near", valueDb: 4 });
    expect(doubt?.text).toContain(
      "At 100.0 MHz, where Peak has its worst margin, the ambient lies 4.0 dB under the level that was read.",
    );
    const lines = [{ lineIndex: 0, frequencyHz: 95e6, ambientDb: 45, marginDb: 5 }];
    const both = judgeAmbient(held(check({ worst, lines })), READING).doubts;
    expect(both).toHaveLength(1);
    expect(both[0]).toMatchObject({ valueDb: 5 });
  });

  test("a worst point more than 20 dB under its line is the floor and raises no doubt", () => {
    const reading = { ...READING, lines: [line(0, "Peak", 29)], suspects: [] };
    const near = check({ suspects: [], worst: [{ lineIndex: 0, ambientDb: 28 }] });
    expect(judgeAmbient(held(near), reading).doubts).toEqual([]);
    expect(judgeAmbient(held({ ...near, worst: [] }), reading).doubts).toEqual([]);
  });

  test("without a comparable ambient sweep every reason is named", () => {
    const refused = check({ notComparable: "It was taken at another port.", ...at() });
    const { suspects, doubts } = judgeAmbient(
      [...held(refused), { sweepName: "Late", check: null }],
      READING,
    );
    expect(suspects).toEqual([]);
    expect(doubts).toHaveLength(1);
    expect(doubts[0]?.code).toBe("ambient-not-comparable");
    expect(doubts[0]?.text).toContain('"Ambient 1": It was taken at another port.');
    expect(doubts[0]?.text).toContain('"Late": it was not held beside this reading.');
    // One that is comparable takes the doubt away.
    expect(judgeAmbient(held(refused, check()), READING).doubts).toEqual([]);
  });

  test("what no ambient sweep covers is unknown and said to be", () => {
    const part = check({ suspects: [{ number: 1, ambientDb: 20 }], worst: [] });
    const { suspects, doubts } = judgeAmbient(held(part), READING);
    expect(suspects.map((s) => s.number)).toEqual([1]);
    expect(doubts).toMatchObject([{ code: "ambient-not-comparable", valueDb: null }]);
    expect(doubts[0]?.text).toContain(
      "do not reach the worst point of Peak at 100.0 MHz, 2 of 3 suspects",
    );
    // The rest from a second sweep: nothing is missing any more.
    expect(judgeAmbient(held(part, check()), READING).doubts).toEqual([]);
  });

  test("a check with a caveat speaks only where no other has a level, and then says so", () => {
    const caveat = "The ambient sweep states no polarization.";
    const loud = check({ caveat, ...at(44, 39, 35) });
    const heard = judgeAmbient(held(loud, check(at(20, 20))), READING);
    expect(heard.suspects.map((s) => s.ambientDb)).toEqual([20, 20, 35]);
    expect(heard.doubts.at(-1)).toMatchObject({ code: "ambient-not-comparable" });
    expect(heard.doubts.at(-1)?.text).toContain(caveat);
    const silent = judgeAmbient(held(loud, check()), READING);
    expect(silent.suspects.map((s) => s.ambientDb)).toEqual([20, 20, 20]);
    expect(silent.doubts).toEqual([]);
  });
});
