import type { SweepFileAnswers, SweepFilePreview } from "@/lib/formats/sweep-file";
import type { Standing } from "@/lib/core/reading/reading";
import type { SweepPurpose } from "@/lib/core/sweep/settings";
import { MEASUREMENT_FIELDS } from "./tag-fields";
import type { TagDraft, TagErrors } from "./tags";
import { toDraft } from "./tags";

export type Outcome<T> =
  { ok: true; data: T } | { ok: false; message: string; fieldErrors: Record<string, string> };

export interface DeskPreview extends SweepFilePreview {
  sha256: string;
  sizeBytes: number;
  same: { sweepId: string; name: string; buildName: string; programName: string }[];
}

export interface StoredSweep {
  sweepId: string;
  name: string;
  readings: { maskTitle: string; standing: Standing; marginDb: number | null }[];
}

/** One file on the import page, from being dropped to being stored or refused. */
export interface DeskFile {
  key: string;
  file: File;
  state: "reading" | "asks" | "ready" | "refused" | "storing" | "stored";
  preview: DeskPreview | null;
  answers: SweepFileAnswers;
  name: string;
  purpose: SweepPurpose;
  measuredOn: string;
  corrected: boolean;
  onRecord: boolean;
  notes: string;
  again: boolean;
  /** Measurement settings that differ from those of all files; what the file states is in it. */
  own: TagDraft;
  /** Paths of `own` that the file itself states. */
  stated: string[];
  message: string | null;
  errors: TagErrors;
  stored: StoredSweep | null;
}

export const MOST_BYTES = 60 * 1024 * 1024;

export function newDeskFile(
  file: File,
  key: string,
  defaults: Pick<DeskFile, "corrected" | "onRecord">,
): DeskFile {
  const tooLarge = file.size > MOST_BYTES;
  const message =
    file.size === 0
      ? "The file is empty."
      : tooLarge
        ? `The file has ${Math.ceil(file.size / 1024 / 1024)} MB and at most 60 MB can be read. Export fewer traces or a narrower span.`
        : null;
  return {
    key,
    file,
    state: message ? "refused" : "reading",
    preview: null,
    answers: {},
    name: file.name.replace(/\.[^.]+$/, ""),
    purpose: "product",
    measuredOn: "",
    ...defaults,
    notes: "",
    again: false,
    own: {},
    stated: [],
    message,
    errors: {},
    stored: null,
  };
}

/** The file with what was found in it. What the file states is not overwritten by a later look. */
export function withPreview(file: DeskFile, preview: DeskPreview): DeskFile {
  const { measuredOn, ...settings } = preview.settings;
  const stated = toDraft(MEASUREMENT_FIELDS, settings);
  const refused = preview.outcome === "refused";
  return {
    ...file,
    preview,
    state: refused ? "refused" : preview.outcome === "ask" ? "asks" : "ready",
    message: refused ? refusalOf(preview) : null,
    measuredOn: file.measuredOn || (measuredOn ?? ""),
    own: { ...stated, ...file.own },
    stated: Object.keys(stated),
  };
}

/** Why a file was refused, with its line, which most reasons name themselves. */
function refusalOf({ reason, line }: DeskPreview): string {
  const why = reason ?? "The file was not understood.";
  const isNamed = line === null || new RegExp(`\\bline ${line}\\b`, "i").test(why);
  return isNamed ? why : `Line ${line}: ${why}`;
}
