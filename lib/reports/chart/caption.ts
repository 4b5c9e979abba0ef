import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { shorten } from "../printable";
import { HOLD_LABELS } from "../report-labels";
import type { SnapshotSweep } from "../report-content";
import type { DrawnTrace } from "./coast-geometry";

function traceLabel({ trace }: DrawnTrace): string {
  const detector =
    trace.detector === null ? "detector not stated" : DETECTOR_LABELS[trace.detector];
  return `${shorten(trace.name, 40)} (${detector}, ${HOLD_LABELS[trace.hold]})`;
}

/** What is drawn, in words, in place of a legend. */
export function captionOf(
  sweep: SnapshotSweep,
  main: DrawnTrace | undefined,
  scans: readonly DrawnTrace[],
  spots: readonly DrawnTrace[],
  maskTitle: string | null,
  drawnCount: number,
): string {
  const outlines = scans.filter((scan) => scan !== main).map(traceLabel);
  const missing = sweep.traces.length - drawnCount;
  return [
    `${shorten(sweep.name, 60)} ${maskTitle === null ? "without a mask" : `under ${shorten(maskTitle, 60)}`}.`,
    main ? `Water: ${traceLabel(main)}.` : "",
    outlines.length > 0 ? `Outline: ${outlines.join("; ")}.` : "",
    spots.length > 0 ? `Points: ${spots.map(traceLabel).join("; ")}.` : "",
    missing > 0 ? `Not drawn, its unit being another quantity: ${missing}.` : "",
  ]
    .filter((part) => part !== "")
    .join(" ");
}
