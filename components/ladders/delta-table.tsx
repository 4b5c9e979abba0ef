import { StandingMark } from "@/components/readings/standing-mark";
import type { SweepDelta } from "@/lib/core/delta/delta";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { DeltaValue } from "./delta-value";
import { formatMargin } from "@/lib/core/units/format";

/** One delta: per mask line before, after and change; then peak, floor and band power. */
export function DeltaTable({ delta }: { delta: SweepDelta }) {
  const { changes } = delta;
  if (!changes) return <NotComparable delta={delta} />;
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
              .map((margin) => (
                <tr
                  key={`${margin.maskRevisionId} ${margin.lineName}`}
                  className="border-b border-rule align-top"
                >
                  <td className="py-1.5 pr-4">
                    {margin.lineName}
                    <span className="block text-ink-soft">{margin.maskTitle}</span>
                  </td>
                  <td className="py-1.5 pr-4 text-right font-mono whitespace-nowrap">
                    {formatMargin(margin.beforeDb)}
                  </td>
                  <td className="py-1.5 pr-4 text-right font-mono whitespace-nowrap">
                    {formatMargin(margin.afterDb)}
                  </td>
                  <td className="py-1.5 pr-4">
                    <StandingMark standing={margin.afterStanding} />
                  </td>
                  <td className="py-1.5 text-right">
                    {margin.note ? (
                      <span className="inline-block max-w-64 text-left text-shoal">
                        {margin.note}
                      </span>
                    ) : (
                      <DeltaValue changeDb={margin.changeDb} better="up" />
                    )}
                  </td>
                </tr>
              ))}
          </tbody>
        </table>
      </div>
      <dl className="mt-3 flex flex-wrap gap-x-8 gap-y-2 text-sm">
        <div>
          <dt className="text-ink-soft">Highest level, {DETECTOR_LABELS[changes.detector]}</dt>
          <dd>
            <DeltaValue changeDb={changes.peakDb} better="down" />
          </dd>
        </div>
        <div>
          <dt className="text-ink-soft">Floor</dt>
          <dd>
            <DeltaValue changeDb={changes.floorDb} better="down" />
          </dd>
        </div>
        <div>
          <dt className="text-ink-soft">
            {changes.bandPowerIsPower ? "Band power" : "Band power, a comparative sum"}
          </dt>
          <dd>
            <DeltaValue changeDb={changes.bandPowerDb} better="down" />
          </dd>
        </div>
      </dl>
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

function NotComparable({ delta }: { delta: SweepDelta }) {
  return (
    <div className="border-l-4 border-shoal bg-shoal-bed px-3 py-2">
      <p className="font-medium">
        Not comparable: {delta.beforeName} and {delta.afterName}
      </p>
      <ul className="list-disc pl-5 text-sm">
        {delta.mismatches.map((mismatch) => (
          <li key={mismatch.text}>{mismatch.text}</li>
        ))}
      </ul>
    </div>
  );
}
