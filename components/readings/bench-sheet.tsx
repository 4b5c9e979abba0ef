import type { RemeasureRow } from "@/lib/core/reading/remeasure-rows";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency, formatLevel } from "@/lib/core/units/format";
import type { LevelUnit } from "@/lib/core/units/level-units";

const CELL = "border border-rule px-2 py-1.5";
const NUMBER = `${CELL} text-right font-mono whitespace-nowrap`;

function positionOf({ heightM, azimuthDeg }: RemeasureRow): string {
  const parts = [
    heightM === null ? null : `${heightM} m`,
    azimuthDeg === null ? null : `${azimuthDeg}°`,
  ].filter((part) => part !== null);
  return parts.length === 0 ? "not stated" : parts.join(", ");
}

interface BenchSheetProps {
  rows: RemeasureRow[];
  unit: LevelUnit;
}

/** The spots to measure as a sheet to print and fill in by hand at the bench. */
export function BenchSheet({ rows, unit }: BenchSheetProps) {
  return (
    <>
      <div
        className="overflow-x-auto print:overflow-visible"
        tabIndex={0}
        role="region"
        aria-label="Spots to measure"
      >
        <table className="w-full border-collapse bg-sheet text-left text-sm">
          <thead>
            <tr className="text-ink-soft">
              <th className={CELL}>No.</th>
              <th className={`${CELL} text-right`}>Frequency</th>
              <th className={CELL}>Detector</th>
              <th className={`${CELL} text-right`}>RBW</th>
              <th className={CELL}>Polarization</th>
              <th className={CELL}>Height, azimuth</th>
              <th className={CELL}>Mask line</th>
              <th className={`${CELL} text-right`}>Upper bound</th>
              <th className={`${CELL} text-right`}>Limit</th>
              <th className={`${CELL} min-w-28`}>Measured</th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row, i) => (
              <tr
                key={`${row.lineName} ${row.frequencyHz} ${row.partIndex}`}
                className="break-inside-avoid"
              >
                <td className={NUMBER}>{i + 1}</td>
                <td className={NUMBER}>{formatFrequency(row.frequencyHz)}</td>
                <td className={CELL}>{DETECTOR_LABELS[row.detector]}</td>
                <td className={NUMBER}>{row.rbwHz === null ? "" : formatFrequency(row.rbwHz)}</td>
                <td className={CELL}>{row.polarization ?? "not stated"}</td>
                <td className={CELL}>{positionOf(row)}</td>
                <td className={CELL}>{row.lineName}</td>
                <td className={NUMBER}>{formatLevel(row.boundDb, unit)}</td>
                <td className={NUMBER}>{formatLevel(row.limitDb, unit)}</td>
                <td className={CELL} />
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <p className="mt-4 max-w-[80ch] text-sm">
        Dwell at each frequency until the detector has settled, export the readings as spots in the
        same position, and import them beside the sweep: a spot decides within its own bandwidth or
        step.
      </p>
    </>
  );
}
