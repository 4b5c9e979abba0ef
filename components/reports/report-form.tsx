"use client";

import { useRouter } from "next/navigation";
import { StandingMark } from "@/components/readings/standing-mark";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { SelectField } from "@/components/ui/select-field";
import { TextArea } from "@/components/ui/text-area";
import { useActionForm } from "@/components/ui/use-action-form";
import { formatReportNumber } from "@/lib/core/report/report-number";
import type { Standing } from "@/lib/core/reading/reading";
import { formatMargin } from "@/lib/core/units/format";

type Outcome =
  | { ok: true; data: { reportId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

export interface ReportFormProps {
  about: { buildId: string } | { reportId: string };
  values: {
    title: string;
    summary: string;
    paper: "a4" | "letter";
    sweepIds: string[];
    ladderId: string | null;
    replacesId: string | null;
  };
  sweeps: {
    id: string;
    name: string;
    purpose: string;
    measuredOn: string | null;
    onRecord: boolean;
    standing: Standing | null;
    marginDb: number | null;
  }[];
  ladders: { id: string; name: string }[];
  issued: { id: string; number: number | null; title: string }[];
  action: (input: unknown) => Promise<Outcome>;
}

const PAPERS = [
  { value: "a4", label: "A4" },
  { value: "letter", label: "US Letter" },
];

/** What a report will speak of. Nothing is fixed before it is issued. */
export function ReportForm({ about, values, sweeps, ladders, issued, action }: ReportFormProps) {
  const router = useRouter();
  const form = useActionForm({
    action,
    read: (data): unknown => ({
      ...about,
      title: data.get("title"),
      summary: data.get("summary"),
      paper: data.get("paper"),
      sweepIds: data.getAll("sweepIds"),
      ladderId: data.get("ladderId") || null,
      replacesId: data.get("replacesId") || null,
    }),
    onDone: ({ reportId }) => router.push(`/reports/${reportId}`),
  });
  const { fieldErrors } = form;
  return (
    <form onSubmit={form.onSubmit} method="post">
      <ErrorNote message={form.message} />
      <div className="max-w-xl">
        <Field label="Title" name="title" defaultValue={values.title} error={fieldErrors.title} />
        <TextArea
          label="Summary in your own words"
          name="summary"
          hint="Stands on page one: what was tried, and what the lab should know."
          defaultValue={values.summary}
          error={fieldErrors.summary}
        />
      </div>
      <fieldset className="mb-5">
        <legend className="mb-2 font-medium">Sweeps</legend>
        {fieldErrors.sweepIds ? (
          <p className="mb-2 text-sm text-aground">{fieldErrors.sweepIds}</p>
        ) : null}
        <div className="max-w-4xl border border-rule bg-sheet">
          {sweeps.map((sweep) => (
            <label
              key={sweep.id}
              className="flex flex-wrap items-baseline gap-x-3 gap-y-0.5 border-b border-rule px-3 py-2 last:border-0"
            >
              <input
                type="checkbox"
                name="sweepIds"
                value={sweep.id}
                defaultChecked={values.sweepIds.includes(sweep.id)}
              />
              <span>{sweep.name}</span>
              <span className="text-sm text-ink-soft">
                {[
                  sweep.purpose === "product" ? null : sweep.purpose,
                  sweep.measuredOn,
                  sweep.onRecord ? "on the line of record" : null,
                ]
                  .filter(Boolean)
                  .join(" · ")}
              </span>
              {sweep.standing ? (
                <span className="ml-auto flex items-baseline gap-3">
                  <span className="font-mono">{formatMargin(sweep.marginDb)}</span>
                  <StandingMark standing={sweep.standing} />
                </span>
              ) : null}
            </label>
          ))}
          {sweeps.length === 0 ? (
            <p className="px-3 py-2 text-ink-soft">This build has no sweep yet.</p>
          ) : null}
        </div>
      </fieldset>
      <div className="grid max-w-3xl gap-x-5 sm:grid-cols-3">
        <SelectField
          label="Ladder"
          name="ladderId"
          defaultValue={values.ladderId ?? ""}
          error={fieldErrors.ladderId}
          options={[
            { value: "", label: "none" },
            ...ladders.map(({ id, name }) => ({ value: id, label: name })),
          ]}
        />
        <SelectField
          label="Replaces"
          name="replacesId"
          defaultValue={values.replacesId ?? ""}
          error={fieldErrors.replacesId}
          options={[
            { value: "", label: "no earlier report" },
            ...issued.map(({ id, number, title }) => ({
              value: id,
              label: `${number === null ? "" : formatReportNumber(number)} ${title}`,
            })),
          ]}
        />
        <SelectField
          label="Paper"
          name="paper"
          defaultValue={values.paper}
          error={fieldErrors.paper}
          options={PAPERS}
        />
      </div>
      <Button type="submit" disabled={form.pending}>
        Save draft
      </Button>
    </form>
  );
}
