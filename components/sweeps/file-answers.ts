import type { Detector, TraceKind } from "@/lib/core/sweep/settings";
import { DETECTOR_LABELS, DETECTORS, TRACE_KINDS } from "@/lib/core/sweep/settings";
import type { FileUnit } from "@/lib/core/units/level-units";
import { LEVEL_UNIT_LABELS, LEVEL_UNITS, LINEAR_UNITS } from "@/lib/core/units/level-units";
import { FREQUENCY_UNITS } from "@/lib/core/units/parse-quantity";
import type { QuestionField, SweepFileAnswers, SweepFileQuestion } from "@/lib/formats/sweep-file";

/** What can be answered, by the field that a file leaves open. */
export const ANSWER_OPTIONS: Record<QuestionField, { value: string; label: string }[]> = {
  unit: [
    ...LEVEL_UNITS.map((unit) => ({ value: unit, label: LEVEL_UNIT_LABELS[unit] })),
    ...LINEAR_UNITS.map((unit) => ({ value: unit, label: unit.replace("u", "µ") })),
  ],
  detector: DETECTORS.map((value) => ({ value, label: DETECTOR_LABELS[value] })),
  frequencyUnit: FREQUENCY_UNITS.map(([label, factor]) => ({ value: String(factor), label })),
  decimal: [
    { value: ".", label: "point: 1.5 is one and a half" },
    { value: ",", label: "comma: 1,5 is one and a half" },
  ],
  kind: TRACE_KINDS.map((value) => ({
    value,
    label: value === "scan" ? "a continuous sweep" : "single-frequency readings",
  })),
};

/** The answers with one more: for a single trace by its column, or for the whole file. */
export function withAnswer(
  answers: SweepFileAnswers,
  field: QuestionField,
  column: number | null,
  value: string,
): SweepFileAnswers {
  if (field === "frequencyUnit") return { ...answers, frequencyUnitHz: Number(value) };
  if (field === "decimal") return { ...answers, decimal: value === "," ? "," : "." };
  if (field === "kind") return { ...answers, kind: value as TraceKind };
  const part = field === "unit" ? { unit: value as FileUnit } : { detector: value as Detector };
  if (column === null) return { ...answers, ...part };
  const others = (answers.traces ?? []).filter((trace) => trace.column !== column);
  const own = (answers.traces ?? []).find((trace) => trace.column === column);
  return { ...answers, traces: [...others, { ...own, column, ...part }] };
}

function labelOf(field: QuestionField, value: string): string {
  return ANSWER_OPTIONS[field].find((option) => option.value === value)?.label ?? value;
}

/** What was answered, for checking by eye: "frequencies in MHz; Trace 1 in dBµV, peak". */
export function answerWords(
  answers: SweepFileAnswers,
  traces: readonly { column: number; name: string }[],
): string {
  const levels = (of: { unit?: FileUnit; detector?: Detector }) => [
    ...(of.unit ? [`in ${labelOf("unit", of.unit)}`] : []),
    ...(of.detector ? [labelOf("detector", of.detector)] : []),
  ];
  const whole = levels(answers);
  return [
    ...(answers.frequencyUnitHz
      ? [`frequencies in ${labelOf("frequencyUnit", String(answers.frequencyUnitHz))}`]
      : []),
    ...(answers.decimal ? [`decimal ${answers.decimal === "," ? "comma" : "point"}`] : []),
    ...(answers.kind ? [labelOf("kind", answers.kind)] : []),
    ...(whole.length > 0 ? [`levels ${whole.join(", ")}`] : []),
    ...(answers.traces ?? []).flatMap((trace) => {
      const name = traces.find(({ column }) => column === trace.column)?.name;
      const said = levels(trace);
      return name && said.length > 0 ? [`${name} ${said.join(", ")}`] : [];
    }),
  ].join("; ");
}

/**
 * Whether two files leave the same open and look alike in it: an answer for one that looks like Hz
 * must not slip into one that looks like MHz.
 */
export function asksAlike(
  a: readonly Pick<SweepFileQuestion, "field" | "guess">[],
  b: readonly Pick<SweepFileQuestion, "field" | "guess">[],
): boolean {
  const asked = (questions: typeof a) =>
    [...new Set(questions.map(({ field, guess }) => `${field} ${guess}`))].sort().join("|");
  return asked(a) === asked(b);
}

/**
 * The answers as they may be given for other files, where they fill only what is open; null when
 * the traces of this file were answered differently, so that none of them speaks for others.
 */
export function answersForOthers(answers: SweepFileAnswers): SweepFileAnswers | null {
  const { traces = [], ...wide } = answers;
  const units = new Set(traces.flatMap(({ unit }) => (unit ? [unit] : [])));
  const detectors = new Set(traces.flatMap(({ detector }) => (detector ? [detector] : [])));
  if (units.size > 1 || detectors.size > 1) return null;
  const [unit] = units;
  const [detector] = detectors;
  return { ...(unit ? { unit } : {}), ...(detector ? { detector } : {}), ...wide };
}
