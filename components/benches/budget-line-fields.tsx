"use client";

import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { SelectField } from "@/components/ui/select-field";
import { DISTRIBUTIONS } from "@/lib/core/bench/uncertainty-budget";
import type { BudgetLineText } from "./budget-line-text";
import { DISTRIBUTION_LABELS } from "./budget-words";

const OPTIONS = [
  { value: "", label: "Choose…" },
  ...DISTRIBUTIONS.map((value) => ({ value, label: DISTRIBUTION_LABELS[value] })),
];

interface BudgetLineFieldsProps {
  line: BudgetLineText;
  place: number;
  /** "0.60 dB, 35 % of u²", or why nothing can be said yet. */
  contribution: string;
  errorOf: (field: keyof BudgetLineText) => string | undefined;
  onChange: (change: Partial<BudgetLineText>) => void;
  onRemove: () => void;
}

/** One line of the budget. */
export function BudgetLineFields(props: BudgetLineFieldsProps) {
  const { line, place, contribution, errorOf, onChange, onRemove } = props;
  const at = `lines.${place}`;
  const called = line.name.trim() || `line ${place + 1}`;
  const number = (field: "value" | "sensitivity" | "degreesOfFreedom" | "observations") => ({
    name: `${at}.${field}`,
    inputMode: "decimal" as const,
    value: line[field],
    onChange: (event: { target: { value: string } }) => onChange({ [field]: event.target.value }),
    error: errorOf(field),
  });
  return (
    <fieldset className="mb-4 min-w-0 border border-rule bg-sheet px-4 pt-2 pb-1">
      <legend className="px-2 font-title text-lg">
        {place + 1}. {line.name.trim() || "New line"}
      </legend>
      <div className="grid grid-cols-2 gap-x-4 lg:grid-cols-[2fr_1fr_2fr_1fr_1fr_1.3fr]">
        <div className="col-span-2 lg:col-span-1">
          <Field
            label="Quantity"
            name={`${at}.name`}
            value={line.name}
            onChange={(event) => onChange({ name: event.target.value })}
            error={errorOf("name")}
          />
        </div>
        <Field label="Value in dB" {...number("value")} />
        <SelectField
          label="Distribution"
          name={`${at}.distribution`}
          options={OPTIONS}
          value={line.distribution}
          onChange={(event) =>
            onChange({
              distribution: DISTRIBUTIONS.find((known) => known === event.target.value) ?? "",
            })
          }
          error={errorOf("distribution")}
        />
        <Field label="Sensitivity" {...number("sensitivity")} />
        {/* Only a series of observations has a number of them; the columns stay where they are. */}
        <div className={line.distribution === "type-a" ? "" : "hidden lg:invisible lg:block"}>
          <Field
            label="n"
            aria-label="Number of observations"
            disabled={line.distribution !== "type-a"}
            {...number("observations")}
          />
        </div>
        <Field
          label="Degrees of freedom"
          placeholder={line.distribution === "type-a" ? "n − 1" : "unlimited"}
          {...number("degreesOfFreedom")}
        />
      </div>
      <div className="mb-2 flex flex-wrap items-center gap-4">
        <p className="text-sm text-ink-soft">{contribution}</p>
        <Button look="quiet" className="ml-auto" aria-label={`Remove ${called}`} onClick={onRemove}>
          Remove
        </Button>
      </div>
    </fieldset>
  );
}
