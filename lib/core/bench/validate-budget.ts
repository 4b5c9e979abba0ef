import { needsBudget } from "./guard";
import type {
  BudgetLine,
  Distribution,
  GuardRule,
  ReferenceUncertainty,
  UncertaintyBudget,
} from "./uncertainty-budget";

/** A line as it is typed: null is left empty, NaN is no number. */
export interface BudgetLineDraft {
  name: string;
  value: number | null;
  distribution: Distribution | null;
  sensitivity: number | null;
  degreesOfFreedom: number | null;
  observations: number | null;
}

export interface BudgetDraft {
  title: string;
  lines: BudgetLineDraft[];
  reference: ReferenceUncertainty | null;
}

/** `path` names the field ("lines.0.value"), `text` is a sentence for a person. */
export interface BudgetProblem {
  path: string;
  text: string;
}

/** No quantity of a bench is this uncertain; a typing error is. */
const MAX_VALUE_DB = 100;
const MAX_SENSITIVITY = 100;

function valueProblem(value: number | null): string | null {
  if (value === null) return "Give the value in dB.";
  if (!Number.isFinite(value)) return "The value must be a number in dB.";
  if (value < 0) return "A value of uncertainty is 0 dB or more: write ±0.5 dB as 0.5.";
  if (value > MAX_VALUE_DB) return `A value above ${MAX_VALUE_DB} dB is out of reach.`;
  return null;
}

function sensitivityProblem(sensitivity: number | null): string | null {
  if (sensitivity === null) return "Give the sensitivity; it is usually 1.";
  if (!Number.isFinite(sensitivity)) return "The sensitivity must be a number; it is usually 1.";
  if (sensitivity === 0) return "A sensitivity of 0 leaves the line out: remove the line instead.";
  if (Math.abs(sensitivity) > MAX_SENSITIVITY)
    return `A sensitivity beyond ${MAX_SENSITIVITY} is out of reach.`;
  return null;
}

function observationsProblem({ distribution, observations }: BudgetLineDraft): string | null {
  if (distribution !== "type-a") {
    return observations === null
      ? null
      : "Only a type A line has observations: choose type A, or leave this empty.";
  }
  if (observations === null) return "Type A needs the number of observations.";
  if (!Number.isInteger(observations)) return "The number of observations must be a whole number.";
  return observations < 2 ? "Type A needs at least two observations." : null;
}

/** One line's problems under `at` ("lines.3"); empty when it can be evaluated. */
export function validateBudgetLine(line: BudgetLineDraft, at: string): BudgetProblem[] {
  const { degreesOfFreedom: degrees } = line;
  const texts: [string, string | null][] = [
    ["name", line.name.trim() === "" ? "Name what is uncertain." : null],
    ["value", valueProblem(line.value)],
    ["distribution", line.distribution === null ? "Choose how the value is distributed." : null],
    ["sensitivity", sensitivityProblem(line.sensitivity)],
    ["observations", observationsProblem(line)],
    [
      "degreesOfFreedom",
      degrees === null || (Number.isFinite(degrees) && degrees > 0)
        ? null
        : "Degrees of freedom are a number above 0; leave it empty for infinitely many.",
    ],
  ];
  return texts.flatMap(([field, text]) => (text ? [{ path: `${at}.${field}`, text }] : []));
}

/**
 * Everything that keeps a budget (values in dB) from being evaluated under a bench's guard rule;
 * empty when it can be. Names may repeat: two cables are two lines.
 */
export function validateBudget(draft: BudgetDraft, rule: GuardRule): BudgetProblem[] {
  const problems = draft.lines.flatMap((line, i) => validateBudgetLine(line, `lines.${i}`));
  if (draft.lines.length === 0 && needsBudget(rule))
    problems.push({
      path: "lines",
      text: "The guard of this bench is computed from the budget: give at least one line.",
    });
  if (rule === "excess" && draft.reference === null)
    problems.push({
      path: "reference",
      text: "The guard of this bench is what U exceeds U_CISPR by: choose the measurement.",
    });
  return problems;
}

/** A line that can be evaluated, or null while something of it is missing or wrong. */
export function readBudgetLine(draft: BudgetLineDraft): BudgetLine | null {
  const { value, distribution, sensitivity } = draft;
  if (value === null || distribution === null || sensitivity === null) return null;
  if (validateBudgetLine(draft, "").length > 0) return null;
  const { degreesOfFreedom, observations } = draft;
  const name = draft.name.trim();
  return { name, value, distribution, sensitivity, degreesOfFreedom, observations };
}

/** The budget of those lines that can be evaluated. */
export function readBudget(draft: BudgetDraft): UncertaintyBudget {
  const lines = draft.lines.flatMap((line) => readBudgetLine(line) ?? []);
  return { version: 1, title: draft.title, lines, reference: draft.reference };
}
