import { renderToBuffer } from "@react-pdf/renderer";
import { loadGlyphTest, registerFonts } from "./fonts";
import { makePrintable } from "./printable";
import { ReportDocument, SummaryDocument } from "./report-document";
import type { ReportSnapshot, ReportState } from "./report-snapshot";
import { hashSnapshot } from "./snapshot-hash";
import { chooseFit } from "./summary-fit";
import { upgradeSnapshot } from "./upgrade-snapshot";

/** Pages of a PDF as React-pdf writes it, its page objects being neither packed nor encrypted. */
function countPages(pdf: Buffer): number {
  return pdf.toString("latin1").match(/\/Type \/Page\b/g)?.length ?? 0;
}

/**
 * The report as a PDF. Refuses a snapshot that no longer has the hash it was issued with, because
 * every page states that hash; it is that of the stored shape, of whatever version.
 */
export async function renderReport(
  snapshot: ReportSnapshot,
  state: ReportState,
): Promise<Uint8Array> {
  if (hashSnapshot(snapshot) !== state.sha256)
    throw new Error(`The content of report ${snapshot.number} differs from what was issued.`);
  registerFonts();
  const hasGlyph = await loadGlyphTest();
  const content = makePrintable(upgradeSnapshot(snapshot), hasGlyph);
  const printed = makePrintable(state, hasGlyph);
  const fit = await chooseFit(async (tried) => {
    const summary = SummaryDocument({ snapshot: content, state: printed, fit: tried });
    return countPages(await renderToBuffer(summary)) === 1;
  });
  return renderToBuffer(ReportDocument({ snapshot: content, state: printed, fit }));
}
