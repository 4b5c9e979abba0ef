import type { ReportContent } from "./report-content";
import type { SnapshotV1 } from "./snapshot-v1";

/**
 * What the row of an issued report holds, in the shape of its day. Its hash is that of the stored
 * shape; it is brought up to `ReportContent` only to be drawn.
 */
export type ReportSnapshot = SnapshotV1 | ReportContent;

/** What happened to a report after its snapshot was taken; printed beside it. */
export interface ReportState {
  state: "issued" | "approved" | "withdrawn";
  sha256: string;
  approvedBy: string | null;
  approvedAt: string | null;
  withdrawnBy: string | null;
  withdrawnAt: string | null;
  withdrawnReason: string | null;
}
