import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { segmentLimitAt } from "@/lib/core/mask/limit-at";
import type { Mask, MaskSegment } from "@/lib/core/mask/mask";
import { maskHints } from "@/lib/core/mask/mask-hints";
import { segmentCrossings } from "@/lib/core/mask/segment-crossings";
import { validateMask } from "@/lib/core/mask/validate-mask";
import { readShippedMasks } from "@/lib/formats/shipped-masks";

function segment(startHz: number, stopHz: number, startDb: number, stopDb = startDb): MaskSegment {
  return { startHz, stopHz, startDb, stopDb, interpolation: "log" };
}

function maskOf(...segments: MaskSegment[]): Mask {
  return {
    format: "neap-mask",
    version: 1,
    key: "k",
    title: "Hull limit",
    port: "radiated",
    unit: "dBuV/m",
    distanceM: 3,
    document: "",
    clause: "",
    edition: "",
    provenance: "team",
    note: "",
    lines: [
      { name: "Peak", detector: "peak", rbwHz: 120e3, rbwKind: "6dB", segments: [...segments] },
    ],
  };
}

const told = (mask: Mask) => validateMask(mask).map(({ path, text }) => `${path}: ${text}`);

describe("crossing segments", () => {
  test("are told with the frequency and the level at which they cross", () => {
    // 40 to 60 against 60 to 40 over 10 MHz to 1 GHz: at the middle of the log axis.
    expect(told(maskOf(segment(10e6, 1e9, 40, 60), segment(10e6, 1e9, 60, 40)))).toEqual([
      "lines.0.segments.1: This segment crosses segment 1 at 100.0 MHz, where both stand at 50.0 dBµV/m. Split both there, so that it is plain which limit applies.",
    ]);
  });

  test("may cross twice when one is straight over f and the other over log f", () => {
    const curved = segment(10e6, 1e9, 40, 60);
    // Over f the same ends give a line that sags under the other; 5 dB up it is crossed twice.
    const linear = { ...segment(10e6, 1e9, 45, 65), interpolation: "linear" as const };
    const crossings = segmentCrossings(curved, linear);
    expect(crossings).toHaveLength(2);
    for (const { hz, db } of crossings) {
      expect(segmentLimitAt(linear, hz)).toBeCloseTo(db, 6);
      expect(segmentLimitAt(curved, hz)).toBeCloseTo(db, 6);
    }
    expect(told(maskOf(curved, linear))[0]).toMatch(/ MHz, .*, and again at /);
  });

  test("meeting, parting, lying on each other or side by side is no crossing", () => {
    const slope = segment(10e6, 1e9, 40, 60);
    const part = segment(20e6, 500e6, segmentLimitAt(slope, 20e6), segmentLimitAt(slope, 500e6));
    expect(segmentCrossings(slope, part)).toEqual([]);
    expect(segmentCrossings(slope, segment(10e6, 1e9, 40, 50))).toEqual([]);
    expect(segmentCrossings(slope, segment(1e9, 2e9, 10, 90))).toEqual([]);
    expect(segmentCrossings(slope, segment(10e6, 1e9, 30, 50))).toEqual([]);
  });

  test("are found where a fine scan sees them change places", () => {
    const db = fc.double({ min: 0, max: 100, noNaN: true });
    const made = fc
      .tuple(db, db, fc.constantFrom("log" as const, "linear" as const))
      .map(([startDb, stopDb, interpolation]) => ({
        ...segment(10e6, 1e9, startDb, stopDb),
        interpolation,
      }));
    fc.assert(
      fc.property(made, made, (a, b) => {
        const gaps = Array.from({ length: 400 }, (_, i) => {
          const hz = 10e6 * 100 ** (i / 399);
          return segmentLimitAt(a, hz) - segmentLimitAt(b, hz);
        }).filter((gap) => Math.abs(gap) > 1e-3);
        const seen = gaps.filter((gap, i) => i > 0 && gap > 0 !== (gaps[i - 1] ?? gap) > 0).length;
        expect(segmentCrossings(a, b).length).toBeGreaterThanOrEqual(seen);
        for (const { hz } of segmentCrossings(a, b))
          expect(segmentLimitAt(a, hz)).toBeCloseTo(segmentLimitAt(b, hz), 6);
      }),
    );
  });
});

describe("validation explains", () => {
  test.each<[string, Mask, string]>([
    [
      "a reversed segment with both its ends",
      maskOf(segment(230e6, 30e6, 40)),
      "lines.0.segments.0.stopHz: The segment is reversed: it ends at 30.00 MHz, below its start at 230.0 MHz. Swap the two.",
    ],
    [
      "a reversed segment whose ends are close, with digits that differ",
      maskOf(segment(30_000_100, 30_000_000, 40)),
      "lines.0.segments.0.stopHz: The segment is reversed: it ends at 30.0000 MHz, below its start at 30.0001 MHz. Swap the two.",
    ],
    [
      "a segment without width",
      maskOf(segment(30e6, 30e6, 40)),
      "lines.0.segments.0.stopHz: The segment has no width: it starts and ends at 30.00 MHz.",
    ],
    [
      "a distance of zero",
      { ...maskOf(segment(30e6, 230e6, 40)), distanceM: 0 },
      "distanceM: The measuring distance must be above 0 m.",
    ],
    [
      "a unit that is none for a limit",
      { ...maskOf(segment(30e6, 230e6, 40)), unit: "dB" },
      "unit: Relative dB is no unit for a limit: state the unit of the limit.",
    ],
  ])("%s", (_, mask, text) => {
    expect(told(mask)).toEqual([text]);
  });
});

describe("hints", () => {
  const band = segment(30e6, 230e6, 40);
  const hintsOf = (mask: Mask) => maskHints(mask).map(({ path, text }) => `${path}: ${text}`);
  const second = (detector: "peak" | "average", db: number): Mask => ({
    ...maskOf(band),
    lines: [
      ...maskOf(band).lines,
      { ...maskOf(segment(100e6, 400e6, db)).lines[0]!, name: "Second", detector },
    ],
  });

  test("say that two lines of one detector both count, and that this is allowed", () => {
    expect(validateMask(second("peak", 50))).toEqual([]);
    expect(hintsOf(second("peak", 50))).toEqual([
      'lines.1: "Peak" and "Second" both limit the peak detector from 100.0 MHz to 230.0 MHz. That is allowed: a sweep is held against each, and the lower decides.',
    ]);
  });

  test("point at an average limit above the peak limit", () => {
    expect(hintsOf(second("average", 30))).toEqual([]);
    expect(hintsOf(second("average", 50))).toEqual([
      expect.stringMatching(/^lines\.1: At 151\.7 MHz the average limit .* two columns/),
    ]);
  });

  test("point at a jump of more than 40 dB, and at nothing less", () => {
    expect(hintsOf(maskOf(band, segment(230e6, 1e9, 80)))).toEqual([]);
    expect(hintsOf(maskOf(segment(230e6, 1e9, 470), band))).toEqual([
      expect.stringMatching(/^lines\.0\.segments\.0: .* jumps by 430\.0 dB at 230\.0 MHz/),
    ]);
  });

  test("point at a distance and a bandwidth that nobody stated", () => {
    const mask = maskOf(band);
    mask.lines[0]!.rbwHz = null;
    expect(hintsOf({ ...mask, distanceM: null })).toEqual([
      expect.stringMatching(/^distanceM: No measuring distance/),
      expect.stringMatching(/^lines\.0\.rbwHz: "Peak" states no resolution bandwidth/),
    ]);
  });

  test("have nothing to say of swapped columns or jumps in what is shipped", async () => {
    for (const mask of await readShippedMasks())
      expect(maskHints(mask).filter(({ text }) => /swapped|jumps/.test(text))).toEqual([]);
  });
});
