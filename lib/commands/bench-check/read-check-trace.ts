import { applySignalPath } from "@/lib/core/bench/apply-signal-path";
import type { CheckLine } from "@/lib/core/bench/bench-check";
import { CHECK_PROMINENCE_DB, findCheckLines } from "@/lib/core/bench/compare-check";
import type { SignalPath } from "@/lib/core/bench/signal-path";
import { frequencyAt } from "@/lib/core/sweep/axis";
import type { Trace } from "@/lib/core/sweep/trace";
import { formatFrequency } from "@/lib/core/units/format";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import { parseSweepFile } from "@/lib/formats/parse-sweep-file";
import { CommandError } from "../result";
import type { RecordBenchCheckInput } from "./schemas";

/** A comb has some hundreds of lines; what has more is noise under a detector that jumps. */
const MOST_LINES = 2000;

const refuse = (field: string, text: string) =>
  new CommandError("invalid", `The check was not stored. ${text}`, { [field]: text });

/** The one trace of the file that is the check, or what keeps it from being had. */
export function readCheckTrace(values: RecordBenchCheckInput): Trace {
  const { bytes, fileName, answers, traceIndex } = values;
  const parsed = parseSweepFile(bytes, fileName, answers);
  if (!parsed.ok) {
    const { reason, line, questions } = parsed.preview;
    const why = reason ?? questions.map((question) => question.why).join(" ");
    throw refuse("file", line === null ? why : `Line ${line}: ${why}`);
  }
  const { rbwHz } = parsed.preview;
  if (rbwHz !== null && Math.abs(rbwHz - values.rbwHz) > rbwHz / 100)
    throw refuse("rbwHz", `The file itself states an RBW of ${formatFrequency(rbwHz)}.`);
  const { traces } = parsed;
  const names = traces.map(({ name }) => `"${name}"`).join(", ");
  if (traceIndex === null && traces.length > 1)
    throw refuse("traceIndex", `The file has ${traces.length} traces: choose one of ${names}.`);
  const trace = traces[traceIndex ?? 0];
  if (!trace) throw refuse("traceIndex", `The file has no such trace: choose one of ${names}.`);
  if (trace.kind === "spots")
    throw refuse(
      "file",
      "Single-frequency readings do not show where a line stands: a check needs a continuous sweep.",
    );
  return trace;
}

/** Levels after the bench's signal path, unless the instrument applied the factors itself. */
export function throughCheckPath(trace: Trace, path: SignalPath, corrected: boolean): Trace {
  if (corrected) return trace;
  const applied = applySignalPath(trace, path);
  if (applied) return applied;
  throw refuse(
    "corrected",
    `"${trace.name}" is in ${LEVEL_UNIT_LABELS[trace.unit]}, which is not a level at the instrument's input. If the instrument applied the factors itself, mark the file as corrected.`,
  );
}

/** How much of the sweep lies inside the factor tables, where that is not all of it; else "". */
function reachWords({ axis, levelsDb }: Trace): string {
  const first = levelsDb.findIndex((level) => !Number.isNaN(level));
  if (first === -1) return "All of this sweep lies outside the bench's factor tables.";
  const last = levelsDb.findLastIndex((level) => !Number.isNaN(level));
  if (first === 0 && last === levelsDb.length - 1) return "";
  const words = (index: number) => formatFrequency(frequencyAt(axis, index));
  const span = first === last ? words(first) : `${words(first)} to ${words(last)}`;
  return `Of this sweep only ${span} lies inside the bench's factor tables.`;
}

/** The lines that stand out; a reference has some, and neither it nor a check has thousands. */
export function readCheckLines(trace: Trace, rbwHz: number, isReference: boolean): CheckLine[] {
  const lines = findCheckLines(trace, rbwHz);
  if (lines.length > MOST_LINES)
    throw refuse(
      "file",
      `${lines.length} maxima stand out by ${CHECK_PROMINENCE_DB} dB, more than a known source has lines: this looks like noise. Sweep it with a peak detector, or more slowly.`,
    );
  if (lines.length === 0 && isReference)
    throw refuse(
      "file",
      `${reachWords(trace)} No line stands ${CHECK_PROMINENCE_DB} dB out of what is around it: later checks would have nothing to be compared with.`.trim(),
    );
  return lines;
}
