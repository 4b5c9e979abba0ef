"use client";

import { useRef, useState } from "react";
import type { FactorPoint } from "@/lib/core/bench/signal-path";
import type { TableState, TransducerDraft } from "./transducer-draft";
import { emptyTransducer, tableInput } from "./transducer-draft";

const TYPING_PAUSE_MS = 400;

export type ReadTable = (
  input: unknown,
) => Promise<
  | { ok: true; data: { ok: true; factors: FactorPoint[] } | { ok: false; message: string } }
  | { ok: false; message: string }
>;

async function readDraft(read: ReadTable, draft: TransducerDraft): Promise<TableState> {
  try {
    const outcome = await read(tableInput(draft));
    if (!outcome.ok) return { state: "unreadable", message: outcome.message };
    if (outcome.data.ok) return { state: "read", factors: outcome.data.factors };
    return { state: "unreadable", message: outcome.data.message };
  } catch {
    return { state: "unreadable", message: "Neap could not be reached to read this table." };
  }
}

/** The transducers being edited; each table is read anew once its typing pauses. */
export function useTransducerDrafts(initial: readonly TransducerDraft[], read: ReadTable) {
  const [drafts, setDrafts] = useState(initial);
  const nextId = useRef(initial.length);
  const timers = useRef(new Map<number, ReturnType<typeof setTimeout>>());

  function patch(id: number, change: Partial<TransducerDraft>) {
    setDrafts((now) => now.map((d) => (d.id === id ? { ...d, ...change } : d)));
  }

  function changeTable(draft: TransducerDraft, change: Partial<TransducerDraft>) {
    const next = { ...draft, ...change };
    const isEmpty = next.text.trim() === "";
    patch(draft.id, { ...change, table: { state: isEmpty ? "empty" : "reading" } });
    clearTimeout(timers.current.get(draft.id));
    if (isEmpty) return;
    const work = async () => {
      const table = await readDraft(read, next);
      // An answer about a table that was changed meanwhile is out of date.
      setDrafts((now) =>
        now.map((d) =>
          d.id === next.id && d.text === next.text && d.unit === next.unit ? { ...d, table } : d,
        ),
      );
    };
    timers.current.set(
      draft.id,
      setTimeout(() => void work(), TYPING_PAUSE_MS),
    );
  }

  function add() {
    const id = nextId.current;
    nextId.current += 1;
    setDrafts((now) => [...now, emptyTransducer(id)]);
  }

  function move(id: number, by: -1 | 1) {
    setDrafts((now) => {
      const from = now.findIndex((d) => d.id === id);
      const to = from + by;
      const moved = now[from];
      const other = now[to];
      if (!moved || !other) return now;
      const next = [...now];
      next[from] = other;
      next[to] = moved;
      return next;
    });
  }

  const remove = (id: number) => setDrafts((now) => now.filter((d) => d.id !== id));

  return { drafts, patch, changeTable, add, move, remove };
}
