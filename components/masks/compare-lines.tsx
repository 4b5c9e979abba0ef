"use client";

import { writeFrequency } from "@/components/programs/read-frequency";
import { keepUnits } from "@/components/ui/keep-units";
import type { Mask } from "@/lib/core/mask/mask";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import { bandwidthText, levelText } from "./mask-lines";
import { INTERPOLATION_LABELS } from "./mask-words";

/** Name of a row among those that were ticked off. */
export const rowKey = (line: number, segment: number) => `${line}.${segment}`;

/** Every row of a mask that somebody compares with the document. */
export function rowKeys(mask: Mask): string[] {
  return mask.lines.flatMap((line, i) => line.segments.map((_, k) => rowKey(i, k)));
}

interface CompareLinesProps {
  mask: Mask;
  ticked: ReadonlySet<string>;
  onTick: (keys: string[], isTicked: boolean) => void;
}

/** The limits as a table to tick off, row by row or a line at once, with the document beside it. */
export function CompareLines({ mask, ticked, onTick }: CompareLinesProps) {
  return mask.lines.map((line, i) => {
    const keys = line.segments.map((_, k) => rowKey(i, k));
    return (
      <div
        key={line.name}
        className="mb-4 overflow-x-auto border border-rule bg-sheet"
        tabIndex={0}
        role="region"
        aria-label={`Rows of ${line.name}`}
      >
        <table className="w-full text-left">
          <caption className="px-3 py-2 text-left">
            <span className="font-medium">{line.name}</span>{" "}
            <span className="text-sm text-ink-soft">
              {DETECTOR_LABELS[line.detector]} detector; {keepUnits(bandwidthText(line))}; limits in{" "}
              {LEVEL_UNIT_LABELS[mask.unit]}
            </span>
          </caption>
          <thead className="text-sm text-ink-soft">
            <tr className="border-y border-rule">
              <th className="py-1.5 pl-3 font-medium">
                <input
                  type="checkbox"
                  className="size-5 accent-deep align-middle"
                  aria-label={`Every row of ${line.name} agrees with my copy`}
                  checked={keys.every((key) => ticked.has(key))}
                  onChange={(event) => onTick(keys, event.target.checked)}
                />
              </th>
              <th className="px-3 py-1.5 text-right font-medium">From</th>
              <th className="px-3 py-1.5 text-right font-medium">To</th>
              <th className="px-3 py-1.5 text-right font-medium">Limit at start</th>
              <th className="px-3 py-1.5 text-right font-medium">Limit at end</th>
              <th className="px-3 py-1.5 font-medium">Between</th>
            </tr>
          </thead>
          <tbody>
            {line.segments.map((segment, k) => {
              const key = rowKey(i, k);
              const from = writeFrequency(segment.startHz);
              const to = writeFrequency(segment.stopHz);
              return (
                <tr key={key} className="border-b border-rule last:border-0">
                  <td className="py-1.5 pl-3">
                    <input
                      type="checkbox"
                      className="size-5 accent-deep align-middle"
                      aria-label={`${line.name}, ${from} to ${to} agrees with my copy`}
                      checked={ticked.has(key)}
                      onChange={(event) => onTick([key], event.target.checked)}
                    />
                  </td>
                  <td className="px-3 py-1.5 text-right font-mono whitespace-nowrap">{from}</td>
                  <td className="px-3 py-1.5 text-right font-mono whitespace-nowrap">{to}</td>
                  <td className="px-3 py-1.5 text-right font-mono">{levelText(segment.startDb)}</td>
                  <td className="px-3 py-1.5 text-right font-mono">{levelText(segment.stopDb)}</td>
                  <td className="px-3 py-1.5 text-sm text-ink-soft">
                    {segment.startDb === segment.stopDb
                      ? "flat"
                      : INTERPOLATION_LABELS[segment.interpolation]}
                  </td>
                </tr>
              );
            })}
          </tbody>
        </table>
      </div>
    );
  });
}
