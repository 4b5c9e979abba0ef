import { beforeAll, describe, expect, test } from "vitest";
import { formatFrequency, formatLevel } from "@/lib/core/units/format";
import { PAPERS, type Paper } from "@/lib/reports/paper";
import { snapshotBudget } from "@/lib/reports/snapshot-budget";
import { printReport, type ReadPdf } from "../support/read-pdf";
import { acceptedDelta } from "../support/report-delta";
import { sampleSnapshot, sampleSweep } from "../support/report-snapshot";
import { inventedTrace, shippedMask } from "../support/report-traces";

const line = { sensitivity: 1, degreesOfFreedom: null, observations: null };
const budget = snapshotBudget(
  {
    version: 1,
    title: "Radiated, 30 MHz to 1 GHz",
    reference: "oats-sac-30m-1g",
    lines: [
      { ...line, name: "Antenna factor", value: 3, distribution: "normal" },
      { ...line, name: "Site", value: 4, distribution: "triangular" },
    ],
  },
  3,
);

/** Undecided, with points to measure again, a confirmed mask, ambient and an accepted mismatch. */
function undecided() {
  const masks = [{ mask: shippedMask("cispr-32-radiated-class-b-3m"), revision: 2 }];
  const traces = [inventedTrace("Trace 1", 58)];
  const sweep = sampleSweep({ traces, masks, budget, guardDb: 4.44 });
  const [held] = sweep.readings;
  if (!held) throw new Error("The sample has no reading.");
  held.confirmation = { by: "Ines Tolland", at: "2026-11-20T09:00:00.000Z", copy: "shelf 4" };
  held.ambient = held.reading.suspects.slice(0, 3).map(({ number, levelDb }) => ({
    number,
    ambientDb: levelDb - 2,
    isLikelyAmbient: true,
    withoutAmbientDb: 12.3,
  }));
  held.followed = [{ number: 1, followedNumber: 4, state: "open", isSame: true }];
  const near = "At 30.00 MHz λ/2π is 1.59 m and 3λ is 30.0 m.";
  held.reading.doubts.push({ code: "near-field", text: near, valueDb: null });
  const content = sampleSnapshot({ sweeps: [sweep] });
  const [combined] = content.combined;
  const [start, step, last] = content.ladder?.steps ?? [];
  if (!combined || !start || !step || !last || !content.ladder) throw new Error("A poor sample.");
  combined.ambient = held.ambient;
  const accepted = acceptedDelta();
  const moved = { ...step, isBranch: true, againstPrevious: [accepted], againstStart: [accepted] };
  content.ladder.steps = [start, moved, last];
  const reasons = ["No product sweep of this report reaches it."];
  const { title, provenance } = shippedMask("iec-60945-radiated-3m");
  content.notHeld = [{ title, maskRevision: 1, provenance, confirmation: null, reasons }];
  return { content, reading: combined.reading };
}

const { content, reading } = undecided();
let pdf: ReadPdf;
let first = "";

beforeAll(async () => {
  pdf = await printReport(content);
  first = (pdf.pages[0] ?? "").replaceAll(/\s+/g, " ");
});

describe("page one", () => {
  test("says who confirmed the mask, and which mask nothing was held against", () => {
    expect(first).toContain("confirmed by Ines Tolland on 2026-11-20 against shelf 4");
    expect(first).toContain("Not held against: IEC 60945 radiated, 3 m.");
  });

  test("marks suspects that are likely ambient, and names the doubts", () => {
    expect(first.match(/likely ambient/g)).toHaveLength(3);
    expect(first).toContain("Near field");
    expect(first).toContain("Calibration overdue");
  });

  test("states a change with its ±, that repeats explain it, and who accepted a mismatch", () => {
    expect(first).toContain("+0.4 dB ± 1.2");
    expect(first).toContain("within repeatability");
    expect(first).toContain("Mismatch accepted by Ines Tolland");
    expect(first).toContain("1 new suspect, 1 gone");
    expect(first).toContain("dropped");
  });
});

describe("the pages behind it", () => {
  test("list every point to measure again as the bench needs it", () => {
    expect(reading.remeasure.length).toBeGreaterThan(10);
    const page = pdf.pages.find((one) => one.includes("Measure again") && one.includes("AZIMUTH"));
    for (const { frequencyHz, boundDb, limitDb } of reading.remeasure) {
      expect(page).toContain(formatFrequency(frequencyHz, 50e3));
      expect(page).toContain(`${boundDb.toFixed(1)} / ${formatLevel(limitDb, reading.unit)}`);
    }
    expect(page).toMatch(/quasi-peak\s+120\.0 kHz\s+Quasi-peak\s+vertical\s+1\.2 m\s+not stated/);
  });

  test("evaluate the budget and say what the guard is", () => {
    // √(1.5² + 16/6) = 2.2174.
    for (const number of ["u_c = 2.22 dB", "U = 4.43 dB", "k = 2", "U_CISPR = 6.30 dB"])
      expect(pdf.text).toContain(number);
    expect(pdf.text).toContain("÷ √6");
    expect(pdf.text).toContain("ILAC-G8:09/2019");
    expect(pdf.text).toContain("U of the budget (w = U), rounded up");
  });

  test("name the instrument with its dates, the record and the sweeps of the floor", () => {
    expect(pdf.text).toContain("Analyzer of the pier instrument 2026-01-20 2027-01-20 in date");
    expect(pdf.text).toContain("yes, it counts for the trend");
    expect(pdf.text).toContain("Boathouse, input closed");
  });

  test("part the doubts and spell the signs that no font has", () => {
    expect(pdf.text).toMatch(/doubts that weaken the reading \(\d+\)/i);
    expect(pdf.text).toContain("lambda/2π is 1.59 m and 3 lambda is 30.0 m");
    expect(pdf.text).not.toContain("[U+");
  });

  test("set ambient and followed marks beside the suspects", () => {
    expect(pdf.text).toContain("followed as no. 4, open");
    expect(pdf.text).toContain("12.3 dBµV/m");
  });

  test("give the ladder's bases, states, accepted reasons and moved suspects", () => {
    expect(pdf.text).toContain("Held against step 0 · As built, from which it branches.");
    expect(pdf.text).toContain("State: dropped.");
    expect(pdf.text).toContain(
      "Accepted by Ines Tolland on 2026-11-25 12:20 UTC: Same antenna and cable, carried over the same day.",
    );
    expect(pdf.text).toContain("The bench was Boathouse before and Pier after.");
    expect(pdf.text).toContain("211.3 MHz");
    expect(pdf.text).toContain("96.80 MHz");
    expect(pdf.text).toMatch(/suspects: 1 new, 1 gone, 1 on both sides/i);
  });
});

describe("a crowded report", () => {
  /** Much of everything that page one shows; little of what only the pages behind it do. */
  function crowded(paper: Paper) {
    const [, step] = content.ladder?.steps ?? [];
    if (!step) throw new Error("A poor sample.");
    const masks = ["cispr-32-radiated-class-b-3m", "iec-60945-radiated-3m"].map((key) => ({
      mask: shippedMask(key),
      revision: 1,
    }));
    const name = "Gannet B3 with the aft cable tray opened, ferrites stacked, docked and warm";
    const sweeps = [1, 2].map((i) =>
      sampleSweep({
        id: `s${i}`,
        name: `${name} ${i}`,
        masks,
        traces: [inventedTrace("T", 45 + i)],
      }),
    );
    for (const { reading: own } of sweeps.flatMap(({ readings }) => readings))
      own.suspects = own.suspects.slice(0, 5);
    const steps = Array.from({ length: 5 }, (_, position) => ({
      ...step,
      position,
      name: `Try ${position} with the gasket of the second kind and the long clamp`,
      base: { position: 0, name: "As built" },
    }));
    return sampleSnapshot({
      paper,
      sweeps,
      title: "A report with a long title about everything that was tried before the chamber day",
      summary: "Everything was tried. ".repeat(30),
      notHeld: content.notHeld,
      ladder: { name: "Everything that was tried on the way", steps },
    });
  }

  test.each(PAPERS)("keeps its first page to one page of %s", async (paper) => {
    const { pages } = await printReport(crowded(paper));
    expect(pages[0]).toContain("This report relates only to the item tested.");
    expect(pages[1]).toContain("Item tested and this report");
  });
});
