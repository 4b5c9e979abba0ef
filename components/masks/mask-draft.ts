import { readFrequency, writeFrequency } from "@/components/programs/read-frequency";
import { readNumber } from "@/components/ui/read-number";
import type { Interpolation, Mask, MaskSegment, Provenance } from "@/lib/core/mask/mask";
import type { BandwidthKind, Detector, Port } from "@/lib/core/sweep/settings";
import type { LevelUnit } from "@/lib/core/units/level-units";

/** A row of the segment table as it is typed. */
export interface SegmentDraft {
  id: number;
  start: string;
  stop: string;
  startDb: string;
  stopDb: string;
  interpolation: Interpolation;
}

export interface LineDraft {
  id: number;
  name: string;
  detector: Detector | "";
  rbw: string;
  rbwKind: BandwidthKind | "";
  segments: SegmentDraft[];
}

/** A mask as it is typed; what is left open is empty, never a guess. */
export interface MaskDraft {
  title: string;
  port: Port | "";
  unit: LevelUnit | "";
  distance: string;
  document: string;
  clause: string;
  edition: string;
  provenance: Provenance;
  note: string;
  /** Unit of frequencies that are typed as plain numbers, "MHz". */
  frequencyUnit: string;
  lines: LineDraft[];
}

export const FREQUENCY_UNITS = ["Hz", "kHz", "MHz", "GHz"] as const;

/** Hz of "30 MHz", or of "30" in the unit chosen; NaN when it is unclear. "1,000" is unclear. */
export function readCellFrequency(text: string, unit: string): number {
  if (/^\s*[1-9]\d{0,2},\d{3}(?!\d)/.test(text)) return Number.NaN;
  return readFrequency(/[a-z]/i.test(text) ? text : `${text} ${unit}`);
}

/** A frequency cell as it was understood: with its unit, so that it can be checked by eye. */
export function settleFrequency(text: string, unit: string): string {
  const hz = readCellFrequency(text, unit);
  return Number.isNaN(hz) ? text : writeFrequency(hz);
}

export function isBlankSegment(segment: SegmentDraft): boolean {
  return [segment.start, segment.stop, segment.startDb, segment.stopDb].every(
    (text) => text.trim() === "",
  );
}

/** A line that nobody has typed anything into. */
export function isBlankLine({ name, detector, rbw, segments }: LineDraft): boolean {
  return name.trim() === "" && detector === "" && rbw === "" && segments.every(isBlankSegment);
}

export function emptySegment(id: number, start = ""): SegmentDraft {
  return { id, start, stop: "", startDb: "", stopDb: "", interpolation: "log" };
}

function draftSegment(id: number, segment: MaskSegment): SegmentDraft {
  return {
    id,
    start: writeFrequency(segment.startHz),
    stop: writeFrequency(segment.stopHz),
    startDb: String(segment.startDb),
    stopDb: String(segment.stopDb),
    interpolation: segment.interpolation,
  };
}

/** A stored mask as a draft, every digit kept; `nextId` gives rows their identity on screen. */
export function draftMask(mask: Mask, nextId: () => number): MaskDraft {
  const { title, port, unit, document, clause, edition, provenance, note } = mask;
  return {
    title,
    port,
    unit,
    document,
    clause,
    edition,
    provenance,
    note,
    distance: mask.distanceM === null ? "" : String(mask.distanceM),
    frequencyUnit: "MHz",
    lines: mask.lines.map((line) => ({
      id: nextId(),
      name: line.name,
      detector: line.detector,
      rbw: line.rbwHz === null ? "" : writeFrequency(line.rbwHz),
      rbwKind: line.rbwKind ?? "",
      segments: line.segments.map((segment) => draftSegment(nextId(), segment)),
    })),
  };
}

export function emptyLine(nextId: () => number): LineDraft {
  return {
    id: nextId(),
    name: "",
    detector: "",
    rbw: "",
    rbwKind: "",
    segments: [emptySegment(nextId())],
  };
}

export function emptyMask(nextId: () => number): MaskDraft {
  return {
    title: "",
    port: "",
    unit: "",
    distance: "",
    document: "",
    clause: "",
    edition: "",
    provenance: "team",
    note: "",
    frequencyUnit: "MHz",
    lines: [emptyLine(nextId)],
  };
}

/** The draft as a mask; cells that cannot be read become NaN, choices left open their `open` value. */
export function maskOfDraft(draft: MaskDraft, open: { unit: LevelUnit; port: Port }): Mask {
  const { title, document, clause, edition, provenance, note, frequencyUnit } = draft;
  return {
    format: "neap-mask",
    version: 1,
    key: "",
    title: title.trim(),
    port: draft.port || open.port,
    unit: draft.unit || open.unit,
    distanceM: draft.distance.trim() === "" ? null : readNumber(draft.distance),
    document: document.trim(),
    clause: clause.trim(),
    edition: edition.trim(),
    provenance,
    note: note.trim(),
    lines: draft.lines.map((line) => ({
      name: line.name.trim(),
      detector: line.detector || "peak",
      rbwHz: line.rbw.trim() === "" ? null : readCellFrequency(line.rbw, "kHz"),
      rbwKind: line.rbwKind || null,
      segments: line.segments.map((segment) => ({
        startHz: readCellFrequency(segment.start, frequencyUnit),
        stopHz: readCellFrequency(segment.stop, frequencyUnit),
        startDb: readNumber(segment.startDb),
        stopDb: readNumber(segment.stopDb),
        interpolation: segment.interpolation,
      })),
    })),
  };
}
