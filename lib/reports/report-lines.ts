import type { Basis, Standing } from "@/lib/core/reading/reading";
import type { ReportContent } from "./report-content";
import { summarizeLines } from "./summarize";

/** What an issued report says of one mask line, for a screen. */
interface ReportLine {
  maskTitle: string;
  maskRevision: number;
  mark: string | null;
  isConfirmed: boolean;
  lineName: string;
  standing: Standing;
  explanation: string | null;
  coverage: number;
  marginDb: number | null;
  frequencyHz: number | null;
  basis: Basis | null;
  /** The sweep that gave the margin; null without one. */
  sweep: { id: string; name: string } | null;
}

/** The mask lines of a report over its product sweeps together, and the masks that none reaches. */
export function reportLines(content: ReportContent): {
  lines: ReportLine[];
  notHeld: { title: string; reasons: string[] }[];
} {
  const lines = summarizeLines(content).map(({ worst, unit: _unit, ...line }) => ({
    ...line,
    marginDb: worst?.point.marginDb ?? null,
    frequencyHz: worst?.point.frequencyHz ?? null,
    basis: worst?.basis ?? null,
    sweep: worst && { id: worst.sweepId, name: worst.decidedBy },
  }));
  const notHeld = content.notHeld.map(({ title, reasons }) => ({ title, reasons }));
  return { lines, notHeld };
}
