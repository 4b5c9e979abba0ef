"use client";

import type { ClipboardEvent, KeyboardEvent } from "react";
import { useId } from "react";
import { CONTROL } from "@/components/ui/control-style";
import { INTERPOLATIONS } from "@/lib/core/mask/mask";
import type { SegmentDraft } from "./mask-draft";
import { settleFrequency } from "./mask-draft";
import type { DraftProblem } from "./mask-problems";

const CELLS = [
  { key: "start", path: "startHz", label: "start frequency", isFrequency: true },
  { key: "stop", path: "stopHz", label: "end frequency", isFrequency: true },
  { key: "startDb", path: "startDb", label: "limit at start", isFrequency: false },
  { key: "stopDb", path: "stopDb", label: "limit at end", isFrequency: false },
] as const;

const SHORT_INTERPOLATION = { log: "log f", linear: "linear f" } as const;

interface SegmentRowProps {
  segment: SegmentDraft;
  place: number;
  /** Path of the row, "lines.0.segments.2". */
  at: string;
  lineName: string;
  frequencyUnit: string;
  problems: readonly DraftProblem[];
  onPatch: (change: Partial<Omit<SegmentDraft, "id">>) => void;
  onPaste: (text: string) => void;
  /** Enter in the last row. */
  onAdd: () => void;
  onDuplicate: () => void;
  onRemove: () => void;
}

/** One segment: four cells and its interpolation, with what is wrong in a line below. */
export function SegmentRow(props: SegmentRowProps) {
  const { segment, place, at, lineName, frequencyUnit, problems } = props;
  const problemId = useId();
  const called = `segment ${place + 1} of ${lineName}`;
  const describedBy = problems.length > 0 ? problemId : undefined;

  // A row that was just added is typed into next; a new mask's only row leaves the title first.
  const isFresh = place > 0 && segment.stop === "" && segment.startDb === "";
  const fresh = !isFresh ? null : segment.start === "" ? "start" : "stop";

  /** A cell takes one value; more than that is a table from a spreadsheet. */
  function paste(event: ClipboardEvent<HTMLInputElement>) {
    const text = event.clipboardData.getData("text");
    if (!/[\t\n]/.test(text.trim())) return;
    event.preventDefault();
    props.onPaste(text);
  }

  /** Enter belongs to the table here, not to the form: it must not save a mask by accident. */
  function press(event: KeyboardEvent<HTMLInputElement>, path: string) {
    if (event.key !== "Enter") return;
    event.preventDefault();
    const below = `${at.replace(/\d+$/, String(place + 1))}.${path}`;
    const cell = event.currentTarget.form?.elements.namedItem(below);
    if (cell instanceof HTMLElement) cell.focus();
    else props.onAdd();
  }

  function leave(cell: (typeof CELLS)[number]) {
    if (cell.isFrequency) {
      const settled = settleFrequency(segment[cell.key], frequencyUnit);
      if (settled !== segment[cell.key]) props.onPatch({ [cell.key]: settled });
    } else if (cell.key === "startDb" && segment.stopDb.trim() === "") {
      // Most segments are flat; the copied level stands there to be seen and changed.
      props.onPatch({ stopDb: segment.startDb });
    }
  }

  return (
    <>
      <tr>
        <td className="px-1 py-1 font-mono text-sm text-ink-soft">{place + 1}</td>
        {CELLS.map((cell) => (
          <td key={cell.key} className="px-1 py-1">
            <input
              name={`${at}.${cell.path}`}
              aria-label={`${cell.label}, ${called}`}
              aria-invalid={
                problems.some(({ path }) => path === at || path === `${at}.${cell.path}`)
                  ? true
                  : undefined
              }
              aria-describedby={describedBy}
              autoComplete="off"
              inputMode={cell.isFrequency ? "text" : "decimal"}
              className={`${CONTROL} px-2! text-right font-mono ${cell.isFrequency ? "min-w-26" : "min-w-18"}`}
              value={segment[cell.key]}
              onChange={(event) => props.onPatch({ [cell.key]: event.target.value })}
              onBlur={() => leave(cell)}
              onPaste={paste}
              onKeyDown={(event) => press(event, cell.path)}
              autoFocus={cell.key === fresh}
            />
          </td>
        ))}
        <td className="px-1 py-1">
          <select
            aria-label={`interpolation, ${called}`}
            className={`${CONTROL} min-w-22 px-1!`}
            value={segment.interpolation}
            onChange={(event) =>
              props.onPatch({
                interpolation: INTERPOLATIONS.find((i) => i === event.target.value) ?? "log",
              })
            }
          >
            {INTERPOLATIONS.map((value) => (
              <option key={value} value={value}>
                {SHORT_INTERPOLATION[value]}
              </option>
            ))}
          </select>
        </td>
        <td className="px-1 py-1 text-sm whitespace-nowrap">
          <RowButton label={`Duplicate ${called}`} onClick={props.onDuplicate}>
            Duplicate
          </RowButton>
          <RowButton label={`Remove ${called}`} onClick={props.onRemove}>
            Remove
          </RowButton>
        </td>
      </tr>
      {problems.length > 0 ? (
        <tr>
          <td />
          <td id={problemId} colSpan={6} className="px-1 pb-2 text-sm text-aground">
            {problems.map(({ text }) => text).join(" ")}
          </td>
        </tr>
      ) : null}
    </>
  );
}

function RowButton(props: { label: string; onClick: () => void; children: string }) {
  return (
    <button
      type="button"
      aria-label={props.label}
      onClick={props.onClick}
      className="min-h-6 cursor-pointer px-1 text-deep underline"
    >
      {props.children}
    </button>
  );
}
