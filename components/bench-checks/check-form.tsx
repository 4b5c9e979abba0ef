"use client";

import { useRouter } from "next/navigation";
import type { FormEvent } from "react";
import { useState } from "react";
import { readFrequency, writeFrequency } from "@/components/programs/read-frequency";
import type { DeskPreview, Outcome } from "@/components/sweeps/desk-file";
import { FileContents } from "@/components/sweeps/file-contents";
import { FileQuestions } from "@/components/sweeps/file-questions";
import { Button, ButtonLink } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { FileField } from "@/components/ui/file-field";
import { SelectField } from "@/components/ui/select-field";
import { TextArea } from "@/components/ui/text-area";
import { CheckTick } from "./check-tick";
import { toCheckForm, useCheckFile } from "./use-check-file";

interface CheckFormProps {
  benchId: string;
  /** Sources that have an open reference on this bench. */
  sources: string[];
  /** ISO date. */
  today: string;
  preview: (form: FormData) => Promise<Outcome<DeskPreview>>;
  record: (form: FormData) => Promise<Outcome<{ checkId: string }>>;
}

/** Takes in one sweep of a known source; nothing is stored before the button says so. */
export function CheckForm({ benchId, sources, today, preview, record }: CheckFormProps) {
  const router = useRouter();
  const [source, setSource] = useState(sources[0] ?? "");
  const [measuredOn, setMeasuredOn] = useState(today);
  const [rbw, setRbw] = useState("");
  const [traceIndex, setTraceIndex] = useState("");
  const [corrected, setCorrected] = useState(false);
  const [isReference, setIsReference] = useState(sources.length === 0);
  const [notes, setNotes] = useState("");
  const [pending, setPending] = useState(false);
  const [refusal, setRefusal] = useState<{ message: string; errors: Record<string, string> }>();
  const { file, choose, answer } = useCheckFile(preview, (found) => {
    // What the file states stands before what was typed for an earlier one.
    if (found.rbwHz !== null) setRbw(writeFrequency(found.rbwHz));
    const { measuredOn: stated } = found.settings;
    if (stated) setMeasuredOn(stated);
  });
  const errors = refusal?.errors ?? {};
  const traces = file?.preview?.traces ?? [];
  const isReady = file?.state === "ready";

  async function onSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    if (!file || !isReady) return;
    setPending(true);
    setRefusal(undefined);
    try {
      const said = {
        benchId,
        answers: file.answers,
        traceIndex: traceIndex === "" ? null : Number(traceIndex),
        source,
        measuredOn,
        corrected,
        // What is no frequency travels as null, and the server says so at the field.
        rbwHz: readFrequency(rbw),
        isReference,
        notes,
      };
      const outcome = await record(toCheckForm(file.file, said));
      if (outcome.ok) return router.push(`/benches/${benchId}/checks/${outcome.data.checkId}`);
      setRefusal({ message: outcome.message, errors: outcome.fieldErrors });
    } catch {
      const message = "Neap could not be reached; nothing was stored. Check the connection.";
      setRefusal({ message, errors: {} });
    } finally {
      setPending(false);
    }
  }

  return (
    <form onSubmit={(event) => void onSubmit(event)} method="post" className="max-w-3xl">
      <FileField
        label="Sweep of the source"
        accept=".csv,.txt,.tsv,.dat,text/*"
        onFile={(chosen) => {
          setTraceIndex("");
          setRefusal(undefined);
          choose(chosen);
        }}
      />
      <div role="status" className="-mt-2 mb-4">
        {file ? (
          <>
            <span className="font-mono break-all">{file.file.name}</span>
            {file.state === "reading" ? (
              <span className="text-ink-soft"> is being read …</span>
            ) : null}
            {file.message ? <p className="text-aground">{file.message}</p> : null}
          </>
        ) : (
          <span className="text-sm text-ink-soft">
            CSV or text as the analyzer exports it, taken on this bench with the source in place of
            the product.
          </span>
        )}
        {errors.file || errors.bytes ? (
          <p className="text-aground">{errors.file ?? errors.bytes}</p>
        ) : null}
      </div>
      {file?.preview && traces.length > 0 ? (
        <>
          <FileContents preview={file.preview} />
          <FileQuestions file={file} alike={0} onAnswer={answer} onAnswerAlike={() => undefined} />
        </>
      ) : null}
      {traces.length > 1 ? (
        <SelectField
          label="Trace that is the check"
          value={traceIndex}
          error={errors.traceIndex}
          options={[
            { value: "", label: "Choose…" },
            ...traces.map(({ index, name }) => ({ value: String(index), label: name })),
          ]}
          onChange={(event) => setTraceIndex(event.target.value)}
        />
      ) : null}
      <div className="grid gap-x-5 sm:grid-cols-2">
        <Field
          label="Source"
          list="check-sources"
          value={source}
          error={errors.source}
          hint="What was swept, always by the same name: its checks are compared with each other."
          onChange={(event) => setSource(event.target.value)}
        />
        <datalist id="check-sources">
          {sources.map((known) => (
            <option key={known} value={known} />
          ))}
        </datalist>
        <Field
          label="Measured on"
          type="date"
          max={today}
          value={measuredOn}
          error={errors.measuredOn}
          onChange={(event) => setMeasuredOn(event.target.value)}
        />
        <Field
          label="RBW"
          value={rbw}
          error={errors.rbwHz}
          hint="With its unit, for instance 120 kHz; the reference's own."
          onChange={(event) => setRbw(event.target.value)}
        />
      </div>
      <div className="mb-4 space-y-2">
        <CheckTick
          label="The instrument applied the factors itself"
          checked={corrected}
          error={errors.corrected}
          onChange={setCorrected}
        />
        <CheckTick
          label="This is the reference that later checks are compared with"
          checked={isReference}
          hint={
            sources.length === 0
              ? "The bench has none yet, so the first sweep has to be one."
              : "Take a new one after a repair or a calibration, when the bench is known to be sound."
          }
          onChange={setIsReference}
        />
      </div>
      <TextArea
        label="Notes"
        value={notes}
        error={errors.notes}
        onChange={(event) => setNotes(event.target.value)}
      />
      {/* Beside the button: the head of a long form is out of sight when it is sent. */}
      <ErrorNote message={refusal?.message ?? null} />
      <div className="flex flex-wrap items-center gap-2">
        <Button type="submit" disabled={pending || !isReady}>
          {isReference ? "Record reference" : "Record check"}
        </Button>
        <ButtonLink href={`/benches/${benchId}/checks`}>Cancel</ButtonLink>
        {pending ? (
          <span role="status" className="text-sm text-ink-soft">
            The lines are being looked for …
          </span>
        ) : null}
        {isReady ? null : (
          <span className="text-sm text-ink-soft">
            {file?.state === "asks"
              ? "Answer what the file leaves open first."
              : "Choose a file first."}
          </span>
        )}
      </div>
    </form>
  );
}
