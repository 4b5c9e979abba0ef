import Link from "next/link";
import { BASIS_LABELS } from "@/components/readings/basis-labels";
import { StandingMark } from "@/components/readings/standing-mark";
import type { FrequencyRange, Reading } from "@/lib/core/reading/reading";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency, formatLevel, formatMargin } from "@/lib/core/units/format";

const percent = (fraction: number) =>
  fraction >= 1 ? "100 %" : `${Math.min(99, Math.floor(fraction * 100))} %`;

/** What was not swept; a few gaps are named at once, more behind a click. */
function Gaps({ gaps }: { gaps: readonly FrequencyRange[] }) {
  if (gaps.length === 0) return null;
  const list = (
    <ul className="text-sm text-ink-soft">
      {gaps.map((gap) => (
        <li key={gap.startHz} className="font-mono whitespace-nowrap">
          {formatFrequency(gap.startHz)} to {formatFrequency(gap.stopHz)}
        </li>
      ))}
    </ul>
  );
  const label = gaps.length === 1 ? "1 gap" : `${gaps.length} gaps`;
  return gaps.length <= 2 ? (
    list
  ) : (
    <details className="text-sm">
      <summary className="cursor-pointer text-deep underline">{label}</summary>
      {list}
    </details>
  );
}

function DecidedBy({ sweep }: { sweep: { id: string; name: string } | undefined }) {
  if (!sweep) return null;
  return (
    <Link href={`/sweeps/${sweep.id}`} className="text-deep underline">
      {sweep.name}
    </Link>
  );
}

interface LineTableProps {
  reading: Pick<Reading, "lines" | "unit">;
  /** The sweeps of a combined reading: each line then names the one that decided. */
  sweeps?: readonly { id: string; name: string }[];
}

/** A reading line by line: standing, worst margin and where, on what basis, how much was swept. */
export function LineTable({ reading, sweeps }: LineTableProps) {
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
            {sweeps ? <th className="px-3 py-2 font-medium">Decided by</th> : null}
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
              {sweeps ? (
                <td className="px-3 py-2">
                  <DecidedBy sweep={line.worst ? sweeps[line.worst.partIndex] : undefined} />
                </td>
              ) : null}
              <td className="px-3 py-2 text-right">
                <span className="font-mono">{percent(line.coverage.fraction)}</span>
                <Gaps gaps={line.coverage.gaps} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
