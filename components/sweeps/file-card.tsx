"use client";

import Link from "next/link";
import { StandingMark } from "@/components/readings/standing-mark";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { SelectField } from "@/components/ui/select-field";
import type { SweepFileAnswers } from "@/lib/formats/sweep-file";
import type { SweepPurpose } from "@/lib/core/sweep/settings";
import { SWEEP_PURPOSES } from "@/lib/core/sweep/settings";
import { formatMargin } from "@/lib/core/units/format";
import type { LevelUnit } from "@/lib/core/units/level-units";
import type { DeskFile } from "./desk-file";
import { FileContents } from "./file-contents";
import { FileQuestions } from "./file-questions";
import { isHereAlready } from "./is-here-already";
import { MEASUREMENT_FIELDS } from "./tag-fields";
import { TagInputs } from "./tag-inputs";
import type { TagDraft } from "./tags";

const STATES: Record<DeskFile["state"], string> = {
  reading: "reading …",
  asks: "asks",
  ready: "ready",
  refused: "refused",
  storing: "storing …",
  stored: "stored",
};

/** Levels in these exist only after an antenna's factor was applied. */
const FIELD_UNITS: ReadonlySet<LevelUnit> = new Set(["dBuV/m", "dBuA/m", "dBpT"]);

interface FileCardProps {
  file: DeskFile;
  common: TagDraft;
  onChange: (part: Partial<DeskFile>) => void;
  onAnswer: (answers: SweepFileAnswers) => void;
  /** How many other files ask the same, and the answers for them. */
  alike: number;
  onAnswerAlike: (answers: SweepFileAnswers) => void;
  onRemove: () => void;
}

/** One file: what is in it, what it leaves open, how it will be stored, what became of it. */
export function FileCard(props: FileCardProps) {
  const { file, common, onChange, onRemove } = props;
  // A file that could be stored and was not says so until it is tried again.
  const isStopped = file.state === "refused" || (file.state === "ready" && file.message !== null);
  const busy = file.state === "reading" || file.state === "storing";
  return (
    <article className="border border-rule bg-sheet p-4" aria-label={file.file.name}>
      <div className="mb-3 flex flex-wrap items-baseline gap-x-4 gap-y-1">
        <h3 className="min-w-0 font-mono text-base break-all">{file.file.name}</h3>
        <span role="status" className={isStopped ? "text-aground" : "text-ink-soft"}>
          {file.state !== "ready"
            ? STATES[file.state]
            : isStopped
              ? "not stored"
              : isHereAlready(file)
                ? "here already"
                : STATES.ready}
        </span>
        {file.state === "stored" || busy ? null : (
          <button
            type="button"
            onClick={onRemove}
            className="ml-auto cursor-pointer text-sm text-deep underline"
          >
            Take off the list
          </button>
        )}
      </div>
      {file.message && !file.errors.corrected ? (
        <p role="alert" className="mb-3 max-w-none border-l-4 border-aground bg-paper px-3 py-2">
          {file.message}
        </p>
      ) : null}
      {file.stored ? <StoredLine file={file} /> : null}
      {file.preview && file.preview.traces.length > 0 && file.state !== "stored" ? (
        <>
          <FileContents preview={file.preview} />
          <FileQuestions
            file={file}
            alike={props.alike}
            onAnswer={props.onAnswer}
            onAnswerAlike={props.onAnswerAlike}
          />
          <SameFileNote file={file} onChange={onChange} />
          <OwnFields file={file} common={common} onChange={onChange} />
        </>
      ) : null}
    </article>
  );
}

function StoredLine({ file }: { file: DeskFile }) {
  const { stored } = file;
  if (!stored) return null;
  return (
    <div className="flex flex-wrap items-baseline gap-x-6 gap-y-2">
      <Link href={`/sweeps/${stored.sweepId}`} className="font-medium text-deep underline">
        {stored.name}
      </Link>
      {stored.readings.map((reading) => (
        <span key={reading.maskTitle} className="inline-flex flex-wrap items-baseline gap-x-2">
          <span className="font-mono text-lg">{formatMargin(reading.marginDb)}</span>
          <StandingMark standing={reading.standing} />
          <span className="text-sm text-ink-soft">{reading.maskTitle}</span>
        </span>
      ))}
      {stored.readings.length === 0 ? (
        <span className="text-ink-soft">
          {file.purpose === "product"
            ? "No mask of the program fits its port, unit and distance."
            : "Kept beside the product's sweeps; not held against a mask."}
        </span>
      ) : null}
    </div>
  );
}

function SameFileNote({ file, onChange }: Pick<FileCardProps, "file" | "onChange">) {
  const [same] = file.preview?.same ?? [];
  if (!same) return null;
  return (
    <div className="mb-4 border-l-4 border-shoal bg-shoal-bed px-3 py-2">
      <p>
        The same bytes are here already, as{" "}
        <Link href={`/sweeps/${same.sweepId}`} className="text-deep underline">
          {same.name}
        </Link>{" "}
        on {same.programName} {same.buildName}.
      </p>
      <label className="mt-1 flex items-center gap-2">
        <input
          type="checkbox"
          checked={file.again}
          onChange={(event) => onChange({ again: event.target.checked })}
        />
        Import them once more all the same
      </label>
    </div>
  );
}

function OwnFields({
  file,
  common,
  onChange,
}: Pick<FileCardProps, "file" | "common" | "onChange">) {
  const { errors } = file;
  const isField = file.preview?.traces.some(({ unit }) => unit !== null && FIELD_UNITS.has(unit));
  const stated = MEASUREMENT_FIELDS.filter(({ path }) => file.stated.includes(path)).map(
    ({ path, label }) => `${label} ${file.own[path] || "as for all files"}`,
  );
  return (
    <>
      <div className="grid gap-x-5 sm:grid-cols-2 lg:grid-cols-4">
        <Field
          label="Name of the sweep"
          value={file.name}
          error={errors.name}
          onChange={(event) => onChange({ name: event.target.value })}
        />
        <SelectField
          label="Purpose"
          value={file.purpose}
          error={errors.purpose}
          options={SWEEP_PURPOSES.map((value) => ({ value, label: value }))}
          onChange={(event) => onChange({ purpose: event.target.value as SweepPurpose })}
        />
        <Field
          label="Measured on"
          type="date"
          value={file.measuredOn}
          error={errors.measuredOn}
          onChange={(event) => onChange({ measuredOn: event.target.value })}
        />
        <Field
          label="Notes"
          value={file.notes}
          error={errors.notes}
          onChange={(event) => onChange({ notes: event.target.value })}
        />
      </div>
      <div className="mb-3 flex flex-wrap gap-x-8 gap-y-2">
        <label className="flex items-center gap-2">
          <input
            type="checkbox"
            checked={file.corrected}
            onChange={(event) => onChange({ corrected: event.target.checked })}
          />
          Factors were applied in the instrument: levels pass through unchanged
        </label>
        <label className="flex items-center gap-2">
          <input
            type="checkbox"
            checked={file.onRecord && file.purpose === "product"}
            disabled={file.purpose !== "product"}
            onChange={(event) => onChange({ onRecord: event.target.checked })}
          />
          Counts for the trend of the build
        </label>
      </div>
      {isField && !file.corrected && !errors.corrected ? (
        <p className="mb-3 max-w-none border-l-4 border-shoal bg-shoal-bed px-3 py-1.5 text-sm">
          The file holds field strengths, not levels at the instrument&apos;s input: tick that
          factors were applied, or answer its unit again.
        </p>
      ) : null}
      {errors.corrected ? (
        <p role="alert" className="mb-3 text-sm text-aground">
          {errors.corrected}
        </p>
      ) : null}
      <details
        open={MEASUREMENT_FIELDS.some(({ path }) => errors[path]) || undefined}
        className="border-t border-rule pt-2"
      >
        <summary className="mb-3 cursor-pointer">
          <span className="text-deep underline">Settings of this file alone</span>
          <span className="ml-3 text-sm text-ink-soft">
            {stated.length > 0
              ? `From the file: ${stated.join(", ")}.`
              : "The file states none; those of all files count."}
          </span>
        </summary>
        <TagInputs
          fields={MEASUREMENT_FIELDS}
          draft={file.own}
          errors={errors}
          inherited={common}
          onChange={(path, text) => onChange({ own: { ...file.own, [path]: text } })}
        />
      </details>
    </>
  );
}

/** The button that stores what is ready, with how many that are. */
export function StoreButton({ count, onStore }: { count: number; onStore: () => void }) {
  return (
    <Button onClick={onStore} disabled={count === 0}>
      {count === 1 ? "Store 1 sweep" : `Store ${count} sweeps`}
    </Button>
  );
}
