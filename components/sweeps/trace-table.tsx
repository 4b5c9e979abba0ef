import type { Detector, Hold } from "@/lib/core/sweep/settings";
import { DETECTOR_LABELS, HOLD_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency, formatLevel } from "@/lib/core/units/format";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";

interface TraceRow {
  position: number;
  name: string;
  detector: Detector | null;
  hold: Hold;
  unit: LevelUnit;
  fileUnit: LevelUnit;
  axis: { count: number };
  firstHz: number;
  lastHz: number;
  stepHz: number | null;
  covered: number;
  maxDb: number | null;
  maxAtHz: number | null;
  floorDb: number | null;
}

/** The traces of a sweep after the signal path, with the unit that the file had. */
export function TraceTable({ traces }: { traces: TraceRow[] }) {
  return (
    <div
      className="overflow-x-auto border border-rule bg-sheet"
      tabIndex={0}
      role="region"
      aria-label="Traces"
    >
      <table className="w-full text-left">
        <thead className="text-sm text-ink-soft">
          <tr className="border-b border-rule">
            <th className="px-3 py-2 font-medium">Trace</th>
            <th className="px-3 py-2 font-medium">Detector</th>
            <th className="px-3 py-2 text-right font-medium">Points</th>
            <th className="px-3 py-2 text-right font-medium">Span</th>
            <th className="px-3 py-2 text-right font-medium">Step</th>
            <th className="px-3 py-2 text-right font-medium">Highest</th>
            <th className="px-3 py-2 text-right font-medium">Floor</th>
          </tr>
        </thead>
        <tbody>
          {traces.map((trace) => (
            <tr key={trace.position} className="border-b border-rule align-top last:border-0">
              <td className="px-3 py-2">
                {trace.name}
                {trace.fileUnit === trace.unit ? null : (
                  <span className="block text-sm text-ink-soft">
                    {LEVEL_UNIT_LABELS[trace.fileUnit]} in the file
                  </span>
                )}
              </td>
              <td className="px-3 py-2">
                {trace.detector ? DETECTOR_LABELS[trace.detector] : "not stated"}
                {trace.hold === "none" ? null : (
                  <span className="block text-sm text-ink-soft">{HOLD_LABELS[trace.hold]}</span>
                )}
              </td>
              <td className="px-3 py-2 text-right font-mono">
                {trace.axis.count}
                {trace.covered < trace.axis.count ? (
                  <span className="block text-sm text-shoal">
                    {trace.axis.count - trace.covered} without a level
                  </span>
                ) : null}
              </td>
              <td className="px-3 py-2 text-right font-mono whitespace-nowrap">
                {formatFrequency(trace.firstHz)} to {formatFrequency(trace.lastHz)}
              </td>
              <td className="px-3 py-2 text-right font-mono whitespace-nowrap">
                {trace.stepHz === null ? "" : formatFrequency(trace.stepHz)}
              </td>
              <td className="px-3 py-2 text-right font-mono whitespace-nowrap">
                {formatLevel(trace.maxDb, trace.unit)}
                {trace.maxAtHz === null ? null : (
                  <span className="block text-sm text-ink-soft">
                    {formatFrequency(trace.maxAtHz, trace.stepHz ?? undefined)}
                  </span>
                )}
              </td>
              <td className="px-3 py-2 text-right font-mono whitespace-nowrap">
                {formatLevel(trace.floorDb, trace.unit)}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
