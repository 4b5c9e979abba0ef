import { readNumber } from "@/components/ui/read-number";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import {
  BIT_RATE_UNITS,
  FREQUENCY_UNITS,
  parseQuantity,
  TIME_UNITS,
  writeQuantity,
} from "@/lib/core/units/parse-quantity";
import type { TagField, TagKind } from "./tag-fields";

/** What stands in the inputs, by the path of its field; an empty text means: not stated. */
export type TagDraft = Record<string, string>;
export type TagErrors = Record<string, string>;

const UNITS = {
  frequency: FREQUENCY_UNITS,
  "bit-rate": BIT_RATE_UNITS,
  time: TIME_UNITS,
} as const;

const EXAMPLES: Partial<Record<TagKind, string>> = {
  frequency: "Write a number with its unit, for example 120 kHz.",
  "bit-rate": "Write a number with its unit, for example 3.2 Gb/s.",
  time: "Write a number with its unit, for example 100 ms.",
  number: "Write a number, or leave it empty.",
};

function readOne(kind: TagKind, text: string): unknown {
  switch (kind) {
    case "frequency":
    case "bit-rate":
    case "time":
      return parseQuantity(text, UNITS[kind]) ?? Number.NaN;
    case "number":
      return readNumber(text);
    case "flag":
      return text === "true";
    default:
      return text;
  }
}

/** Values by path, and a message at each field that cannot be read. */
export function readDraft(
  fields: readonly TagField[],
  draft: TagDraft,
): { values: Record<string, unknown>; errors: TagErrors } {
  const values: Record<string, unknown> = {};
  const errors: TagErrors = {};
  for (const { path, kind } of fields) {
    const text = (draft[path] ?? "").trim();
    const value = text === "" ? null : readOne(kind, text);
    if (Number.isNaN(value)) errors[path] = EXAMPLES[kind] ?? "This cannot be read.";
    else values[path] = value;
  }
  return { values, errors };
}

/** The command's `settings` from what was read; an unchosen port is left for the schema to refuse. */
export const toSettings = (values: Record<string, unknown>) => ({ ...values });

/** The command's `link` from what was read: the fields of a spread that is on, together. */
export function toLink(values: Record<string, unknown>): Record<string, unknown> {
  const link: Record<string, unknown> = {};
  const spread: Record<string, unknown> = {};
  for (const [path, value] of Object.entries(values)) {
    if (path.startsWith("spread.")) spread[path.slice("spread.".length)] = value;
    else link[path] = value;
  }
  const state = values.spreadOff;
  const isOff = state === "true" ? true : state === "false" ? false : null;
  return { ...link, spreadOff: isOff, spread: isOff === false ? spread : null };
}

function writeOne(kind: TagKind, value: unknown): string {
  if (value === null || value === undefined) return "";
  if (typeof value === "number" && (kind === "frequency" || kind === "bit-rate" || kind === "time"))
    return writeQuantity(value, UNITS[kind]);
  return String(value);
}

function valueAt(from: object, path: string): unknown {
  return path
    .split(".")
    .reduce<unknown>(
      (at, key) => (typeof at === "object" && at !== null ? Reflect.get(at, key) : undefined),
      from,
    );
}

/** The draft that would be read as these settings; what is not stated stays empty. */
export function toDraft(
  fields: readonly TagField[],
  from: Partial<MeasurementSettings> | LinkSettings,
): TagDraft {
  const draft: TagDraft = {};
  for (const { path, kind } of fields) {
    const text = writeOne(kind, valueAt(from, path));
    if (text !== "") draft[path] = text;
  }
  return draft;
}

/** How a field's value reads in a list, or null when it is not stated. */
export function showTag(field: TagField, from: MeasurementSettings | LinkSettings): string | null {
  const value = valueAt(from, field.path);
  if (field.kind === "flag" && value !== null) return value === true ? "on" : "off";
  const text = writeOne(field.kind, value);
  if (text === "") return null;
  return field.options?.find((option) => option.value === text)?.label ?? text;
}
