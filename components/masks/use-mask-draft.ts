"use client";

import { useState } from "react";
import type { Mask } from "@/lib/core/mask/mask";
import type { LineDraft, MaskDraft, SegmentDraft } from "./mask-draft";
import type { LevelUnit } from "@/lib/core/units/level-units";
import {
  draftMask,
  emptyLine,
  emptyMask,
  emptySegment,
  isBlankLine,
  isBlankSegment,
} from "./mask-draft";
import type { PastedLine } from "./read-pasted-table";

interface Held {
  draft: MaskDraft;
  lastId: number;
}

/** Hands out ids inside one update, so that an update made twice gives the same ids. */
function counted(lastId: number, work: (nextId: () => number) => MaskDraft): Held {
  let last = lastId;
  const draft = work(() => {
    last += 1;
    return last;
  });
  return { draft, lastId: last };
}

export interface LineChanges {
  patch: (change: Partial<Omit<LineDraft, "id" | "segments">>) => void;
  patchSegment: (id: number, change: Partial<Omit<SegmentDraft, "id">>) => void;
  addSegment: () => void;
  duplicateSegment: (id: number) => void;
  removeSegment: (id: number) => void;
  /** Puts rows in at a row's place, instead of it when it is blank; at the end without a row. */
  insertSegments: (at: number | null, rows: Omit<SegmentDraft, "id">[]) => void;
  remove: () => void;
}

/** The mask being edited and everything that can be done to it. */
export function useMaskDraft(mask: Mask | null) {
  const [{ draft }, setHeld] = useState<Held>(() =>
    counted(0, (nextId) => (mask ? draftMask(mask, nextId) : emptyMask(nextId))),
  );
  const change = (work: (now: MaskDraft, nextId: () => number) => MaskDraft) =>
    setHeld((held) => counted(held.lastId, (nextId) => work(held.draft, nextId)));

  const patch = (part: Partial<Omit<MaskDraft, "lines">>) => change((now) => ({ ...now, ...part }));
  const addLine = () =>
    change((now, nextId) => ({ ...now, lines: [...now.lines, emptyLine(nextId)] }));

  /** Each pasted line becomes a line after those that are there; a blank one gives way. */
  const addPasted = (pasted: readonly PastedLine[], unit: LevelUnit | null) =>
    change((now, nextId) => ({
      ...now,
      unit: now.unit || (unit ?? ""),
      lines: [
        ...now.lines.filter((line) => !isBlankLine(line)),
        ...pasted.map(({ detector, rbw, name, rows }) => ({
          ...emptyLine(nextId),
          name,
          detector: detector ?? ("" as const),
          rbw,
          segments: rows.map((row) => ({ ...row, id: nextId() })),
        })),
      ],
    }));

  function changesOf(lineId: number): LineChanges {
    const onLine = (work: (line: LineDraft, nextId: () => number) => LineDraft) =>
      change((now, nextId) => ({
        ...now,
        lines: now.lines.map((line) => (line.id === lineId ? work(line, nextId) : line)),
      }));
    const onSegments = (work: (rows: SegmentDraft[], nextId: () => number) => SegmentDraft[]) =>
      onLine((line, nextId) => ({ ...line, segments: work(line.segments, nextId) }));
    return {
      patch: (part) => onLine((line) => ({ ...line, ...part })),
      patchSegment: (id, part) =>
        onSegments((rows) => rows.map((row) => (row.id === id ? { ...row, ...part } : row))),
      addSegment: () =>
        onSegments((rows, nextId) => [...rows, emptySegment(nextId(), rows.at(-1)?.stop)]),
      duplicateSegment: (id) =>
        onSegments((rows, nextId) =>
          rows.flatMap((row) => (row.id === id ? [row, { ...row, id: nextId() }] : [row])),
        ),
      removeSegment: (id) => onSegments((rows) => rows.filter((row) => row.id !== id)),
      insertSegments: (at, pasted) =>
        onSegments((rows, nextId) => {
          const fresh = pasted.map((row) => ({ ...row, id: nextId() }));
          const kept = at === null ? rows.filter((row) => !isBlankSegment(row)) : rows;
          if (at === null) return [...kept, ...fresh];
          return kept.flatMap((row) =>
            row.id !== at ? [row] : isBlankSegment(row) ? fresh : [...fresh, row],
          );
        }),
      remove: () =>
        change((now) => ({ ...now, lines: now.lines.filter((line) => line.id !== lineId) })),
    };
  }

  return { draft, patch, addLine, addPasted, changesOf };
}
