import { writeFrequency } from "@/components/programs/read-frequency";
import { keepUnits } from "@/components/ui/keep-units";
import type { Mask, MaskLine } from "@/lib/core/mask/mask";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import { BANDWIDTH_KIND_LABELS, INTERPOLATION_LABELS } from "./mask-words";

const MINUS = "\u2212";

/** A limit with every decimal it has up to three, and at least one. */
export function levelText(db: number): string {
  const text = String(Number(Math.abs(db).toFixed(3)));
  return `${db < 0 ? MINUS : ""}${text.includes(".") ? text : `${text}.0`}`;
}

/** "resolution bandwidth 120 kHz, between 6 dB points" */
export function bandwidthText({ rbwHz, rbwKind }: MaskLine): string {
  if (rbwHz === null) return "resolution bandwidth not stated";
  const kind = rbwKind === null ? "kind not stated" : BANDWIDTH_KIND_LABELS[rbwKind];
  return `resolution bandwidth ${writeFrequency(rbwHz)}, ${kind}`;
}

/** Every line of a mask with its segments, as they are held against a sweep. */
export function MaskLines({ mask }: { mask: Mask }) {
  return (
    <div
      className={`grid items-start gap-4 ${mask.lines.length > 1 ? "lg:grid-cols-2" : "max-w-3xl"}`}
    >
      {mask.lines.map((line) => (
        <div
          key={line.name}
          className="min-w-0 overflow-x-auto border border-rule bg-sheet"
          tabIndex={0}
          role="region"
          aria-label={`Segments of ${line.name}`}
        >
          <table className="w-full text-left">
            <caption className="px-3 py-2 text-left">
              <span className="font-medium">{line.name}</span>{" "}
              <span className="text-sm text-ink-soft">
                {DETECTOR_LABELS[line.detector]} detector; {keepUnits(bandwidthText(line))}; limits
                in {LEVEL_UNIT_LABELS[mask.unit]}
              </span>
            </caption>
            <thead className="text-sm text-ink-soft">
              <tr className="border-y border-rule">
                <th className="px-3 py-1.5 text-right font-medium">From</th>
                <th className="px-3 py-1.5 text-right font-medium">To</th>
                <th className="px-3 py-1.5 text-right font-medium">Limit at start</th>
                <th className="px-3 py-1.5 text-right font-medium">Limit at end</th>
                <th className="px-3 py-2 font-medium">Between</th>
              </tr>
            </thead>
            <tbody>
              {line.segments.map((segment, i) => (
                <tr key={i} className="border-b border-rule last:border-0">
                  <td className="px-3 py-1.5 text-right font-mono whitespace-nowrap">
                    {writeFrequency(segment.startHz)}
                  </td>
                  <td className="px-3 py-1.5 text-right font-mono whitespace-nowrap">
                    {writeFrequency(segment.stopHz)}
                  </td>
                  <td className="px-3 py-1.5 text-right font-mono">{levelText(segment.startDb)}</td>
                  <td className="px-3 py-1.5 text-right font-mono">{levelText(segment.stopDb)}</td>
                  <td className="px-3 py-1.5 text-sm text-ink-soft">
                    {segment.startDb === segment.stopDb
                      ? "flat"
                      : INTERPOLATION_LABELS[segment.interpolation]}
                  </td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      ))}
    </div>
  );
}
