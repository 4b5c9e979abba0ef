"use client";

import { useRef, useState } from "react";
import type { SweepFileAnswers } from "@/lib/formats/sweep-file";
import type { DeskFile, DeskPreview, Outcome, StoredSweep } from "./desk-file";
import { newDeskFile, withPreview } from "./desk-file";
import { LINK_FIELDS, MEASUREMENT_FIELDS } from "./tag-fields";
import type { TagDraft } from "./tags";
import { readDraft, toLink, toSettings } from "./tags";

export interface DeskPlace {
  buildId: string;
  stepId: string | null;
  benchId: string;
}

export interface DeskActions {
  preview: (form: FormData) => Promise<Outcome<DeskPreview>>;
  store: (form: FormData) => Promise<Outcome<StoredSweep>>;
}

const UNREACHED = "Neap could not be reached; nothing was stored. Check the connection.";

function toForm(file: File, said: unknown): FormData {
  const form = new FormData();
  form.set("file", file);
  form.set("said", JSON.stringify(said));
  return form;
}

/** Errors of a refused import by where they stand: the file's own fields or those of all files. */
function sortErrors(fieldErrors: Record<string, string>) {
  const own: Record<string, string> = {};
  const link: Record<string, string> = {};
  for (const [path, text] of Object.entries(fieldErrors)) {
    if (path.startsWith("link.")) link[path.slice("link.".length)] = text;
    else own[path.replace(/^settings\./, "")] = text;
  }
  return { own, link };
}

/** The files on the import page and what can be done with them. */
export function useImportDesk(
  actions: DeskActions,
  defaults: Pick<DeskFile, "corrected" | "onRecord">,
) {
  const [files, setFiles] = useState<DeskFile[]>([]);
  const [linkErrors, setLinkErrors] = useState<Record<string, string>>({});
  const counter = useRef(0);

  const patch = (key: string, change: (file: DeskFile) => DeskFile) =>
    setFiles((all) => all.map((file) => (file.key === key ? change(file) : file)));

  async function look(file: DeskFile, answers: SweepFileAnswers) {
    try {
      const outcome = await actions.preview(toForm(file.file, { answers }));
      patch(file.key, (now) =>
        outcome.ok
          ? withPreview({ ...now, answers }, outcome.data)
          : {
              ...now,
              state: "refused",
              message: outcome.fieldErrors.bytes ?? outcome.message,
            },
      );
    } catch {
      patch(file.key, (now) => ({ ...now, state: "refused", message: UNREACHED }));
    }
  }

  async function add(dropped: File[]) {
    const fresh = dropped.map((file) => {
      counter.current += 1;
      return newDeskFile(file, String(counter.current), defaults);
    });
    setFiles((all) => [...all, ...fresh]);
    for (const file of fresh) if (file.state === "reading") await look(file, {});
  }

  async function store(file: DeskFile, place: DeskPlace, common: TagDraft, link: TagDraft) {
    const measured = readDraft(MEASUREMENT_FIELDS, { ...common, ...withoutEmpty(file.own) });
    const linked = readDraft(LINK_FIELDS, link);
    setLinkErrors(linked.errors);
    const unread = { ...measured.errors, ...linked.errors };
    if (Object.keys(unread).length > 0) {
      const message = "Some settings cannot be read; nothing was stored.";
      patch(file.key, (now) => ({ ...now, message, errors: measured.errors }));
      return false;
    }
    patch(file.key, (now) => ({ ...now, state: "storing", message: null, errors: {} }));
    const said = {
      ...place,
      answers: file.answers,
      name: file.name,
      purpose: file.purpose,
      measuredOn: file.measuredOn || null,
      corrected: file.corrected,
      onRecord: file.onRecord,
      notes: file.notes,
      again: file.again,
      settings: toSettings(measured.values),
      link: toLink(linked.values),
    };
    try {
      const outcome = await actions.store(toForm(file.file, said));
      if (outcome.ok) {
        patch(file.key, (now) => ({ ...now, state: "stored", stored: outcome.data }));
        return true;
      }
      const { own, link: refused } = sortErrors(outcome.fieldErrors);
      setLinkErrors(refused);
      const message = own.file ?? outcome.message;
      patch(file.key, (now) => ({ ...now, state: "ready", message, errors: own }));
    } catch {
      patch(file.key, (now) => ({ ...now, state: "ready", message: UNREACHED }));
    }
    return false;
  }

  return {
    files,
    linkErrors,
    add: (dropped: File[]) => void add(dropped),
    change: (key: string, part: Partial<DeskFile>) => patch(key, (file) => ({ ...file, ...part })),
    answer: (file: DeskFile, answers: SweepFileAnswers) => {
      patch(file.key, (now) => ({ ...now, answers, state: "reading" }));
      void look(file, answers);
    },
    remove: (key: string) => setFiles((all) => all.filter((file) => file.key !== key)),
    store,
  };
}

/** An emptied field of one file goes back to what counts for all files. */
function withoutEmpty(draft: TagDraft): TagDraft {
  return Object.fromEntries(Object.entries(draft).filter(([, text]) => text.trim() !== ""));
}
