"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { FactorChart } from "@/components/charts/factor-chart";
import { Button, ButtonLink } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { readNumber } from "@/components/ui/read-number";
import { useActionForm } from "@/components/ui/use-action-form";
import type { SignalPath } from "@/lib/core/bench/signal-path";
import { fillFromEquipment, type EquipmentToChoose } from "./fill-from-equipment";
import { draftTransducer, drawableTransducers, transducerInput } from "./transducer-draft";
import { TransducerFields } from "./transducer-fields";
import type { ReadTable } from "./use-transducer-drafts";
import { useTransducerDrafts } from "./use-transducer-drafts";

type Outcome =
  | { ok: true; data: { benchId: string; revision: number } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

interface SignalPathEditorProps {
  benchId: string;
  revision: number;
  path: SignalPath;
  equipment?: EquipmentToChoose[];
  save: (input: unknown) => Promise<Outcome>;
  readTable: ReadTable;
}

/** Edits a signal path as a whole; saving adds a revision and leaves the earlier ones alone. */
export function SignalPathEditor(props: SignalPathEditorProps) {
  const { benchId, revision, path, equipment = [], save, readTable } = props;
  const router = useRouter();
  const { drafts, patch, changeTable, add, move, remove } = useTransducerDrafts(
    path.transducers.map((t, i) => draftTransducer(i, t)),
    readTable,
  );
  // Errors name places; a transducer that is moved afterwards keeps its own.
  const [sentIds, setSentIds] = useState<number[]>([]);
  // What the server said of a field holds until that field is changed.
  const [changed, setChanged] = useState<ReadonlySet<string>>(new Set());
  const markChanged = (id: number, fields: string[]) =>
    setChanged((all) => new Set([...all, ...fields.map((field) => `${id}.${field}`)]));
  const form = useActionForm({
    action: save,
    read: (data): unknown => {
      setChanged(new Set());
      setSentIds(drafts.map((draft) => draft.id));
      return {
        benchId,
        basedOnRevision: revision,
        impedanceOhm: readNumber(data.get("impedanceOhm")),
        transducers: drafts.map(transducerInput),
      };
    },
    onDone: () => router.push(`/benches/${benchId}`),
  });
  const errorOf = (id: number, field: string) => {
    if (changed.has(`${id}.${field}`)) return undefined;
    const at = `transducers.${sentIds.indexOf(id)}.${field}`;
    const found = Object.entries(form.fieldErrors).find(
      ([path]) => path === at || path.startsWith(`${at}.`) || path === tableErrorOf(at),
    );
    return found?.[1];
  };
  const drawn = drawableTransducers(drafts);
  return (
    <form onSubmit={form.onSubmit} method="post">
      <div className="max-w-md">
        <Field
          label="Impedance of the instrument's input in Ω"
          name="impedanceOhm"
          inputMode="decimal"
          hint="50 on most analyzers, 75 on some for cable networks."
          defaultValue={path.impedanceOhm}
          error={form.fieldErrors.impedanceOhm}
        />
      </div>
      {drafts.length === 0 ? (
        <p className="mb-4 border border-dashed border-ink-soft/50 p-6 text-ink-soft">
          No transducers: the level at the instrument&apos;s input is the result. Add them in their
          order, from the field to the instrument.
        </p>
      ) : null}
      {drafts.map((draft, place) => (
        <TransducerFields
          key={draft.id}
          draft={draft}
          place={place}
          count={drafts.length}
          errorOf={(field) => errorOf(draft.id, field)}
          onPatch={(change) => {
            markChanged(draft.id, Object.keys(change));
            patch(draft.id, change);
          }}
          onTable={(change) => {
            markChanged(draft.id, ["factors"]);
            changeTable(draft, change);
          }}
          equipment={equipment}
          onEquipment={(equipmentId) => {
            const change = fillFromEquipment(equipment.find((e) => e.id === equipmentId));
            markChanged(draft.id, [...Object.keys(change), "factors"]);
            patch(draft.id, change);
          }}
          onMove={(by) => move(draft.id, by)}
          onRemove={() => remove(draft.id)}
        />
      ))}
      <Button look="quiet" onClick={add}>
        Add transducer
      </Button>
      {drawn.length > 0 ? (
        <section aria-label="Factors as typed" className="mt-6">
          <FactorChart transducers={drawn} />
        </section>
      ) : null}
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

/** A table that is too long to be read is refused by the schema under its own name. */
function tableErrorOf(at: string): string {
  return at.replace(/\.factors$/, ".table.text");
}
