"use client";

import Link from "next/link";
import { useState } from "react";
import type { Provenance } from "@/lib/core/mask/mask";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { ErrorNote } from "@/components/ui/error-note";
import { UnconfirmedMark } from "@/components/masks/unconfirmed-mark";
import { editionWords, PROVENANCE_MARKS, sourceWords } from "@/components/masks/mask-words";
import { Field } from "@/components/ui/field";
import { keepUnits } from "@/components/ui/keep-units";
import { StatusNote } from "@/components/ui/status-note";
import { useActionForm } from "@/components/ui/use-action-form";
import type { Outcome } from "./outcome";

interface Choice {
  id: string;
  title: string;
  document: string;
  clause: string;
  edition: string;
  provenance: Provenance;
  isChosen: boolean;
  isArchived: boolean;
}

interface MasksFormProps {
  programId: string;
  choices: Choice[];
  action: (input: unknown) => Promise<Outcome>;
}

const textOf = (choice: Choice) =>
  [choice.title, choice.document, choice.clause, choice.edition].join(" ").toLowerCase();

/** The masks that the program must fit under. What is ticked stays so while the search hides it. */
export function MasksForm({ programId, choices, action }: MasksFormProps) {
  const [chosen, setChosen] = useState<ReadonlySet<string>>(
    () => new Set(choices.filter((choice) => choice.isChosen).map((choice) => choice.id)),
  );
  const [search, setSearch] = useState("");
  const [done, setDone] = useState<string | null>(null);
  const form = useActionForm({
    action,
    read: (): unknown => {
      setDone(null);
      return { programId, maskIds: [...chosen] };
    },
    onDone: () => setDone("Masks stored."),
  });
  // What the program holds already stands first, in the order of the library.
  const ordered = [...choices].sort((a, b) => Number(b.isChosen) - Number(a.isChosen));
  const words = search.toLowerCase().split(/\s+/);
  const shown = ordered.filter((choice) => words.every((word) => textOf(choice).includes(word)));

  function toggle(id: string, isOn: boolean) {
    const next = new Set(chosen);
    if (isOn) next.add(id);
    else next.delete(id);
    setChosen(next);
  }

  if (choices.length === 0) {
    return (
      <EmptyState>
        No masks yet.{" "}
        <Link href="/masks" className="text-deep underline">
          Open the masks
        </Link>{" "}
        to make or take over the first one.
      </EmptyState>
    );
  }
  return (
    <form onSubmit={form.onSubmit} method="post" className="max-w-4xl">
      <ErrorNote message={form.fieldErrors.maskIds ?? form.message} />
      <StatusNote message={done} />
      <Field
        label="Search masks"
        type="search"
        value={search}
        onChange={(event) => setSearch(event.target.value)}
      />
      <fieldset className="mb-4 max-h-96 min-w-0 overflow-y-auto border border-rule bg-sheet">
        <legend className="sr-only">Masks that the program must fit under</legend>
        {shown.map((choice) => (
          <label
            key={choice.id}
            className="flex cursor-pointer gap-3 border-b border-rule px-4 py-1.5 last:border-0"
          >
            <input
              type="checkbox"
              className="mt-1 size-4 accent-deep"
              checked={chosen.has(choice.id)}
              onChange={(event) => toggle(choice.id, event.target.checked)}
            />
            <span className="min-w-0">
              <span className="font-medium">{keepUnits(choice.title)}</span>
              <span className="block text-sm text-ink-soft">
                {sourceWords(choice)}, edition {editionWords(choice)}
                {" · "}
                {choice.provenance === "from memory" ? (
                  <UnconfirmedMark provenance={choice.provenance} />
                ) : (
                  <span>{PROVENANCE_MARKS[choice.provenance]}</span>
                )}
                {choice.isArchived ? " · archived: take it off" : ""}
              </span>
            </span>
          </label>
        ))}
        {shown.length === 0 ? (
          <p className="px-4 py-3 text-ink-soft">
            No mask matches.{" "}
            <button
              type="button"
              className="cursor-pointer text-deep underline"
              onClick={() => setSearch("")}
            >
              Clear the search
            </button>
          </p>
        ) : null}
      </fieldset>
      <div className="flex flex-wrap items-center gap-4">
        <Button type="submit" disabled={form.pending}>
          Store masks
        </Button>
        <span className="text-ink-soft">{chosen.size} chosen</span>
      </div>
    </form>
  );
}
