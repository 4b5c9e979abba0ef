"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { readNumber } from "@/components/ui/read-number";
import { StatusNote } from "@/components/ui/status-note";
import { useActionForm } from "@/components/ui/use-action-form";
import type { Outcome } from "./outcome";
import { RowFrame } from "./row-frame";
import { useRows } from "./use-rows";

interface Milestone {
  name: string;
  dueOn: string;
  requiredMarginDb: number | null;
}

interface MilestonesFormProps {
  programId: string;
  milestones: Milestone[];
  action: (input: unknown) => Promise<Outcome<{ count: number }>>;
}

const EMPTY: Milestone = { name: "", dueOn: "", requiredMarginDb: null };

/** The program's milestones as one list, which is stored whole or not at all. */
export function MilestonesForm({ programId, milestones, action }: MilestonesFormProps) {
  const { rows, add, remove, markSent, errorOf } = useRows(milestones);
  const [done, setDone] = useState<string | null>(null);
  const form = useActionForm({
    action,
    read: (data): unknown => {
      setDone(null);
      markSent();
      return {
        programId,
        milestones: rows.map((_, index) => {
          const required = data.get(`milestones.${index}.requiredMarginDb`);
          return {
            name: data.get(`milestones.${index}.name`),
            dueOn: data.get(`milestones.${index}.dueOn`),
            requiredMarginDb: String(required).trim() === "" ? null : readNumber(required),
          };
        }),
      };
    },
    onDone: ({ count }) => setDone(`Milestones stored: ${count}.`),
  });
  return (
    <form onSubmit={form.onSubmit} method="post" className="max-w-4xl">
      <ErrorNote message={form.message} />
      <StatusNote message={done} />
      {rows.length === 0 ? (
        <div className="mb-3">
          <EmptyState>No milestones. Add the dates by which a margin has to be there.</EmptyState>
        </div>
      ) : null}
      {rows.map(({ key, value }, index) => {
        const field = (name: string) => ({
          name: `milestones.${index}.${name}`,
          error: errorOf(form.fieldErrors, "milestones", key, name),
        });
        return (
          <RowFrame key={key} label={`Milestone ${index + 1}`} onRemove={() => remove(key)}>
            <Field label="Milestone" defaultValue={value.name} {...field("name")} />
            <Field label="Due on" type="date" defaultValue={value.dueOn} {...field("dueOn")} />
            <Field
              label="Required margin in dB"
              inputMode="decimal"
              placeholder="the program's target"
              defaultValue={value.requiredMarginDb ?? ""}
              {...field("requiredMarginDb")}
            />
          </RowFrame>
        );
      })}
      <div className="flex flex-wrap gap-2">
        <Button look="quiet" onClick={() => add(EMPTY)}>
          Add milestone
        </Button>
        <Button type="submit" disabled={form.pending}>
          Store milestones
        </Button>
      </div>
    </form>
  );
}
