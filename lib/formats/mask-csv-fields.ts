import { PROVENANCES, type Provenance } from "@/lib/core/mask/mask";
import type { DelimitedRow } from "@/lib/core/mask/delimited-rows";
import { PORTS, type Port } from "@/lib/core/sweep/settings";
import { LEVEL_UNITS, type LevelUnit } from "@/lib/core/units/level-units";
import { parseUnit } from "@/lib/core/units/parse-unit";
import { MASK_CSV_MARK, unmarked } from "./mask-csv";
import { parseNumber } from "./parse-number";

/** What a person says about a CSV that does not say it itself. */
export interface MaskCsvAnswers {
  title?: string | undefined;
  port?: Port | undefined;
  unit?: LevelUnit | undefined;
  provenance?: Provenance | undefined;
  frequencyUnit?: "Hz" | "kHz" | "MHz" | "GHz" | undefined;
}

/** `line` is that of the text, from 1; a problem of the whole file names the answer it waits for. */
export interface MaskCsvProblem {
  line: number | null;
  field: "text" | keyof MaskCsvAnswers;
  text: string;
}

export interface MaskFields {
  key: string;
  title: string;
  port: Port | null;
  unit: LevelUnit | null;
  distanceM: number | null;
  document: string;
  clause: string;
  edition: string;
  provenance: Provenance | null;
  note: string;
  /** Line of each field that the file states. */
  lineOf: Map<string, number>;
  problems: MaskCsvProblem[];
}

const NAMES = [
  "key",
  "title",
  "port",
  "unit",
  "distance",
  "document",
  "clause",
  "edition",
  "provenance",
  "note",
];

/** A level unit of a mask, in any spelling; linear units and relative dB are none. */
export function maskUnitOf(text: string): LevelUnit | null {
  const unit = parseUnit(text);
  return LEVEL_UNITS.find((known) => known === unit && known !== "dB") ?? null;
}

/** The rows above the segment table: a name and a value each. */
export function readMaskFields(rows: readonly DelimitedRow[]): MaskFields {
  const said = new Map<string, string>();
  const lineOf = new Map<string, number>();
  const problems: MaskCsvProblem[] = [];
  const note = (line: number, text: string) => problems.push({ line, field: "text", text });
  for (const { line, cells } of rows) {
    const [head = "", value = "", ...more] = cells;
    const name = head.trim().toLowerCase();
    if (name === MASK_CSV_MARK.toLowerCase()) {
      if (value !== "1")
        note(line, `this layout has the version "${value}"; version 1 can be read.`);
      continue;
    }
    // A note in the file, and not a field of the mask.
    if (name.startsWith("#")) continue;
    const field = NAMES.find((known) => known === name.replace(/\s*[[(].*$/, ""));
    if (field === undefined)
      note(line, `"${head}" is no field of a mask; a note of your own starts with #.`);
    else if (more.some((cell) => cell !== ""))
      note(line, `"${head}" has more than one value: put a value with a delimiter in quotes.`);
    else if (said.has(field)) note(line, `"${head}" stands in line ${lineOf.get(field)} already.`);
    else {
      said.set(field, unmarked(value));
      lineOf.set(field, line);
      if (field === "distance" && /[[(]/.test(name) && !/[[(]\s*m\s*[\])]/.test(name))
        note(line, "the distance is read in m: write distance (m).");
    }
  }
  const value = (name: string) => said.get(name) ?? "";
  const typed = (name: string) => value(name).trim().toLowerCase();
  const lineAt = (name: string) => lineOf.get(name) ?? 1;
  const port = PORTS.find((known) => known === typed("port").replace(/\s+/g, "-")) ?? null;
  if (typed("port") !== "" && port === null)
    note(lineAt("port"), `the port must be one of ${PORTS.join(", ")}.`);
  const provenance = PROVENANCES.find((known) => known === typed("provenance")) ?? null;
  if (typed("provenance") !== "" && provenance === null)
    note(lineAt("provenance"), `the provenance must be one of ${PROVENANCES.join(", ")}.`);
  const unit = maskUnitOf(value("unit"));
  if (typed("unit") !== "" && unit === null)
    note(lineAt("unit"), `"${value("unit")}" is no unit of a limit.`);
  const distanceText = value("distance").trim().replace(/\s*m$/i, "");
  const distanceM =
    distanceText === "" ? null : (parseNumber(distanceText, ".") ?? parseNumber(distanceText, ","));
  if (distanceText !== "" && distanceM === null)
    note(lineAt("distance"), `"${value("distance")}" is no distance in m.`);
  return {
    key: value("key"),
    title: value("title"),
    port,
    unit,
    distanceM,
    document: value("document"),
    clause: value("clause"),
    edition: value("edition"),
    provenance,
    note: value("note"),
    lineOf,
    problems,
  };
}
