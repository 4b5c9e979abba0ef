"use client";

import { useRouter } from "next/navigation";
import { useRef, useState } from "react";
import { Button, ButtonLink } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { SelectField } from "@/components/ui/select-field";
import { useActionForm } from "@/components/ui/use-action-form";
import { expandedUncertainty } from "@/lib/core/bench/expanded-uncertainty";
import type { UncertaintyBudget } from "@/lib/core/bench/uncertainty-budget";
import { REFERENCE_UNCERTAINTIES } from "@/lib/core/bench/uncertainty-budget";
import { readBudgetLine } from "@/lib/core/bench/validate-budget";
import { BudgetLineFields } from "./budget-line-fields";
import type { BudgetLineText } from "./budget-line-text";
import { draftOfLine, emptyLine, textOfLine, USUAL_LINES } from "./budget-line-text";
import { BudgetResult } from "./budget-table";
import { inDb, REFERENCE_LABELS } from "./budget-words";

type Outcome =
  | { ok: true; data: { benchId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

interface BudgetEditorProps {
  benchId: string;
  /** The revision this starts from; 0 while there is none. */
  revision: number;
  budget: UncertaintyBudget | null;
  save: (input: unknown) => Promise<Outcome>;
}

const REFERENCE_OPTIONS = [
  { value: "", label: "none chosen" },
  ...REFERENCE_UNCERTAINTIES.map((value) => ({ value, label: REFERENCE_LABELS[value] })),
];

/** Edits a budget as a whole, with its numbers as they are typed; saving adds a revision. */
export function BudgetEditor({ benchId, revision, budget, save }: BudgetEditorProps) {
  const router = useRouter();
  const [lines, setLines] = useState(() => (budget?.lines ?? []).map((l, i) => textOfLine(i, l)));
  const [reference, setReference] = useState(budget?.reference ?? null);
  const nextId = useRef(lines.length);
  // Errors name places; a line keeps its own when another one is removed.
  const [sentIds, setSentIds] = useState<number[]>([]);
  const [changed, setChanged] = useState<ReadonlySet<string>>(new Set());
  const form = useActionForm({
    action: save,
    read: (data): unknown => {
      setChanged(new Set());
      setSentIds(lines.map((line) => line.id));
      return {
        benchId,
        basedOnRevision: revision,
        title: data.get("title"),
        lines: lines.map(draftOfLine),
        reference,
      };
    },
    onDone: () => router.push(`/benches/${benchId}`),
  });
  const sound = lines.flatMap((text) => {
    const line = readBudgetLine(draftOfLine(text));
    return line ? [{ id: text.id, line }] : [];
  });
  const result = expandedUncertainty({
    version: 1,
    title: "",
    lines: sound.map(({ line }) => line),
    reference,
  });
  const open = lines.length - sound.length;

  function contributionOf(id: number): string {
    const found = result.lines[sound.findIndex((s) => s.id === id)];
    if (!found) return "Not counted yet: something is missing.";
    return `Contributes ${inDb(found.contributionDb)}, ${Math.round(found.share * 100)} % of u².`;
  }

  function add(more: readonly Partial<BudgetLineText>[]) {
    const first = nextId.current;
    nextId.current += more.length;
    setLines((now) => [...now, ...more.map((change, i) => emptyLine(first + i, change))]);
  }

  return (
    <form onSubmit={form.onSubmit} method="post">
      <div className="grid gap-x-6 sm:grid-cols-2">
        <Field
          label="Title"
          name="title"
          hint="What it holds for, for instance a span and a polarization."
          defaultValue={budget?.title}
          error={form.fieldErrors.title}
        />
        <SelectField
          label="Measurement"
          name="reference"
          options={REFERENCE_OPTIONS}
          value={reference ?? ""}
          hint="Which U_CISPR stands beside U; needed where the guard is the excess over it."
          onChange={(event) =>
            setReference(
              REFERENCE_UNCERTAINTIES.find((known) => known === event.target.value) ?? null,
            )
          }
          error={form.fieldErrors.reference}
        />
      </div>
      {lines.map((line, place) => (
        <BudgetLineFields
          key={line.id}
          line={line}
          place={place}
          contribution={contributionOf(line.id)}
          errorOf={(field) =>
            changed.has(`${line.id}.${field}`)
              ? undefined
              : form.fieldErrors[`lines.${sentIds.indexOf(line.id)}.${field}`]
          }
          onChange={(change) => {
            // Whether the number of observations is needed hangs on the distribution.
            const named = Object.keys(change);
            const of = named.includes("distribution") ? [...named, "observations"] : named;
            const fields = of.map((field) => `${line.id}.${field}`);
            setChanged((all) => new Set([...all, ...fields]));
            setLines((now) => now.map((l) => (l.id === line.id ? { ...l, ...change } : l)));
          }}
          onRemove={() => setLines((now) => now.filter((l) => l.id !== line.id))}
        />
      ))}
      {form.fieldErrors.lines ? (
        <p role="alert" className="mb-2 text-sm text-aground">
          {form.fieldErrors.lines}
        </p>
      ) : null}
      <div className="flex flex-wrap gap-2">
        <Button look="quiet" onClick={() => add([{}])}>
          Add line
        </Button>
        {lines.length === 0 ? (
          <Button look="quiet" onClick={() => add(USUAL_LINES)}>
            Add the usual lines of a radiated bench, without values
          </Button>
        ) : null}
      </div>
      <section aria-label="What follows" aria-live="polite" className="mt-6">
        {open > 0 ? (
          <p className="mb-2 text-shoal">
            {open === 1 ? "1 line is" : `${open} lines are`} not counted yet.
          </p>
        ) : null}
        {sound.length > 0 ? (
          <BudgetResult result={result} reference={reference} />
        ) : (
          <p className="text-ink-soft">
            U follows from the lines; without one nothing is known of it.
          </p>
        )}
      </section>
      {/* Beside the button: the head of a long form is out of sight when it is sent. */}
      <div className="mt-6">
        <ErrorNote message={form.message} />
      </div>
      <div className="flex flex-wrap gap-2">
        <Button type="submit" disabled={form.pending}>
          Save as revision {revision + 1}
        </Button>
        <ButtonLink href={`/benches/${benchId}`}>Cancel</ButtonLink>
      </div>
    </form>
  );
}
