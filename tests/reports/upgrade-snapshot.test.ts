import { readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, test } from "vitest";
import { formatMargin } from "@/lib/core/units/format";
import { renderReport } from "@/lib/reports/render-report";
import type { ReportSnapshot } from "@/lib/reports/report-snapshot";
import { hashSnapshot } from "@/lib/reports/snapshot-hash";
import { summarizeLines } from "@/lib/reports/summarize";
import { upgradeSnapshot } from "@/lib/reports/upgrade-snapshot";
import { printReport } from "../support/read-pdf";
import { issuedState, sampleSnapshot } from "../support/report-snapshot";

/** A snapshot as version 1 of the code stored it, and the hash that it was issued with. */
const stored = JSON.parse(
  readFileSync(join(import.meta.dirname, "fixtures/snapshot-v1.json"), "utf8"),
) as ReportSnapshot;
const ISSUED_WITH = "0659cf742a697b6f35748f74c905159890c2c1ff166165bce5f64ca094e1d225";

describe("a snapshot of version 1", () => {
  test("keeps the hash that it was issued with", () => {
    expect(stored.version).toBe(1);
    expect(hashSnapshot(stored)).toBe(ISSUED_WITH);
  });

  test("is drawn with that hash on every page, and with the margins that it was issued with", async () => {
    const { pages, text } = await printReport(stored, {
      state: "withdrawn",
      withdrawnBy: "Maren Holt",
      withdrawnAt: "2026-12-01T10:00:00.000Z",
      withdrawnReason: "Replaced.",
    });
    for (const page of pages) expect(page).toContain(ISSUED_WITH);
    const worst = stored.sweeps[0]?.readings[0]?.reading.lines[0]?.worst;
    expect(pages[0]).toContain(formatMargin(worst?.marginDb ?? null));
    expect(text).toContain("Not comparable: The RBW was 120.0 kHz before and 1.000 MHz after.");
    expect(text).toContain("No uncertainty budget stated for this bench.");
    expect(pages.at(-1)).toContain("End of report");
  });

  test("is refused when a value of what was stored has changed", async () => {
    const changed = { ...stored, title: "Another" };
    await expect(renderReport(changed, issuedState(stored))).rejects.toThrow(/differs/);
  });

  test("gets nothing that it did not record", () => {
    const content = upgradeSnapshot(stored);
    for (const sweep of content.sweeps) {
      expect(sweep.onRecord).toBeNull();
      expect(sweep.bench).toMatchObject({ calibration: null, budget: null });
      for (const held of sweep.readings)
        expect(held).toMatchObject({ confirmation: null, ambient: [], followed: [] });
    }
    for (const step of content.ladder?.steps ?? [])
      for (const { accepted, changes } of step.againstPrevious) {
        expect(accepted).toBeNull();
        for (const margin of changes?.margins ?? []) expect(margin.uncertaintyDb).toBeNull();
      }
  });

  test("takes its sweeps together from their readings", () => {
    const content = upgradeSnapshot(stored);
    expect(content.combined.map(({ mask, sweepIds }) => [mask.title, sweepIds.length])).toEqual([
      ["CISPR 32 class B, 3 m", 2],
      ["IEC 60945 radiated, 3 m", 1],
    ]);
    const margins = stored.sweeps.flatMap((sweep) =>
      sweep.readings
        .filter(({ mask }) => mask.title === "CISPR 32 class B, 3 m")
        .map(({ reading }) => reading.lines[0]?.worst?.marginDb ?? Infinity),
    );
    const row = summarizeLines(content).find((line) => line.maskTitle === "CISPR 32 class B, 3 m");
    expect(row?.worst?.point.marginDb).toBe(Math.min(...margins));
  });

  test("leaves what is stored alone", () => {
    const before = JSON.stringify(stored);
    upgradeSnapshot(stored);
    expect(JSON.stringify(stored)).toBe(before);
  });
});

test("a snapshot of today is drawn as it is", () => {
  const content = sampleSnapshot();
  expect(upgradeSnapshot(content)).toBe(content);
});
