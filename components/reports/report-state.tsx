import type { ReactNode } from "react";

export type ShownState = "draft" | "issued" | "approved" | "withdrawn";

const LOOKS: Record<ShownState, string> = {
  draft: "border-dashed border-ink-soft text-ink-soft",
  issued: "border-deep text-deep",
  approved: "border-deep bg-deep text-paper",
  withdrawn: "border-shoal bg-shoal-bed text-shoal line-through",
};

/** The state of a report as a small stamp: its word, its frame. */
export function ReportState({ state }: { state: ShownState }): ReactNode {
  return <span className={`inline-block border px-2 py-0.5 text-sm ${LOOKS[state]}`}>{state}</span>;
}
