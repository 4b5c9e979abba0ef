import Link from "next/link";
import { StandingMark } from "@/components/readings/standing-mark";
import { decidingPoint } from "@/lib/core/reading/deciding-point";
import type { Mask } from "@/lib/core/mask/mask";
import type { Reading } from "@/lib/core/reading/reading";
import { formatFrequency, formatMargin } from "@/lib/core/units/format";

interface ReportLinesProps {
  sweeps: {
    sweepId: string;
    name: string;
    readings: { maskRevision: number; mask: Mask; reading: Reading }[];
  }[];
}

/** What an issued report says about each of its sweeps, as it was when it was issued. */
export function ReportLines({ sweeps }: ReportLinesProps) {
  return (
    <div
      className="overflow-x-auto border border-rule bg-sheet"
      tabIndex={0}
      role="region"
      aria-label="Readings of the report"
    >
      <table className="w-full text-left">
        <thead className="text-sm text-ink-soft">
          <tr className="border-b border-rule">
            <th className="px-4 py-2 font-medium">Sweep</th>
            <th className="px-4 py-2 font-medium">Mask</th>
            <th className="px-4 py-2 text-right font-medium">Worst margin</th>
            <th className="px-4 py-2 text-right font-medium">At</th>
            <th className="px-4 py-2 font-medium">Standing</th>
          </tr>
        </thead>
        <tbody>
          {sweeps.flatMap((sweep) =>
            sweep.readings.flatMap(({ mask, maskRevision, reading }) => {
              const deciding = decidingPoint(reading);
              if (!deciding) return [];
              return [
                <tr
                  key={`${sweep.sweepId} ${mask.key}`}
                  className="border-b border-rule align-top last:border-0"
                >
                  <td className="px-4 py-3">
                    <Link href={`/sweeps/${sweep.sweepId}`} className="text-deep underline">
                      {sweep.name}
                    </Link>
                  </td>
                  <td className="px-4 py-3">
                    {mask.title}
                    <span className="block text-sm text-ink-soft">
                      revision {maskRevision}, {deciding.line.name} line
                      {mask.provenance === "from memory" ? ", from memory" : ""}
                    </span>
                  </td>
                  <td className="px-4 py-3 text-right font-mono whitespace-nowrap">
                    {formatMargin(deciding.point.marginDb)}
                  </td>
                  <td className="px-4 py-3 text-right font-mono whitespace-nowrap">
                    {formatFrequency(deciding.point.frequencyHz)}
                  </td>
                  <td className="px-4 py-3">
                    <StandingMark standing={reading.standing} />
                  </td>
                </tr>,
              ];
            }),
          )}
        </tbody>
      </table>
    </div>
  );
}
