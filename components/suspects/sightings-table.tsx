import Link from "next/link";
import { BASIS_LABELS } from "@/components/readings/basis-labels";
import { StandingMark } from "@/components/readings/standing-mark";
import type { Basis, Standing } from "@/lib/core/reading/reading";
import type { Detector } from "@/lib/core/sweep/settings";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency, formatLevel, formatMargin } from "@/lib/core/units/format";
import type { LevelUnit } from "@/lib/core/units/level-units";

interface SightingCell {
  sweepId: string;
  sweepName: string;
  maskId: string;
  maskTitle: string;
  lineName: string | null;
  frequencyHz: number;
  levelDb: number;
  unit: LevelUnit;
  marginDb: number | null;
  standing: Standing | null;
  basis: Basis;
  detector: Detector | null;
}

interface SightingsTableProps {
  /** The newest last, as builds go. */
  builds: {
    buildId: string;
    buildName: string;
    kind: "seen" | "not-seen" | "not-swept";
    sightings: SightingCell[];
    sweptBy: { sweepId: string; sweepName: string }[];
  }[];
  programId: string;
}

const CELL = "px-3 py-2 align-top";
const NUMBER = `${CELL} text-right font-mono whitespace-nowrap`;

/** Every sighting, build by build, the newest first; what was not seen and not swept says so. */
export function SightingsTable({ builds, programId }: SightingsTableProps) {
  return (
    <div
      className="overflow-x-auto border border-rule bg-sheet"
      tabIndex={0}
      role="region"
      aria-label="Sightings"
    >
      <table className="w-full text-left">
        <thead className="text-sm text-ink-soft">
          <tr className="border-b border-rule whitespace-nowrap">
            {["Build", "Sweep", "Frequency", "Level", "Margin", "Standing", "Line", "Basis"].map(
              (head) => (
                <th
                  key={head}
                  className={`px-3 py-2 font-medium ${/Freq|Level|Margin/.test(head) ? "text-right" : ""}`}
                >
                  {head}
                </th>
              ),
            )}
          </tr>
        </thead>
        <tbody>
          {[...builds].reverse().flatMap((build) => {
            const name = (
              <Link
                href={`/programs/${programId}/builds/${build.buildId}`}
                className="text-deep underline"
              >
                {build.buildName}
              </Link>
            );
            if (build.kind !== "seen")
              return [
                <tr key={build.buildId} className="border-b border-rule last:border-0">
                  <td className={CELL}>{name}</td>
                  <td className={`${CELL} text-ink-soft`} colSpan={7}>
                    {build.kind === "not-swept"
                      ? "Not swept: no sweep on the line of record tells."
                      : `Not seen in ${build.sweptBy.map((sweep) => sweep.sweepName).join(", ")}: no peak stood out within 20 dB of the mask.`}
                  </td>
                </tr>,
              ];
            return build.sightings.map((seen, i) => (
              <tr
                key={`${seen.sweepId} ${seen.maskId} ${i}`}
                className="border-b border-rule last:border-0"
              >
                <td className={CELL}>{i === 0 ? name : null}</td>
                <td className={CELL}>
                  <Link
                    href={`/sweeps/${seen.sweepId}?mask=${seen.maskId}`}
                    className="text-deep underline"
                  >
                    {seen.sweepName}
                  </Link>
                </td>
                <td className={NUMBER}>{formatFrequency(seen.frequencyHz)}</td>
                <td className={NUMBER}>{formatLevel(seen.levelDb, seen.unit)}</td>
                <td className={NUMBER}>{formatMargin(seen.marginDb)}</td>
                <td className={CELL}>
                  {seen.standing ? <StandingMark standing={seen.standing} /> : "no limit"}
                </td>
                <td className={CELL}>
                  {seen.lineName ?? "no line"}, {seen.maskTitle}
                </td>
                <td className={CELL}>
                  {BASIS_LABELS[seen.basis]}
                  {seen.detector ? `, ${DETECTOR_LABELS[seen.detector]}` : ""}
                </td>
              </tr>
            ));
          })}
        </tbody>
      </table>
    </div>
  );
}
