import { execFileSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { renderReport } from "@/lib/reports/render-report";
import type { ReportSnapshot, ReportState } from "@/lib/reports/report-snapshot";
import { issuedState } from "./report-snapshot";

export interface ReadPdf {
  /** Text of each page as an outside reader finds it, laid out as printed. */
  pages: string[];
  /** The same of all pages, white space run together. */
  text: string;
  info: string;
  fonts: string;
  check: string;
  bytes: Uint8Array;
}

/** Renders a report and reads it back with programs that know nothing of how it was made. */
export async function printReport(
  snapshot: ReportSnapshot,
  state: Partial<ReportState> = {},
): Promise<ReadPdf> {
  const bytes = await renderReport(snapshot, issuedState(snapshot, state));
  const folder = mkdtempSync(join(tmpdir(), "neap-report-"));
  try {
    const path = join(folder, "report.pdf");
    writeFileSync(path, bytes);
    const run = (program: string, ...args: string[]) =>
      execFileSync(program, args, { encoding: "utf8" });
    const laidOut = run("pdftotext", "-layout", path, "-");
    return {
      bytes,
      pages: laidOut.split("\f").slice(0, -1),
      text: run("pdftotext", path, "-").replaceAll(/\s+/g, " "),
      info: run("pdfinfo", path),
      fonts: run("pdffonts", path),
      check: run("qpdf", "--check", path),
    };
  } finally {
    rmSync(folder, { recursive: true });
  }
}
