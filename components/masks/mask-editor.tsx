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
import { MaskHintList } from "./mask-hint-list";
import { MaskLineFields } from "./mask-line-fields";
import type { DraftProblem } from "./mask-problems";
import { draftProblems, problemAt } from "./mask-problems";
import { PasteTable } from "./paste-table";
import { RevisionImpact } from "./revision-impact";
import type { Impact } from "./revision-impact-words";
import { useMaskDraft } from "./use-mask-draft";

type Outcome<T> =
  { ok: true; data: T } | { ok: false; message: string; fieldErrors: Record<string, string> };

interface MaskEditorProps {
  save: (input: unknown) => Promise<Outcome<{ maskId: string }>>;
  /** What saving would change for the sweeps that are here; shown first when there are any. */
  foresee?: (input: unknown) => Promise<Outcome<Impact>>;
  /** The mask that is edited; without it a new one is made. */
  edited?: { maskId: string; revision: number; mask: Mask };
}

interface Foreseen {
  input: unknown;
  impact: Impact;
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
export function MaskEditor({ save, foresee, edited }: MaskEditorProps) {
  const router = useRouter();
  const { draft, patch, addLine, addPasted, changesOf } = useMaskDraft(edited?.mask ?? null);
  const [tried, setTried] = useState(false);
  const [pasted, setPasted] = useState("");
  // The server's words about a draft hold until the draft changes.
  const [sent, setSent] = useState<MaskDraft | null>(null);
  const found = draftProblems(draft);
  // A revision that waits for a yes, with what it would change.
  const [foreseen, setForeseen] = useState<Foreseen | null>(null);
  const show = ({ maskId }: { maskId: string }) => router.push(`/masks/${maskId}`);
  const form = useActionForm({
    action: async (input: unknown): Promise<Outcome<{ maskId: string } | Foreseen>> => {
      if (found.length > 0) {
        const message = "Some fields need another look; nothing was stored.";
        return { ok: false, message, fieldErrors: focusOrder(found) };
      }
      if (!edited || !foresee) return save(input);
      const outcome = await foresee(input);
      if (!outcome.ok) return outcome;
      if (outcome.data.looked === 0) return save(input);
      return { ok: true, data: { input, impact: outcome.data } };
    },
    read: (): unknown => {
      setTried(true);
      setSent(draft);
      const mask = maskOfDraft(draft, OPEN);
      return edited ? { maskId: edited.maskId, basedOnRevision: edited.revision, mask } : { mask };
    },
    onDone: (data) => ("maskId" in data ? show(data) : setForeseen(data)),
  });

  async function saveForeseen({ input }: Foreseen) {
    const outcome = await save(input);
    if (outcome.ok) show(outcome.data);
    return outcome;
  }

  const told =
    sent === draft && found.length === 0
      ? Object.entries(form.fieldErrors).map(([path, text]) => ({ path, text, blank: false }))
      : [];
  const problems = [...found.filter((problem) => tried || !problem.blank), ...told];
  const drawn = maskOfDraft(draft, OPEN);
  return (
    <form onSubmit={form.onSubmit} method="post" noValidate>
      {foreseen ? (
        <RevisionImpact
          impact={foreseen.impact}
          save={() => saveForeseen(foreseen)}
          onKeep={() => setForeseen(null)}
        />
      ) : null}
      <MaskFields draft={draft} errorAt={(path) => problemAt(problems, path)} onPatch={patch} />
      <div className="mt-2 grid gap-6 lg:grid-cols-[minmax(0,2fr)_minmax(0,1fr)]">
        <div className="min-w-0">
          {draft.lines.map((line, place) => (
            <MaskLineFields
              key={line.id}
              line={line}
              place={place}
              frequencyUnit={draft.frequencyUnit}
              unit={draft.unit}
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
          <PasteTable
            summary="Paste a table with several bands and detectors"
            text={pasted}
            onText={setPasted}
            frequencyUnit={draft.frequencyUnit}
            unit={draft.unit}
            onAdd={(lines, unit) => {
              addPasted(lines, unit);
              setPasted("");
            }}
          />
        </div>
        <div className="min-w-0">
          <section aria-label="The mask as typed" className="lg:sticky lg:top-4">
            <MaskChart mask={drawn} />
            {found.length === 0 ? <MaskHintList mask={drawn} /> : null}
          </section>
        </div>
      </div>
      {/* Beside the button: the head of a long form is out of sight when it is sent. */}
      <div className="mt-6">
        <ErrorNote message={form.message} />
      </div>
      <div className="flex flex-wrap gap-2">
        <Button type="submit" disabled={form.pending}>
          {edited ? `Save as revision ${edited.revision + 1}` : "Create mask"}
        </Button>
        <ButtonLink href={edited ? `/masks/${edited.maskId}` : "/masks"}>Cancel</ButtonLink>
        <p role="status" className="self-center text-ink-soft">
          {form.pending && edited ? "Holding the sweeps that are here against it …" : ""}
        </p>
      </div>
    </form>
  );
}
