import { BANDWIDTH_KINDS, DETECTORS, PORTS } from "../sweep/settings";
import { LEVEL_UNITS } from "../units/level-units";
import { INTERPOLATIONS, PROVENANCES, type Mask, type MaskLine, type MaskSegment } from "./mask";
import { validateMask, type MaskProblem } from "./validate-mask";

export type MaskFromJson = { ok: true; mask: Mask } | { ok: false; problems: MaskProblem[] };

type Fields = Record<string, unknown>;

function isFields(value: unknown): value is Fields {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}

/** Reads typed fields out of unknown JSON and notes each one that does not fit. */
class FieldReader {
  readonly problems: MaskProblem[] = [];

  note(path: string, text: string): void {
    this.problems.push({ path, text });
  }

  text(from: Fields, key: string, at: string): string {
    const value = from[key];
    if (typeof value === "string") return value;
    this.note(at + key, `"${key}" must be text.`);
    return "";
  }

  number(from: Fields, key: string, at: string): number {
    const value = from[key];
    if (typeof value === "number" && Number.isFinite(value)) return value;
    this.note(at + key, `"${key}" must be a number.`);
    return Number.NaN;
  }

  numberOrNull(from: Fields, key: string, at: string): number | null {
    return from[key] === null ? null : this.number(from, key, at);
  }

  choice<T extends string>(from: Fields, key: string, at: string, choices: readonly T[]): T {
    const found = choices.find((choice) => choice === from[key]);
    if (found === undefined) {
      const isMissing = from[key] === undefined || from[key] === "";
      const what = isMissing ? "is missing: it must be" : "must be";
      this.note(at + key, `"${key}" ${what} one of ${choices.join(", ")}.`);
    }
    return found ?? (choices[0] as T);
  }

  list(from: Fields, key: string, at: string): Fields[] {
    const value = from[key];
    if (Array.isArray(value) && value.every(isFields)) return value;
    this.note(at + key, `"${key}" must be a list.`);
    return [];
  }
}

function readSegment(read: FieldReader, from: Fields, at: string): MaskSegment {
  return {
    startHz: read.number(from, "startHz", at),
    stopHz: read.number(from, "stopHz", at),
    startDb: read.number(from, "startDb", at),
    stopDb: read.number(from, "stopDb", at),
    interpolation: read.choice(from, "interpolation", at, INTERPOLATIONS),
  };
}

function readLine(read: FieldReader, from: Fields, at: string): MaskLine {
  return {
    name: read.text(from, "name", at),
    detector: read.choice(from, "detector", at, DETECTORS),
    rbwHz: read.numberOrNull(from, "rbwHz", at),
    rbwKind: from["rbwKind"] === null ? null : read.choice(from, "rbwKind", at, BANDWIDTH_KINDS),
    segments: read
      .list(from, "segments", at)
      .map((segment, i) => readSegment(read, segment, `${at}segments.${i}.`)),
  };
}

/** Mask from parsed JSON, or every problem with the path of its field. */
export function maskFromJson(json: unknown): MaskFromJson {
  if (!isFields(json) || json["format"] !== "neap-mask")
    return {
      ok: false,
      problems: [
        { path: "format", text: "This is not a mask file: its format must be neap-mask." },
      ],
    };
  if (json["version"] !== 1)
    return {
      ok: false,
      problems: [
        {
          path: "version",
          text: "This mask file has a version that is not known here; version 1 can be read.",
        },
      ],
    };
  const read = new FieldReader();
  const mask: Mask = {
    format: "neap-mask",
    version: 1,
    key: read.text(json, "key", ""),
    title: read.text(json, "title", ""),
    port: read.choice(json, "port", "", PORTS),
    unit: read.choice(json, "unit", "", LEVEL_UNITS),
    distanceM: read.numberOrNull(json, "distanceM", ""),
    document: read.text(json, "document", ""),
    clause: read.text(json, "clause", ""),
    edition: read.text(json, "edition", ""),
    provenance: read.choice(json, "provenance", "", PROVENANCES),
    note: read.text(json, "note", ""),
    lines: read.list(json, "lines", "").map((line, i) => readLine(read, line, `lines.${i}.`)),
  };
  const problems = read.problems.length > 0 ? read.problems : validateMask(mask);
  return problems.length > 0 ? { ok: false, problems } : { ok: true, mask };
}

/** Text of a mask file, two spaces deep, ending in a line feed. */
export function maskToJson(mask: Mask): string {
  return `${JSON.stringify(mask, null, 2)}\n`;
}
