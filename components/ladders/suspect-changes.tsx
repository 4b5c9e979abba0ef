import type { SuspectChange, SuspectChanges } from "@/lib/core/delta/delta";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency } from "@/lib/core/units/format";
import { DeltaValue } from "./delta-value";

const level = (levelDb: number | null) => (levelDb === null ? "no level" : levelDb.toFixed(1));

/** What became of the suspects of both sides, each looked for in a window on both. */
export function SuspectChangesTable({ suspects }: { suspects: SuspectChanges }) {
  const rows: [string, SuspectChange][] = [
    ...suspects.followed.map((one): [string, SuspectChange] => ["on both", one]),
    ...suspects.fresh.map((one): [string, SuspectChange] => ["new", one]),
    ...suspects.gone.map((one): [string, SuspectChange] => ["gone", one]),
  ];
  if (rows.length === 0) return null;
  rows.sort(([, a], [, b]) => a.frequencyHz - b.frequencyHz);
  return (
    <div
      className="mt-3 max-h-96 overflow-auto"
      tabIndex={0}
      role="region"
      aria-label="Suspects followed"
    >
      <table className="w-full text-left text-sm">
        <caption className="pb-1 text-left text-ink-soft">
          Suspects, highest level in the window before and after
        </caption>
        <thead className="text-ink-soft">
          <tr className="border-b border-rule">
            <th className="py-1.5 pr-4 font-medium">Frequency</th>
            <th className="py-1.5 pr-4 font-medium">Detector</th>
            <th className="py-1.5 pr-4 font-medium">Suspect</th>
            <th className="py-1.5 pr-4 text-right font-medium">Before</th>
            <th className="py-1.5 pr-4 text-right font-medium">After</th>
            <th className="py-1.5 pr-4 font-medium">Change, dB</th>
            <th className="py-1.5 font-medium">Window</th>
          </tr>
        </thead>
        <tbody>
          {rows.map(([kind, one]) => (
            <tr
              key={`${one.detector} ${one.frequencyHz} ${kind} ${one.window.startHz}`}
              className="border-b border-rule align-top"
            >
              <td className="py-1.5 pr-4 font-mono whitespace-nowrap">
                {formatFrequency(one.frequencyHz)}
              </td>
              <td className="py-1.5 pr-4">{DETECTOR_LABELS[one.detector]}</td>
              <td className={`py-1.5 pr-4 ${kind === "new" ? "font-medium" : ""}`}>{kind}</td>
              <td className="py-1.5 pr-4 text-right font-mono">{level(one.beforeDb)}</td>
              <td className="py-1.5 pr-4 text-right font-mono">{level(one.afterDb)}</td>
              <td className="py-1.5 pr-4">
                <DeltaValue change={one} better="down" />
              </td>
              <td className="py-1.5 font-mono whitespace-nowrap text-ink-soft">
                {formatFrequency(one.window.startHz)} to {formatFrequency(one.window.stopHz)}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
