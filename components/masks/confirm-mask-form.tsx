"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button, ButtonLink } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { TextArea } from "@/components/ui/text-area";
import { useActionForm } from "@/components/ui/use-action-form";
import type { Mask } from "@/lib/core/mask/mask";
import { CompareLines, rowKeys } from "./compare-lines";

type Outcome =
  | { ok: true; data: { maskId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

interface ConfirmMaskFormProps {
  maskId: string;
  revision: number;
  mask: Mask;
  confirm: (input: unknown) => Promise<Outcome>;
}

/** What is still to be ticked off, or null once everything is. */
function openRows(keys: string[], ticked: ReadonlySet<string>): string | null {
  const open = keys.filter((key) => !ticked.has(key)).length;
  if (open === 0) return null;
  return `${open} of ${keys.length} ${keys.length === 1 ? "row is" : "rows are"} not ticked off yet.`;
}

/** A mask is compared with the document row by row; then it is said with which copy, and stored. */
export function ConfirmMaskForm({ maskId, revision, mask, confirm }: ConfirmMaskFormProps) {
  const router = useRouter();
  const [ticked, setTicked] = useState<ReadonlySet<string>>(new Set());
  const keys = rowKeys(mask);
  const open = openRows(keys, ticked);
  const form = useActionForm({
    action: async (input: unknown): Promise<Outcome> =>
      open === null
        ? confirm(input)
        : {
            ok: false,
            message: "Nothing was stored: the comparison is not complete.",
            fieldErrors: { isCompared: open },
          },
    read: (data): unknown => ({
      maskId,
      basedOnRevision: revision,
      copy: String(data.get("copy") ?? ""),
      edition: String(data.get("edition") ?? ""),
      note: String(data.get("note") ?? ""),
      isCompared: data.get("isCompared") === "on",
    }),
    onDone: () => router.push(`/masks/${maskId}`),
  });
  return (
    <form onSubmit={form.onSubmit} method="post" noValidate className="max-w-3xl">
      <CompareLines
        mask={mask}
        ticked={ticked}
        onTick={(of, isTicked) =>
          setTicked((now) => {
            const next = new Set(now);
            for (const key of of) if (isTicked) next.add(key);
            for (const key of of) if (!isTicked) next.delete(key);
            return next;
          })
        }
      />
      <p role="status" className="mb-4 text-sm text-ink-soft">
        {open ?? "Every row is ticked off."}
      </p>
      <div className="grid gap-x-4 sm:grid-cols-2">
        <Field
          label="Which copy you hold"
          name="copy"
          hint="As a later reader can find it: printed or file, where it lies, licence."
          error={form.fieldErrors["copy"]}
        />
        <Field
          label="Edition you compared with"
          name="edition"
          hint="With its amendments, as its title page says."
          defaultValue={mask.edition === "not stated" ? "" : mask.edition}
          error={form.fieldErrors["edition"]}
        />
      </div>
      <TextArea
        label="Note"
        name="note"
        rows={2}
        hint="Stands on the mask from now on."
        defaultValue={mask.note}
        error={form.fieldErrors["note"]}
      />
      <label className="mb-1 flex items-start gap-2">
        <input
          type="checkbox"
          name="isCompared"
          className="mt-0.5 size-5 accent-deep"
          aria-describedby="compared-problem"
          aria-invalid={form.fieldErrors["isCompared"] ? true : undefined}
        />
        <span>
          I compared every line with my own copy: detectors, bandwidths, bands and limits.
        </span>
      </label>
      <p id="compared-problem" className="mb-4 text-sm text-aground">
        {form.fieldErrors["isCompared"]}
      </p>
      <ErrorNote message={form.message} />
      <div className="flex gap-2">
        <Button type="submit" disabled={form.pending}>
          Confirm as revision {revision + 1}
        </Button>
        <ButtonLink href={`/masks/${maskId}`}>Cancel</ButtonLink>
      </div>
    </form>
  );
}
