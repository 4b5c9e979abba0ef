"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { MaskChart } from "@/components/charts/mask-chart";
import { Button, ButtonLink } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { useActionForm } from "@/components/ui/use-action-form";
import type { Mask } from "@/lib/core/mask/mask";
import type { MaskDraft } from "./mask-draft";
import { maskOfDraft } from "./mask-draft";
import { MaskFields } from "./mask-fields";
import { MaskLineFields } from "./mask-line-fields";
import type { DraftProblem } from "./mask-problems";
import { draftProblems, problemAt } from "./mask-problems";
import { useMaskDraft } from "./use-mask-draft";

type Outcome =
  | { ok: true; data: { maskId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

interface MaskEditorProps {
  save: (input: unknown) => Promise<Outcome>;
  /** The mask that is edited; without it a new one is made. */
  edited?: { maskId: string; revision: number; mask: Mask };
}

/** Choices left open: drawn in dB without a quantity, and asked for before anything is sent. */
const OPEN = { unit: "dB", port: "other" } as const;

/** A problem of a whole row leads to the row's first cell. */
function focusOrder(problems: readonly DraftProblem[]): Record<string, string> {
  return Object.fromEntries(
    problems.map(({ path, text }) => [path.replace(/(segments\.\d+)$/, "$1.startHz"), text]),
  );
}

/** A mask as a table, drawn beside it as it is typed. Saving adds a revision. */
export function MaskEditor({ save, edited }: MaskEditorProps) {
  const router = useRouter();
  const { draft, patch, addLine, changesOf } = useMaskDraft(edited?.mask ?? null);
  const [tried, setTried] = useState(false);
  // The server's words about a draft hold until the draft changes.
  const [sent, setSent] = useState<MaskDraft | null>(null);
  const found = draftProblems(draft);
  const form = useActionForm({
    action: async (input: unknown): Promise<Outcome> => {
      if (found.length === 0) return save(input);
      const message = "Some fields need another look; nothing was stored.";
      return { ok: false, message, fieldErrors: focusOrder(found) };
    },
    read: (): unknown => {
      setTried(true);
      setSent(draft);
      const mask = maskOfDraft(draft, OPEN);
      return edited ? { maskId: edited.maskId, basedOnRevision: edited.revision, mask } : { mask };
    },
    onDone: ({ maskId }) => router.push(`/masks/${maskId}`),
  });
  const told =
    sent === draft && found.length === 0
      ? Object.entries(form.fieldErrors).map(([path, text]) => ({ path, text, blank: false }))
      : [];
  const problems = [...found.filter((problem) => tried || !problem.blank), ...told];
  const drawn = maskOfDraft(draft, OPEN);
  return (
    <form onSubmit={form.onSubmit} method="post" noValidate>
      <ErrorNote message={form.message} />
      <MaskFields draft={draft} errorAt={(path) => problemAt(problems, path)} onPatch={patch} />
      <div className="mt-2 grid gap-6 lg:grid-cols-[minmax(0,2fr)_minmax(0,1fr)]">
        <div className="min-w-0">
          {draft.lines.map((line, place) => (
            <MaskLineFields
              key={line.id}
              line={line}
              place={place}
              frequencyUnit={draft.frequencyUnit}
              problems={problems}
              changes={changesOf(line.id)}
            />
          ))}
          {problemAt(problems, "lines") ? (
            <p className="mb-3 text-sm text-aground">{problemAt(problems, "lines")}</p>
          ) : null}
          <Button look="quiet" onClick={addLine}>
            Add line
          </Button>
        </div>
        <div className="min-w-0">
          <section aria-label="The mask as typed" className="lg:sticky lg:top-4">
            <MaskChart mask={drawn} />
          </section>
        </div>
      </div>
      <div className="mt-6 flex gap-2">
        <Button type="submit" disabled={form.pending}>
          {edited ? `Save as revision ${edited.revision + 1}` : "Create mask"}
        </Button>
        <ButtonLink href={edited ? `/masks/${edited.maskId}` : "/masks"}>Cancel</ButtonLink>
      </div>
    </form>
  );
}
