import type { ReactNode } from "react";
import { StandingMark } from "@/components/readings/standing-mark";
import { UnconfirmedMark } from "@/components/masks/unconfirmed-mark";
import type { DeltaChanges, MeasuredChange, SweepDelta } from "@/lib/core/delta/delta";
import type { Standing } from "@/lib/core/reading/reading";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { DeltaValue } from "./delta-value";
import { formatFrequency, formatMargin } from "@/lib/core/units/format";
import { SuspectChangesTable } from "./suspect-changes";

interface DeltaTableProps {
  delta: SweepDelta;
  changes: DeltaChanges;
  /** Mask revisions that nobody confirmed. */
  fromMemory: readonly string[];
}

/**
 * One delta: per mask line and band before, after and change; then peak, floor and band power of
 * every detector that both sides have, and the suspects.
 */
export function DeltaTable({ delta, changes, fromMemory }: DeltaTableProps) {
  return (
    <div>
      <div
        className="overflow-x-auto"
        tabIndex={0}
        role="region"
        aria-label={`Delta from ${delta.beforeName} to ${delta.afterName}`}
      >
        <table className="w-full text-left text-sm">
          <thead className="text-ink-soft">
            <tr className="border-b border-rule">
              <th className="py-1.5 pr-4 font-medium">Mask line</th>
              <th className="py-1.5 pr-4 text-right font-medium">Before</th>
              <th className="py-1.5 pr-4 text-right font-medium">After</th>
              <th className="py-1.5 pr-4 font-medium">Standing</th>
              <th className="py-1.5 text-right font-medium">Change of margin</th>
            </tr>
          </thead>
          <tbody>
            {changes.margins
              .filter((margin) => margin.beforeDb !== null || margin.afterDb !== null)
              .flatMap((margin) => {
                const key = `${margin.maskRevisionId} ${margin.lineName}`;
                const isFromMemory = fromMemory.includes(margin.maskRevisionId);
                const bands = margin.bands.length > 1 ? margin.bands : [];
                return [
                  <MarginRow key={key} margin={margin} standing={margin.afterStanding}>
                    {margin.lineName}
                    <span className="block text-ink-soft">
                      {margin.maskTitle}{" "}
                      <UnconfirmedMark provenance={isFromMemory ? "from memory" : ""} />
                    </span>
                  </MarginRow>,
                  ...bands
                    .filter((band) => band.beforeDb !== null || band.afterDb !== null)
                    .map((band) => (
                      <MarginRow key={`${key} ${band.startHz}`} margin={band} standing={null}>
                        <span className="pl-4 font-mono text-ink-soft">
                          {formatFrequency(band.startHz)} to {formatFrequency(band.stopHz)}
                        </span>
                      </MarginRow>
                    )),
                ];
              })}
          </tbody>
        </table>
      </div>
      {changes.levels.map((level) => (
        <dl
          key={level.detector}
          className="mt-3 flex flex-wrap gap-x-8 gap-y-2 text-sm"
          aria-label={`${DETECTOR_LABELS[level.detector]} trace`}
        >
          <div>
            <dt className="text-ink-soft">Highest level, {DETECTOR_LABELS[level.detector]}</dt>
            <dd>
              <DeltaValue change={level.peak} better="down" />
            </dd>
          </div>
          <div>
            <dt className="text-ink-soft">Floor</dt>
            <dd>
              <DeltaValue change={level.floor} better="down" />
            </dd>
          </div>
          <div>
            <dt className="text-ink-soft">
              {level.bandPowerIsPower ? "Band power" : "Band power, a comparative sum"}
            </dt>
            <dd>
              <DeltaValue change={level.bandPower} better="down" />
            </dd>
          </div>
        </dl>
      ))}
      <SuspectChangesTable suspects={changes.suspects} />
      {delta.doubts.length > 0 ? (
        <ul className="mt-3 space-y-1 text-sm">
          {delta.doubts.map((doubt) => (
            <li key={doubt} className="border-l-4 border-shoal bg-shoal-bed px-3 py-1">
              {doubt}
            </li>
          ))}
        </ul>
      ) : null}
    </div>
  );
}

interface MarginRowProps {
  margin: MeasuredChange & {
    beforeDb: number | null;
    afterDb: number | null;
    note: string | null;
  };
  /** null for a band, which has none of its own. */
  standing: Standing | null;
  children: ReactNode;
}

function MarginRow({ margin, standing, children }: MarginRowProps) {
  const number = "py-1.5 pr-4 text-right font-mono whitespace-nowrap";
  return (
    <tr className="border-b border-rule align-top">
      <td className="py-1.5 pr-4">{children}</td>
      <td className={number}>{formatMargin(margin.beforeDb)}</td>
      <td className={number}>{formatMargin(margin.afterDb)}</td>
      <td className="py-1.5 pr-4">{standing ? <StandingMark standing={standing} /> : null}</td>
      <td className="py-1.5 text-right">
        {margin.note ? (
          <span className="inline-block max-w-64 text-left text-shoal">{margin.note}</span>
        ) : (
          <DeltaValue change={margin} better="up" />
        )}
      </td>
    </tr>
  );
}
