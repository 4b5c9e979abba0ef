import Link from "next/link";
import { BASIS_LABELS } from "@/components/readings/basis-labels";
import { StandingMark } from "@/components/readings/standing-mark";
import type { Basis, Standing } from "@/lib/core/reading/reading";
import { formatFrequency, formatMargin } from "@/lib/core/units/format";

interface ReportLine {
  maskTitle: string;
  maskRevision: number;
  /** "from memory, not confirmed", or who confirmed it. */
  mark: string | null;
  isConfirmed: boolean;
  lineName: string;
  standing: Standing;
  explanation: string | null;
  coverage: number;
  marginDb: number | null;
  frequencyHz: number | null;
  basis: Basis | null;
  sweep: { id: string; name: string } | null;
}

interface ReportLinesProps {
  lines: readonly ReportLine[];
  notHeld: readonly { title: string; reasons: string[] }[];
}

/** Floored, so that a line with a gap never reads 100 %. */
const swept = (coverage: number) =>
  coverage >= 1 ? "" : `, ${Math.min(99, Math.floor(coverage * 100))} % swept`;

/** What an issued report says of each mask line, as it was when it was issued. */
export function ReportLines({ lines, notHeld }: ReportLinesProps) {
  return (
    <>
      <div
        className="overflow-x-auto border border-rule bg-sheet"
        tabIndex={0}
        role="region"
        aria-label="Readings of the report"
      >
        <table className="w-full text-left">
          <thead className="text-sm text-ink-soft">
            <tr className="border-b border-rule">
              <th className="px-4 py-2 font-medium">Mask and line</th>
              <th className="px-4 py-2 font-medium">Standing</th>
              <th className="px-4 py-2 text-right font-medium">Worst margin</th>
              <th className="px-4 py-2 text-right font-medium">At</th>
              <th className="px-4 py-2 font-medium">Decided by</th>
            </tr>
          </thead>
          <tbody>
            {lines.map((line) => (
              <Row key={`${line.maskTitle} ${line.maskRevision} ${line.lineName}`} line={line} />
            ))}
          </tbody>
        </table>
      </div>
      {notHeld.map(({ title, reasons }) => (
        <p key={title} className="mt-3 border-l-4 border-shoal bg-shoal-bed px-3 py-2">
          Not held against {title}. {reasons.join(" ")}
        </p>
      ))}
    </>
  );
}

function Row({ line }: { line: ReportLine }) {
  return (
    <tr className="border-b border-rule align-top last:border-0">
      <td className="px-4 py-3">
        {line.maskTitle}, {line.lineName}
        <span className="block text-sm text-ink-soft">
          revision {line.maskRevision}
          {swept(line.coverage)}
        </span>
        {line.mark === null ? null : (
          <span className={`block text-sm ${line.isConfirmed ? "text-ink-soft" : "text-shoal"}`}>
            {line.mark}
          </span>
        )}
      </td>
      <td className="px-4 py-3">
        <StandingMark standing={line.standing} />
        {line.explanation === null ? null : (
          <span className="block max-w-[36ch] text-sm text-ink-soft">{line.explanation}</span>
        )}
      </td>
      <td className="px-4 py-3 text-right font-mono whitespace-nowrap">
        {formatMargin(line.marginDb)}
      </td>
      <td className="px-4 py-3 text-right font-mono whitespace-nowrap">
        {line.frequencyHz === null ? "" : formatFrequency(line.frequencyHz)}
      </td>
      <td className="px-4 py-3">
        {line.sweep ? (
          <Link href={`/sweeps/${line.sweep.id}`} className="text-deep underline">
            {line.sweep.name}
          </Link>
        ) : null}
        {line.basis === null ? null : (
          <span className="block text-sm text-ink-soft">{BASIS_LABELS[line.basis]}</span>
        )}
      </td>
    </tr>
  );
}
