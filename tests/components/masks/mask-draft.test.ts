import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  draftMask,
  emptyMask,
  maskOfDraft,
  readCellFrequency,
  settleFrequency,
} from "@/components/masks/mask-draft";
import { draftProblems } from "@/components/masks/mask-problems";
import { readShippedMasks } from "@/lib/formats/shipped-masks";
import { CROSSING, MASK } from "../../commands/mask/arrange";

const counter = () => {
  let last = 0;
  return () => (last += 1);
};
const OPEN = { unit: "dB", port: "other" } as const;

describe("a mask as it is typed", () => {
  test("every shipped mask comes out of the editor as it went in, to the last digit", async () => {
    for (const mask of await readShippedMasks()) {
      const draft = draftMask(mask, counter());
      expect(draftProblems(draft)).toEqual([]);
      expect(maskOfDraft(draft, OPEN)).toEqual({ ...mask, key: "" });
    }
  });

  test("a frequency that was settled reads as it did when it was typed", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 999_999_999 }),
        fc.integer({ min: 0, max: 6 }),
        fc.constantFrom("Hz", "kHz", "MHz"),
        (digits, decimals, unit) => {
          const whole = String(digits).padStart(decimals + 1, "0");
          const typed =
            decimals === 0 ? whole : `${whole.slice(0, -decimals)}.${whole.slice(-decimals)}`;
          const hz = readCellFrequency(typed, unit);
          expect(hz).toBeGreaterThan(0);
          expect(readCellFrequency(settleFrequency(typed, unit), "GHz")).toBe(hz);
        },
      ),
    );
  });

  test.each([
    ["30 MHz", "kHz", 30e6],
    ["30", "MHz", 30e6],
    ["0,15", "MHz", 150e3],
    ["0,150", "MHz", 150e3],
  ])("%s with %s chosen is %d Hz", (text, unit, hz) => {
    expect(readCellFrequency(text, unit)).toBe(hz);
  });

  test.each(["1,000", "230,500 MHz", "thirty", "30 miles", "-30", ""])(
    "%j is not guessed at",
    (text) => {
      expect(readCellFrequency(text, "MHz")).toBeNaN();
    },
  );

  test("a new mask assumes neither unit nor port nor detector, and asks for each", () => {
    const open = draftProblems(emptyMask(counter())).map(({ path, blank }) => [path, blank]);
    for (const path of ["title", "unit", "port", "lines.0.detector", "lines.0.segments.0.startHz"])
      expect(open).toContainEqual([path, true]);
    expect(open.every(([, blank]) => blank)).toBe(true);
  });

  test("crossing segments are said at their row while they are typed", () => {
    expect(draftProblems(draftMask(CROSSING, counter()))).toEqual([
      {
        path: "lines.0.segments.1",
        text: expect.stringContaining("crosses segment 1"),
        blank: false,
      },
    ]);
  });

  test("a cell that cannot be read is said once, at the cell", () => {
    const draft = draftMask(MASK, counter());
    draft.lines[0]!.segments[1]!.stop = "1,000 MHz";
    expect(draftProblems(draft)).toEqual([
      { path: "lines.0.segments.1.stopHz", text: expect.stringContaining("1,000"), blank: false },
    ]);
  });
});
