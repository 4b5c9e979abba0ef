"use client";

import Link from "next/link";
import { useState } from "react";
import { DropZone } from "@/components/ui/drop-zone";
import { Section } from "@/components/ui/section";
import { SelectField } from "@/components/ui/select-field";
import { StatusNote } from "@/components/ui/status-note";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import type { DeskFile } from "./desk-file";
import { asksAlike } from "./file-answers";
import { FileCard, StoreButton } from "./file-card";
import { isHereAlready } from "./is-here-already";
import { LINK_FIELDS, MEASUREMENT_FIELDS } from "./tag-fields";
import { TagInputs } from "./tag-inputs";
import type { TagDraft } from "./tags";
import { toDraft } from "./tags";
import type { DeskActions } from "./use-import-desk";
import { useImportDesk } from "./use-import-desk";

export interface ImportDeskProps {
  buildId: string;
  stepId: string | null;
  steps: { id: string; name: string; position: number; ladderName: string }[];
  benches: { id: string; name: string; distanceM: number | null }[];
  last: {
    name: string;
    from: "step" | "build";
    benchId: string;
    corrected: boolean;
    settings: MeasurementSettings;
    link: LinkSettings;
  } | null;
  actions: DeskActions;
}

/** Where files become sweeps: place and tags for all of them, then each file by itself. */
export function ImportDesk({ buildId, steps, benches, last, actions, ...props }: ImportDeskProps) {
  const [stepId, setStepId] = useState(props.stepId);
  const [benchId, setBenchId] = useState(
    benches.find((bench) => bench.id === last?.benchId)?.id ??
      (benches.length === 1 ? (benches[0]?.id ?? "") : ""),
  );
  const [common, setCommon] = useState<TagDraft>(() =>
    last ? toDraft(MEASUREMENT_FIELDS, last.settings) : distanceOf(benches, benchId, {}),
  );
  const [link, setLink] = useState<TagDraft>(() => (last ? toDraft(LINK_FIELDS, last.link) : {}));
  const [note, setNote] = useState<string | null>(null);
  const desk = useImportDesk(actions, {
    corrected: last?.corrected ?? false,
    // A ladder's steps are tries; what counts is said on the ladder itself.
    onRecord: props.stepId === null,
  });
  const ready = desk.files.filter((file) => file.state === "ready" && !isHereAlready(file));
  const open = desk.files.filter((file) => file.state === "asks");

  async function storeAll() {
    setNote(null);
    let stored = 0;
    for (const file of ready) {
      if (await desk.store(file, { buildId, stepId, benchId }, common, link)) stored += 1;
    }
    const rest = ready.length - stored;
    const all = stored === 1 ? "1 sweep is stored." : `${stored} sweeps are stored.`;
    const some = `${stored} of ${ready.length} stored. What keeps the ${rest === 1 ? "other" : "others"} stands at each file.`;
    setNote(rest === 0 ? all : some);
  }

  if (benches.length === 0) {
    return (
      <p>
        A sweep is measured on a bench, and your team has none yet.{" "}
        <Link href="/benches/new" className="text-deep underline">
          Make the first bench
        </Link>
        , then come back with the files.
      </p>
    );
  }
  return (
    <>
      <div className="grid max-w-3xl gap-x-5 sm:grid-cols-2">
        <SelectField
          label="Step"
          value={stepId ?? ""}
          options={[
            { value: "", label: "none: the build as it is" },
            ...steps.map((step) => ({
              value: step.id,
              label: `${step.ladderName}, step ${step.position}: ${step.name}`,
            })),
          ]}
          onChange={(event) => setStepId(event.target.value || null)}
        />
        <SelectField
          label="Bench"
          value={benchId}
          options={[
            { value: "", label: "Choose…" },
            ...benches.map((bench) => ({ value: bench.id, label: bench.name })),
          ]}
          onChange={(event) => {
            setBenchId(event.target.value);
            setCommon((draft) => distanceOf(benches, event.target.value, draft));
          }}
        />
      </div>
      {last ? (
        <p className="mb-2 text-ink-soft">
          The settings below are those of {last.name}, the last import of this {last.from}. Check
          what has changed since.
        </p>
      ) : null}
      <details className="mb-3 border border-rule bg-sheet p-4" open={last === null || undefined}>
        <summary className="cursor-pointer font-medium">
          Measurement settings for all files
          <span className="ml-2 text-sm font-normal text-ink-soft">
            what a file states itself counts before these
          </span>
        </summary>
        <div className="mt-4">
          <TagInputs
            fields={MEASUREMENT_FIELDS}
            draft={common}
            errors={{}}
            onChange={(path, text) => setCommon({ ...common, [path]: text })}
          />
        </div>
      </details>
      <details
        className="mb-6 border border-rule bg-sheet p-4"
        open={last === null || Object.keys(desk.linkErrors).length > 0 || undefined}
      >
        <summary className="cursor-pointer font-medium">Link settings</summary>
        <div className="mt-4">
          <TagInputs
            fields={LINK_FIELDS}
            draft={link}
            errors={desk.linkErrors}
            onChange={(path, text) => setLink({ ...link, [path]: text })}
          />
        </div>
      </details>
      <DropZone
        label="Choose sweep files or drop them here"
        hint="CSV or text as the analyzer exports it, up to 60 MB each. Nothing is stored before you say so."
        onFiles={desk.add}
      />
      {desk.files.length > 0 ? (
        <Section
          title="Files"
          actions={
            <StoreButton count={benchId ? ready.length : 0} onStore={() => void storeAll()} />
          }
        >
          <StatusNote message={note} />
          {benchId ? null : (
            <p className="mb-3 text-shoal">Choose the bench first: its signal path is applied.</p>
          )}
          {open.length > 0 ? (
            <p className="mb-3 text-ink-soft">
              {open.length === 1
                ? "One file asks something before it can be stored."
                : `${open.length} files ask something before they can be stored.`}
            </p>
          ) : null}
          <div className="space-y-4">
            {desk.files.map((file) => (
              <FileCard
                key={file.key}
                file={file}
                common={common}
                onChange={(part) => desk.change(file.key, part)}
                onAnswer={(answers) => desk.answer(file, answers)}
                alike={alikeOf(file, open).length}
                onAnswerAlike={(answers) => {
                  for (const other of alikeOf(file, open))
                    desk.answer(other, { ...answers, ...other.answers });
                }}
                onRemove={() => desk.remove(file.key)}
              />
            ))}
          </div>
          {desk.files.length > 2 ? (
            <div className="mt-4 flex justify-end">
              <StoreButton count={benchId ? ready.length : 0} onStore={() => void storeAll()} />
            </div>
          ) : null}
        </Section>
      ) : null}
    </>
  );
}

/** The other files that leave the same open. */
function alikeOf(file: DeskFile, open: readonly DeskFile[]): DeskFile[] {
  const questionsOf = ({ preview }: DeskFile) => preview?.questions ?? [];
  return open.filter(
    (other) => other.key !== file.key && asksAlike(questionsOf(other), questionsOf(file)),
  );
}

/** The bench's own distance fills an empty field; a typed one stays. */
function distanceOf(
  benches: ImportDeskProps["benches"],
  benchId: string,
  draft: TagDraft,
): TagDraft {
  const distanceM = benches.find((bench) => bench.id === benchId)?.distanceM ?? null;
  return distanceM === null || draft.distanceM ? draft : { ...draft, distanceM: String(distanceM) };
}
