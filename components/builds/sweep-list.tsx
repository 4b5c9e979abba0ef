import Link from "next/link";
import { DOUBT_LABELS } from "@/components/readings/doubt-labels";
import { StandingMark } from "@/components/readings/standing-mark";
import type { DoubtCode, Standing } from "@/lib/core/reading/reading";
import type { Detector, Polarization, SweepPurpose } from "@/lib/core/sweep/settings";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency, formatMargin } from "@/lib/core/units/format";

interface SweepLine {
  id: string;
  name: string;
  purpose: SweepPurpose;
  measuredOn: string | null;
  polarization: Polarization | null;
  onRecord: boolean;
  benchName: string;
  ladderName: string | null;
  stepName: string | null;
  stepPosition: number | null;
  fromHz: number | null;
  toHz: number | null;
  detectors: (Detector | null)[];
  standing: Standing | null;
  marginDb: number | null;
  doubts: DoubtCode[];
}

const detectorsOf = (sweep: SweepLine) =>
  sweep.detectors.map((d) => (d ? DETECTOR_LABELS[d] : "not stated")).join(", ");

/** Sweeps with where they belong, what they cover and where they stand. */
export function SweepList({ sweeps }: { sweeps: SweepLine[] }) {
  return (
    <div
      className="overflow-x-auto border border-rule bg-sheet"
      tabIndex={0}
      role="region"
      aria-label="Sweeps"
    >
      <table className="w-full text-left">
        <thead className="text-sm text-ink-soft">
          <tr className="border-b border-rule">
            <th className="px-3 py-2 font-medium">Sweep</th>
            <th className="px-3 py-2 font-medium">Purpose</th>
            <th className="px-3 py-2 font-medium">Measured on</th>
            <th className="px-3 py-2 font-medium">Span and detectors</th>
            <th className="px-3 py-2 text-right font-medium">Worst margin</th>
            <th className="px-3 py-2 font-medium">Standing</th>
            <th className="px-3 py-2 font-medium">Doubts</th>
          </tr>
        </thead>
        <tbody>
          {sweeps.map((sweep) => (
            <tr key={sweep.id} className="border-b border-rule align-top last:border-0">
              <td className="px-3 py-2">
                <Link href={`/sweeps/${sweep.id}`} className="font-medium text-deep underline">
                  {sweep.name}
                </Link>
                <span className="block text-sm text-ink-soft">
                  {sweep.stepName === null
                    ? "no step"
                    : `${sweep.ladderName}, step ${sweep.stepPosition}`}
                  {sweep.onRecord ? " · on the line of record" : ""}
                </span>
              </td>
              <td className="px-3 py-2">{sweep.purpose}</td>
              <td className="px-3 py-2 font-mono whitespace-nowrap">
                {sweep.measuredOn ?? "not stated"}
              </td>
              <td className="px-3 py-2">
                {sweep.fromHz === null || sweep.toHz === null ? null : (
                  <span className="font-mono whitespace-nowrap">
                    {formatFrequency(sweep.fromHz)} to {formatFrequency(sweep.toHz)}
                  </span>
                )}
                <span className="block text-sm text-ink-soft">
                  {detectorsOf(sweep)}
                  {sweep.polarization ? `, ${sweep.polarization}` : ""}
                </span>
              </td>
              <td className="px-3 py-2 text-right font-mono whitespace-nowrap">
                {sweep.standing ? formatMargin(sweep.marginDb) : ""}
              </td>
              <td className="px-3 py-2">
                {sweep.standing ? (
                  <StandingMark standing={sweep.standing} />
                ) : (
                  <span className="text-ink-soft">not held</span>
                )}
              </td>
              <td className="min-w-44 px-3 py-2 text-sm text-ink-soft">
                {sweep.doubts.map((code) => DOUBT_LABELS[code]).join(", ")}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
