"use client";

import { SelectField } from "@/components/ui/select-field";
import type { Detector, TraceKind } from "@/lib/core/sweep/settings";
import { DETECTOR_LABELS, DETECTORS, TRACE_KINDS } from "@/lib/core/sweep/settings";
import type { FileUnit } from "@/lib/core/units/level-units";
import { LEVEL_UNIT_LABELS, LEVEL_UNITS, LINEAR_UNITS } from "@/lib/core/units/level-units";
import { FREQUENCY_UNITS } from "@/lib/core/units/parse-quantity";
import type { SweepFileAnswers, SweepFileQuestion, TraceAnswer } from "@/lib/formats/sweep-file";
import type { DeskFile } from "./desk-file";

const UNIT_OPTIONS = [
  ...LEVEL_UNITS.map((unit) => ({ value: unit, label: LEVEL_UNIT_LABELS[unit] })),
  ...LINEAR_UNITS.map((unit) => ({ value: unit, label: unit.replace("u", "µ") })),
];

const OPTIONS: Record<SweepFileQuestion["field"], { value: string; label: string }[]> = {
  unit: UNIT_OPTIONS,
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

const LABELS: Record<SweepFileQuestion["field"], string> = {
  unit: "Unit of the levels",
  detector: "Detector",
  frequencyUnit: "Unit of the frequencies",
  decimal: "Decimal mark",
  kind: "What the trace is",
};

/** The answers with one more: for a single trace by its column, or for the whole file. */
function withAnswer(
  answers: SweepFileAnswers,
  field: SweepFileQuestion["field"],
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
  const next: TraceAnswer = { ...own, column, ...part };
  return { ...answers, traces: [...others, next] };
}

interface FileQuestionsProps {
  file: DeskFile;
  onAnswer: (answers: SweepFileAnswers) => void;
}

/** What the file leaves open, each with why it is asked and the best guess to confirm. */
export function FileQuestions({ file, onAnswer }: FileQuestionsProps) {
  const { preview } = file;
  if (!preview || preview.questions.length === 0) return null;
  return (
    <fieldset className="mb-4 border-l-4 border-shoal bg-shoal-bed px-4 pt-3 pb-1">
      <legend className="sr-only">Questions about {file.file.name}</legend>
      <p className="mb-3 font-medium">The file leaves this open:</p>
      <div className="grid gap-x-5 sm:grid-cols-2">
        {preview.questions.map((question) => {
          const trace = question.traceIndex === null ? null : preview.traces[question.traceIndex];
          const options = OPTIONS[question.field];
          const guess = options.find((option) => option.value === question.guess)?.label;
          return (
            <SelectField
              key={`${question.field} ${question.traceIndex}`}
              label={`${LABELS[question.field]}${trace ? ` of ${trace.name}` : ""}`}
              hint={`${question.why}${guess ? ` It looks like ${guess}.` : ""}`}
              value=""
              options={[{ value: "", label: "choose" }, ...options]}
              onChange={(event) =>
                onAnswer(
                  withAnswer(
                    file.answers,
                    question.field,
                    trace ? trace.column : null,
                    event.target.value,
                  ),
                )
              }
            />
          );
        })}
      </div>
    </fieldset>
  );
}
