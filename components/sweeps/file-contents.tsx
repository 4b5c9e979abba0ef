import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency, formatLevel } from "@/lib/core/units/format";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import type { DeskPreview } from "./desk-file";

const DELIMITERS: Record<string, string> = { "\t": "tab", ",": "comma", ";": "semicolon" };

/** What was found in a file, before anything of it is stored. */
export function FileContents({ preview }: { preview: DeskPreview }) {
  const size = new Intl.NumberFormat("en", { maximumFractionDigits: 1 });
  // Until the unit of the frequencies is answered, they are not known in Hz.
  const unitOpen = preview.questions.some((q) => q.field === "frequencyUnit");
  const hz = (value: number, step?: number | null) =>
    unitOpen ? `${value}` : formatFrequency(value, step ?? undefined);
  return (
    <>
      <div className="mb-3 overflow-x-auto" tabIndex={0} role="region" aria-label="Traces found">
        <table className="w-full text-left text-sm">
          <thead className="text-ink-soft">
            <tr className="border-b border-rule">
              {["Trace", "Detector", "Unit", "Points", "Span", "Highest"].map((head) => (
                <th key={head} className="py-1 pr-4 font-medium">
                  {head}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {preview.traces.map((trace) => (
              <tr key={trace.column} className="border-b border-rule last:border-0">
                <td className="py-1.5 pr-4">{trace.name}</td>
                <td className="py-1.5 pr-4">
                  {trace.detector ? DETECTOR_LABELS[trace.detector] : "not stated"}
                </td>
                <td className="py-1.5 pr-4">
                  {trace.unit ? LEVEL_UNIT_LABELS[trace.unit] : "not stated"}
                </td>
                <td className="py-1.5 pr-4 font-mono">{trace.points}</td>
                <td className="py-1.5 pr-4 font-mono whitespace-nowrap">
                  {hz(trace.firstHz, trace.stepHz)} to {hz(trace.lastHz, trace.stepHz)}
                </td>
                <td className="py-1.5 font-mono whitespace-nowrap">
                  {trace.unit ? formatLevel(trace.maxLevel, trace.unit) : trace.maxLevel.toFixed(1)}{" "}
                  at {hz(trace.maxAtHz, trace.stepHz)}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <p className="mb-3 text-sm text-ink-soft">
        {preview.encoding}, {DELIMITERS[preview.delimiter] ?? preview.delimiter} between columns,
        decimal {preview.decimal === "." ? "point" : "comma"},{" "}
        {size.format(preview.sizeBytes / 1024)} kB.
      </p>
      {[...preview.warnings, ...preview.leftOut.map((c) => `${c.name} is left out: ${c.why}`)].map(
        (text) => (
          <p
            key={text}
            className="mb-3 max-w-none border-l-4 border-shoal bg-shoal-bed px-3 py-1.5 text-sm"
          >
            {text}
          </p>
        ),
      )}
    </>
  );
}
