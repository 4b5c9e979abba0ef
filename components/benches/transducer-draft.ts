import type { FactorPoint, Transducer, TransducerKind } from "@/lib/core/bench/signal-path";
import { factorSpan } from "./factor-span";

/** What is known of a factor table while it is typed. */
export type TableState =
  | { state: "empty" }
  | { state: "reading" }
  | { state: "read"; factors: FactorPoint[] }
  | { state: "unreadable"; message: string };

/** A transducer as it is typed: everything is text until it is sent. */
export interface TransducerDraft {
  id: number;
  name: string;
  kind: TransducerKind | "";
  calibratedOn: string;
  dueOn: string;
  text: string;
  /** Hz per unit of the frequency column; empty when the table's header names it. */
  unit: string;
  table: TableState;
}

export const FREQUENCY_UNIT_OPTIONS = [
  { value: "", label: "as the header says" },
  { value: "1", label: "Hz" },
  { value: "1000", label: "kHz" },
  { value: "1000000", label: "MHz" },
  { value: "1000000000", label: "GHz" },
] as const;

export function emptyTransducer(id: number): TransducerDraft {
  return {
    id,
    name: "",
    kind: "",
    calibratedOn: "",
    dueOn: "",
    text: "",
    unit: "",
    table: { state: "empty" },
  };
}

/** A stored transducer as a draft; frequencies in Hz, so that no digit is lost on the way. */
export function draftTransducer(id: number, transducer: Transducer): TransducerDraft {
  return {
    id,
    name: transducer.name,
    kind: transducer.kind,
    calibratedOn: transducer.calibratedOn ?? "",
    dueOn: transducer.dueOn ?? "",
    text: transducer.factors.map((f) => `${f.frequencyHz}\t${f.factorDb}`).join("\n"),
    unit: "1",
    table: { state: "read", factors: transducer.factors },
  };
}

/** Text and unit as the command and the live reading take them. */
export function tableInput({ text, unit }: Pick<TransducerDraft, "text" | "unit">) {
  return { text, frequencyUnitHz: unit === "" ? null : Number(unit) };
}

/** What a draft sends. */
export function transducerInput(draft: TransducerDraft): unknown {
  return {
    name: draft.name,
    kind: draft.kind,
    calibratedOn: draft.calibratedOn || null,
    dueOn: draft.dueOn || null,
    table: tableInput(draft),
  };
}

/** What can be drawn of the drafts: those whose tables can be read and have two rows or more. */
export function drawableTransducers(drafts: readonly TransducerDraft[]): Transducer[] {
  return drafts.flatMap(({ name, kind, table }, i) =>
    kind !== "" && table.state === "read" && table.factors.length > 1
      ? [
          {
            name: name.trim() || `Transducer ${i + 1}`,
            kind,
            factors: table.factors,
            calibratedOn: null,
            dueOn: null,
          },
        ]
      : [],
  );
}

/** The live count under a table. */
export function tableWords(table: TableState): string {
  switch (table.state) {
    case "empty":
      return "No rows yet.";
    case "reading":
      return "Reading…";
    case "unreadable":
      return "";
    case "read":
      return table.factors.length === 1
        ? "1 row; at least two are needed."
        : `${table.factors.length} rows read, ${factorSpan(table.factors)}.`;
  }
}
