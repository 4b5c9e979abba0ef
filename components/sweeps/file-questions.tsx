"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { SelectField } from "@/components/ui/select-field";
import type { QuestionField, SweepFileAnswers } from "@/lib/formats/sweep-file";
import type { DeskFile } from "./desk-file";
import { ANSWER_OPTIONS, answersForOthers, answerWords, withAnswer } from "./file-answers";

const LABELS: Record<QuestionField, string> = {
  unit: "Unit of the levels",
  detector: "Detector",
  frequencyUnit: "Unit of the frequencies",
  decimal: "Decimal mark",
  kind: "What the trace is",
};

interface FileQuestionsProps {
  file: DeskFile;
  /** How many other files ask the same. */
  alike: number;
  onAnswer: (answers: SweepFileAnswers) => void;
  /** Answers for the other files that ask the same. */
  onAnswerAlike: (answers: SweepFileAnswers) => void;
}

/**
 * What the file leaves open, each with why it is asked and the best guess. Nothing is taken before
 * a button says so: arrow keys run through a select, and a wrong unit is a wrong margin.
 */
export function FileQuestions({ file, alike, onAnswer, onAnswerAlike }: FileQuestionsProps) {
  const [chosen, setChosen] = useState<Record<string, string>>({});
  const { preview, answers } = file;
  if (!preview) return null;
  if (preview.questions.length === 0) {
    const said = answerWords(answers, preview.traces);
    return said ? (
      <p className="mb-3 text-sm">
        Answered by you: {said}.{" "}
        <button
          type="button"
          className="min-h-6 cursor-pointer text-deep underline"
          onClick={() => {
            setChosen({});
            onAnswer({});
          }}
        >
          Answer again
        </button>
      </p>
    ) : null;
  }

  const asked = preview.questions.map((question) => {
    const trace = question.traceIndex === null ? null : preview.traces[question.traceIndex];
    return { ...question, trace, key: `${question.field} ${question.traceIndex}` };
  });
  const given = asked.filter(({ key }) => chosen[key]);
  const all = given.reduce(
    (so, { field, trace, key }) => withAnswer(so, field, trace?.column ?? null, chosen[key] ?? ""),
    answers,
  );
  const forOthers = answersForOthers(all);
  const isWhole = given.length === asked.length;
  return (
    <fieldset className="mb-4 min-w-0 border-l-4 border-shoal bg-shoal-bed px-4 pt-3 pb-4">
      <legend className="sr-only">Questions about {file.file.name}</legend>
      <p className="mb-3 font-medium">The file leaves this open:</p>
      <div className="grid gap-x-5 sm:grid-cols-2 lg:grid-cols-3">
        {asked.map(({ key, field, trace, guess, why }) => {
          const options = ANSWER_OPTIONS[field];
          const likely = options.find((option) => option.value === guess)?.label;
          return (
            <SelectField
              key={key}
              label={`${LABELS[field]}${trace ? ` of ${trace.name}` : ""}`}
              hint={`${why}${likely ? ` It looks like ${likely}.` : ""}`}
              value={chosen[key] ?? ""}
              options={[{ value: "", label: "Choose…" }, ...options]}
              onChange={(event) => setChosen({ ...chosen, [key]: event.target.value })}
            />
          );
        })}
      </div>
      <div className="flex flex-wrap gap-2">
        <Button disabled={given.length === 0} onClick={() => onAnswer(all)}>
          {asked.length === 1 ? "Use this answer" : "Use these answers"}
        </Button>
        {alike > 0 && isWhole && forOthers ? (
          <Button
            look="quiet"
            onClick={() => {
              onAnswer(all);
              onAnswerAlike(forOthers);
            }}
          >
            {alike === 1
              ? "Also for the other file that asks the same"
              : `Also for the ${alike} other files that ask the same`}
          </Button>
        ) : null}
      </div>
    </fieldset>
  );
}
