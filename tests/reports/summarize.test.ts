import { describe, expect, test } from "vitest";
import type { Doubt, DoubtCode } from "@/lib/core/reading/reading";
import { DOUBT_CODES } from "@/lib/core/reading/reading";
import { summarizeDoubts } from "@/lib/reports/doubt-summary";
import { decidingReading, nameWithPosition, summarizeLines } from "@/lib/reports/summarize";
import { sampleSnapshot, sampleSweep } from "../support/report-snapshot";
import { inventedTrace, shippedMask } from "../support/report-traces";

const masks = [{ mask: shippedMask("cispr-32-radiated-class-b-3m"), revision: 2 }];
const final = (peakDb: number) => ({
  ...inventedTrace("Final", peakDb),
  detector: "quasi-peak" as const,
});
const good = sampleSweep({ id: "good", name: "Good", traces: [final(25)], masks });
const over = sampleSweep({ id: "over", name: "Over", traces: [final(44)], masks });
const bound = sampleSweep({
  id: "bound",
  name: "Bound",
  traces: [inventedTrace("Peak", 60)],
  masks,
});

describe("a mask line over several sweeps", () => {
  test("takes the worst standing and the lowest margin, whatever the order of the sweeps", () => {
    for (const sweeps of [
      [good, over],
      [over, good],
    ]) {
      const rows = summarizeLines(sampleSnapshot({ sweeps }));
      expect(rows).toHaveLength(1);
      expect(rows[0]).toMatchObject({ standing: "over", mark: null, coverage: 1 });
      expect(rows[0]?.worst).toMatchObject({ decidedBy: "Over, vertical", sweepId: "over" });
      expect(rows[0]?.worst?.point.marginDb).toBe(
        over.readings[0]?.reading.lines[0]?.worst?.marginDb,
      );
    }
  });

  test("is over by the margin that makes it so, not by another sweep's upper bound", () => {
    const [row] = summarizeLines(sampleSnapshot({ sweeps: [over, bound] }));
    expect(row?.standing).toBe("over");
    expect(row?.worst).toMatchObject({ sweepId: "over", basis: "like-for-like" });
  });

  test("keeps revisions of one mask apart", () => {
    const [first] = masks;
    if (!first) throw new Error("No mask.");
    const next = sampleSweep({ traces: [final(25)], masks: [{ ...first, revision: 3 }] });
    const rows = summarizeLines(sampleSnapshot({ sweeps: [good, next] }));
    expect(rows.map((row) => row.maskRevision).sort()).toEqual([2, 3]);
  });
});

describe("the sweep on the chart", () => {
  test("is one that is over before one whose margin is lower but undecided", () => {
    expect(decidingReading(sampleSnapshot({ sweeps: [bound, over] }))?.sweep.name).toBe("Over");
  });

  test("is otherwise the one with the lowest margin", () => {
    expect(decidingReading(sampleSnapshot({ sweeps: [good, bound] }))?.sweep.name).toBe("Bound");
  });

  test("is a product sweep or none", () => {
    const floor = { ...over, purpose: "floor" as const };
    expect(decidingReading(sampleSnapshot({ sweeps: [floor] }))).toBeNull();
  });
});

describe("a mask's mark", () => {
  test("says who confirmed it, when and with which copy, and otherwise that it is from memory", () => {
    const iec = [{ mask: shippedMask("iec-60945-radiated-3m"), revision: 1 }];
    const content = sampleSnapshot({ sweeps: [sampleSweep({ masks: iec })] });
    const [unconfirmed] = summarizeLines(content);
    expect(unconfirmed).toMatchObject({ mark: "from memory, not confirmed", isConfirmed: false });
    const confirmation = { by: "Ines Tolland", at: "2026-11-20T09:00:00.000Z", copy: "shelf 4" };
    const combined = content.combined.map((one) => ({ ...one, confirmation }));
    const [confirmed] = summarizeLines({ ...content, combined });
    expect(confirmed).toMatchObject({
      mark: "confirmed by Ines Tolland on 2026-11-20 against shelf 4",
      isConfirmed: true,
    });
  });
});

describe("the name of a sweep", () => {
  test("carries its polarization unless it says it already or has none", () => {
    expect(nameWithPosition({ ...good, name: "Gannet Vertical" })).toBe("Gannet Vertical");
    const mains = { ...good, settings: { ...good.settings, port: "mains" as const } };
    expect(nameWithPosition(mains)).toBe("Good");
  });
});

describe("doubts", () => {
  const doubt = (code: DoubtCode, text: string, valueDb: number | null = null) => ({
    code,
    text,
    valueDb,
  });
  const content = sampleSnapshot({ sweeps: [good] });
  const [first] = content.combined;
  if (!first) throw new Error("The sample has no combined reading.");
  const withDoubts = (...doubts: Doubt[]) =>
    summarizeDoubts({ combined: [{ ...first, reading: { ...first.reading, doubts } }] });

  test("of one kind are said once with the largest number, whatever its sign", () => {
    const { weakening } = withDoubts(
      doubt("rbw-differs", "One.", 9.2),
      doubt("rbw-differs", "Other.", -20.8),
      doubt("rbw-differs", "One.", 9.2),
    );
    expect(weakening).toEqual([
      { code: "rbw-differs", name: "RBW differs", size: "up to 20.8 dB", text: "Other.", count: 2 },
    ]);
  });

  test("that something could not be checked stand apart from those that weaken a reading", () => {
    const { weakening, unchecked } = withDoubts(
      doubt("sweep-time-unchecked", "No time."),
      doubt("ambient-not-taken", "No ambient."),
      doubt("not-covered", "A gap."),
      doubt("rbw-unstated", "No RBW."),
    );
    expect(weakening.map(({ code }) => code)).toEqual(["not-covered", "ambient-not-taken"]);
    expect(unchecked.map(({ code }) => code)).toEqual(["sweep-time-unchecked", "rbw-unstated"]);
  });

  test("each kind has its place in the order", () => {
    const { weakening, unchecked } = withDoubts(...DOUBT_CODES.map((code) => doubt(code, code)));
    expect(weakening.at(-1)?.code).toBe("sweep-time-short");
    expect(weakening.length + unchecked.length).toBe(DOUBT_CODES.length);
  });
});
