import { lineRanges } from "@/lib/core/mask/limit-at";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { readNumber } from "@/components/ui/read-number";
import { readCellFrequency } from "./mask-draft";
import type { PastedLine } from "./read-pasted-table";

/** "6 segments in 4 bands, with 3 gaps between them" */
function extentWords(line: PastedLine): string {
  const segments = line.rows.map((row) => ({
    startHz: readCellFrequency(row.start, ""),
    stopHz: readCellFrequency(row.stop, ""),
    startDb: readNumber(row.startDb),
    stopDb: readNumber(row.stopDb),
    interpolation: row.interpolation,
  }));
  const bands = lineRanges({
    name: "",
    detector: "peak",
    rbwHz: null,
    rbwKind: null,
    segments,
  }).length;
  const count = segments.length === 1 ? "1 segment" : `${segments.length} segments`;
  if (bands === 1) return `${count}, without a gap`;
  return `${count} in ${bands} bands, with ${bands - 1 === 1 ? "a gap" : `${bands - 1} gaps`} between`;
}

interface PastePreviewProps {
  lines: readonly PastedLine[];
  /** What each becomes, "a new line" or the name of the line it goes into. */
  into: string;
}

/** What pasted rows were understood as, before anything is added. */
export function PastePreview({ lines, into }: PastePreviewProps) {
  return lines.map((line, i) => (
    <div key={i} className="mb-3 overflow-x-auto border border-rule">
      <table className="w-full text-left text-sm">
        <caption className="px-2 py-1 text-left">
          <span className="font-medium">{line.name || into}</span>{" "}
          <span className="text-ink-soft">
            {[
              line.name ? into : "",
              line.detector === null
                ? "detector to be chosen"
                : `${DETECTOR_LABELS[line.detector]} detector`,
              line.rbw,
              extentWords(line),
            ]
              .filter(Boolean)
              .join("; ")}
          </span>
        </caption>
        <thead className="text-ink-soft">
          <tr className="border-y border-rule">
            {["From", "To", "Limit at start", "Limit at end", "Between"].map((head) => (
              <th key={head} className="px-2 py-1 text-right font-medium">
                {head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody className="font-mono">
          {line.rows.map((row, k) => (
            <tr key={k} className="border-b border-rule last:border-0">
              {[row.start, row.stop, row.startDb, row.stopDb, `${row.interpolation} f`].map(
                (text, column) => (
                  <td key={column} className="px-2 py-1 text-right whitespace-nowrap">
                    {text}
                  </td>
                ),
              )}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  ));
}
