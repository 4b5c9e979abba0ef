"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { readNumber } from "@/components/ui/read-number";
import { StatusNote } from "@/components/ui/status-note";
import { useActionForm } from "@/components/ui/use-action-form";
import { FrequencyField } from "./frequency-field";
import type { Outcome } from "./outcome";
import { readFrequency } from "./read-frequency";
import { RowFrame } from "./row-frame";
import { useRows } from "./use-rows";

interface Clock {
  name: string;
  frequencyHz: number | null;
  tolerancePpm: number | null;
}

interface ClocksFormProps {
  buildId: string;
  clocks: Clock[];
  action: (input: unknown) => Promise<Outcome<{ count: number }>>;
}

const EMPTY: Clock = { name: "", frequencyHz: null, tolerancePpm: null };

/** The build's known clocks as one list, which is stored whole or not at all. */
export function ClocksForm({ buildId, clocks, action }: ClocksFormProps) {
  const { rows, add, remove, markSent, errorOf } = useRows(clocks);
  const [done, setDone] = useState<string | null>(null);
  const form = useActionForm({
    action,
    read: (data): unknown => {
      setDone(null);
      markSent();
      return {
        buildId,
        clocks: rows.map((_, index) => {
          const tolerance = data.get(`clocks.${index}.tolerancePpm`);
          return {
            name: data.get(`clocks.${index}.name`),
            frequencyHz: readFrequency(String(data.get(`clocks.${index}.frequencyHz`))),
            tolerancePpm: String(tolerance).trim() === "" ? null : readNumber(tolerance),
          };
        }),
      };
    },
    onDone: ({ count }) => setDone(`Clocks stored: ${count}.`),
  });
  return (
    <form onSubmit={form.onSubmit} method="post" className="max-w-4xl">
      <ErrorNote message={form.message} />
      <StatusNote message={done} />
      {rows.length === 0 ? (
        <div className="mb-3">
          <EmptyState>
            No clocks. Add the oscillators, bit rates and converters whose lines may show up.
          </EmptyState>
        </div>
      ) : null}
      {rows.map(({ key, value }, index) => {
        const field = (name: string) => ({
          name: `clocks.${index}.${name}`,
          error: errorOf(form.fieldErrors, "clocks", key, name),
        });
        return (
          <RowFrame key={key} label={`Clock ${index + 1}`} onRemove={() => remove(key)}>
            <Field label="Clock" defaultValue={value.name} {...field("name")} />
            <FrequencyField initialHz={value.frequencyHz} {...field("frequencyHz")} />
            <Field
              label="Tolerance in ppm"
              inputMode="decimal"
              placeholder="not stated"
              defaultValue={value.tolerancePpm ?? ""}
              {...field("tolerancePpm")}
            />
          </RowFrame>
        );
      })}
      <div className="flex flex-wrap gap-2">
        <Button look="quiet" onClick={() => add(EMPTY)}>
          Add clock
        </Button>
        <Button type="submit" disabled={form.pending}>
          Store clocks
        </Button>
      </div>
    </form>
  );
}
