import { describe, expect, test } from "vitest";
import { decidingReading, rankDoubts, summarizeLines } from "@/lib/reports/summarize";
import {
  inventedTrace,
  sampleSnapshot,
  sampleSweep,
  shippedMask,
} from "../support/report-snapshot";

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
      expect(rows[0]).toMatchObject({ standing: "over", standingSweep: "Over", sweepCount: 2 });
      expect(rows[0]?.worst?.point.marginDb).toBe(
        over.readings[0]?.reading.lines[0]?.worst?.marginDb,
      );
    }
  });

  test("is over by the margin that makes it so, not by another sweep's upper bound", () => {
    const [row] = summarizeLines(sampleSnapshot({ sweeps: [over, bound] }));
    expect(row).toMatchObject({ standing: "over", standingSweep: "Over" });
    expect(row?.worst).toMatchObject({ sweep: "Over", basis: "like-for-like" });
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

describe("doubts", () => {
  test("are each said once, coverage before the rest", () => {
    const high = sampleSweep({
      traces: [final(25)],
      masks: [{ mask: shippedMask("iec-60945-radiated-3m"), revision: 1 }],
    });
    const doubts = rankDoubts(sampleSnapshot({ sweeps: [high, { ...high, sweepId: "again" }] }));
    expect(doubts[0]?.code).toBe("not-covered");
    expect(new Set(doubts.map((doubt) => doubt.text)).size).toBe(doubts.length);
    expect(doubts.length).toBe(high.readings[0]?.reading.doubts.length);
  });
});
