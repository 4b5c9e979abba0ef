import { BASIS_LABELS } from "@/components/readings/basis-labels";
import { StandingMark } from "@/components/readings/standing-mark";
import type { Reading } from "@/lib/core/reading/reading";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency, formatLevel, formatMargin } from "@/lib/core/units/format";

const percent = (fraction: number) =>
  fraction >= 1 ? "100 %" : `${Math.min(99, Math.floor(fraction * 100))} %`;

/** A reading line by line: standing, worst margin and where, on what basis, how much was swept. */
export function LineTable({ reading }: { reading: Reading }) {
  return (
    <div
      className="overflow-x-auto border border-rule bg-sheet"
      tabIndex={0}
      role="region"
      aria-label="Mask lines"
    >
      <table className="w-full text-left">
        <thead className="text-sm text-ink-soft">
          <tr className="border-b border-rule">
            <th className="px-3 py-2 font-medium">Mask line</th>
            <th className="px-3 py-2 font-medium">Standing</th>
            <th className="px-3 py-2 text-right font-medium">Worst margin</th>
            <th className="px-3 py-2 text-right font-medium">At</th>
            <th className="px-3 py-2 text-right font-medium">Level</th>
            <th className="px-3 py-2 text-right font-medium">Limit</th>
            <th className="px-3 py-2 font-medium">Basis</th>
            <th className="px-3 py-2 text-right font-medium">Coverage</th>
          </tr>
        </thead>
        <tbody>
          {reading.lines.map((line) => (
            <tr key={line.lineIndex} className="border-b border-rule align-top last:border-0">
              <td className="px-3 py-2">
                {line.name}
                {line.name.toLowerCase() === DETECTOR_LABELS[line.detector].toLowerCase() ? null : (
                  <span className="block text-sm text-ink-soft">
                    {DETECTOR_LABELS[line.detector]}
                  </span>
                )}
              </td>
              <td className="px-3 py-2">
                <StandingMark standing={line.standing} />
                {line.explanation ? (
                  <span className="mt-0.5 block max-w-80 text-sm text-ink-soft">
                    {line.explanation}
                  </span>
                ) : null}
              </td>
              <td className="px-3 py-2 text-right font-mono whitespace-nowrap">
                {formatMargin(line.worst?.marginDb ?? null)}
              </td>
              <td className="px-3 py-2 text-right font-mono whitespace-nowrap">
                {line.worst ? formatFrequency(line.worst.frequencyHz) : ""}
              </td>
              <td className="px-3 py-2 text-right font-mono whitespace-nowrap">
                {line.worst ? formatLevel(line.worst.levelDb, reading.unit) : ""}
              </td>
              <td className="px-3 py-2 text-right font-mono whitespace-nowrap">
                {line.worst ? formatLevel(line.worst.limitDb, reading.unit) : ""}
              </td>
              <td className="px-3 py-2">{BASIS_LABELS[line.basis]}</td>
              <td className="px-3 py-2 text-right font-mono">{percent(line.coverage.fraction)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
