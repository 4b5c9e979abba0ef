import { beforeAll, describe, expect, test } from "vitest";
import { formatFrequency, formatLevel, formatMargin } from "@/lib/core/units/format";
import { DEFERRAL } from "@/lib/reports/report-labels";
import { renderReport } from "@/lib/reports/render-report";
import { hashSnapshot } from "@/lib/reports/snapshot-hash";
import { printReport, type ReadPdf } from "../support/read-pdf";
import { issuedState, sampleSnapshot } from "../support/report-snapshot";

const snapshot = sampleSnapshot();
let pdf: ReadPdf;

beforeAll(async () => {
  pdf = await printReport(snapshot);
});

describe("every page", () => {
  test("carries the report's number, the hash of its content, its page and the deferral", () => {
    expect(pdf.pages.length).toBeGreaterThan(3);
    pdf.pages.forEach((page, i) => {
      expect(page).toContain("SO-2026-0007");
      expect(page).toContain(hashSnapshot(snapshot));
      expect(page).toContain(`page ${i + 1} of ${pdf.pages.length}`);
      expect(page.replaceAll(/\s+/g, " ")).toContain(DEFERRAL);
    });
  });

  test("says that an issued report is not yet approved", () => {
    for (const page of pdf.pages)
      expect(page).toContain("Issued by Maren Holt on 2026-11-27 09:30 UTC · not yet approved");
  });

  test("says who approved an approved report", async () => {
    const approved = await printReport(sampleSnapshot({ sweeps: [], ladder: null }), {
      state: "approved",
      approvedBy: "Ines Tolland",
      approvedAt: "2026-11-28T08:05:00.000Z",
    });
    for (const page of approved.pages)
      expect(page).toContain("Approved by Ines Tolland on 2026-11-28 08:05 UTC");
  });

  test("says that a withdrawn report is withdrawn, and why", async () => {
    const withdrawn = await printReport(sampleSnapshot(), {
      state: "withdrawn",
      withdrawnBy: "Maren Holt",
      withdrawnAt: "2026-11-29T10:00:00.000Z",
      withdrawnReason: "The factor table belonged to another antenna.",
    });
    expect(withdrawn.pages.length).toBeGreaterThan(3);
    for (const page of withdrawn.pages) {
      expect(page).toContain("WITHDRAWN by Maren Holt on 2026-11-29 10:00 UTC");
      expect(page.replaceAll(/\s+/g, " ")).toContain("belonged to another antenna.");
    }
  });
});

describe("the summary page", () => {
  test("states the lowest margin of each mask line as the reading gave it", () => {
    const first = pdf.pages[0] ?? "";
    const margins = snapshot.sweeps[0]?.readings[0]?.reading.lines ?? [];
    expect(margins.length).toBeGreaterThan(0);
    for (const { worst } of margins) {
      expect(first).toContain(formatMargin(worst?.marginDb ?? null));
      expect(first).toContain(formatFrequency(worst?.frequencyHz ?? 0, 50e3));
      expect(first).toContain(formatLevel(worst?.levelDb ?? null, "dBuV/m"));
    }
    expect(first).toContain("CISPR 32 class B, 3 m (revision 2)");
    expect(first).toContain("inside guard");
  });

  test("lists the five worst suspects and what each step of the ladder bought", () => {
    const first = pdf.pages[0] ?? "";
    const suspects = snapshot.sweeps[0]?.readings[0]?.reading.suspects.slice(0, 5) ?? [];
    expect(suspects).toHaveLength(5);
    for (const suspect of suspects) {
      expect(first).toContain(formatFrequency(suspect.frequencyHz, 50e3));
      expect(first).toContain(formatMargin(suspect.marginDb));
    }
    expect(first).toContain("Peaks came down 9.6 dB");
    expect(first).toContain("Not comparable: The RBW was 120.0 kHz before and 1.000 MHz after.");
    expect(first).toContain("Doubts (".toUpperCase());
  });
});

describe("the record", () => {
  test("names the original files by their hash, and ends with the end mark", () => {
    for (const sweep of snapshot.sweeps) expect(pdf.text).toContain(sweep.fileSha256);
    expect(pdf.text).toContain("This report relates only to the item tested.");
    expect(pdf.pages.at(-1)).toContain("End of report");
    expect(pdf.pages.slice(0, -1).filter((page) => page.includes("End of report"))).toEqual([]);
  });

  test("marks a mask from memory, an overdue calibration and what is not stated", () => {
    expect(pdf.text).toContain("FROM MEMORY");
    expect(pdf.text).toContain("OVERDUE");
    expect(pdf.text).toContain("not stated");
    expect(pdf.text).toContain("No uncertainty budget stated for this bench.");
  });

  test("states every suspect of every reading", () => {
    const all = snapshot.sweeps.flatMap((s) => s.readings.flatMap((r) => r.reading.suspects));
    expect(all.length).toBeGreaterThan(20);
    for (const { frequencyHz } of all)
      expect(pdf.text).toContain(formatFrequency(frequencyHz, 50e3));
  });

  test("never says that a product passed, failed or is compliant", () => {
    expect(pdf.text).not.toMatch(/\b(pass(es|ed)?|fail(s|ed|ure)?|compliant|violation)\b/i);
  });
});

describe("the file", () => {
  test("is sound, and embeds every font it uses", () => {
    expect(pdf.check).toContain("No syntax or stream encoding errors found");
    const fonts = pdf.fonts.trim().split("\n").slice(2);
    expect(fonts.length).toBeGreaterThan(3);
    for (const font of fonts) expect(font).toMatch(/yes yes yes\s+\d+\s+\d+\s*$/);
  });

  test("names title, author and the time of issue, and is in English", () => {
    expect(pdf.info).toMatch(/Title:\s+SO-2026-0007 · Gannet B3/);
    expect(pdf.info).toMatch(/Author:\s+Saltmarsh Optics/);
    expect(pdf.info).toMatch(/CreationDate:.*Nov 27 .*2026/);
    expect(Buffer.from(pdf.bytes).toString("latin1")).toContain("/Lang (en)");
  });

  test("has the paper that the snapshot asks for", async () => {
    expect(pdf.info).toMatch(/Page size:\s+595\.\d+ x 841\.\d+ pts \(A4\)/);
    const letter = await printReport(sampleSnapshot({ paper: "letter" }));
    expect(letter.info).toMatch(/Page size:\s+612 x 792 pts \(letter\)/);
    expect(letter.pages[0]).toContain("WHAT THE LADDER BOUGHT");
    expect(letter.pages[0]).toContain("This report relates only to the item tested.");
  });

  test("says the same when it is rendered again", async () => {
    expect((await printReport(snapshot)).pages).toEqual(pdf.pages);
  });

  test("is refused when the content is no longer what was issued", async () => {
    const changed = { ...snapshot, title: "Another title" };
    await expect(renderReport(changed, issuedState(snapshot))).rejects.toThrow(/SO-2026-0007/);
  });
});
