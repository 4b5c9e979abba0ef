"use client";

import type { ColumnDef, SortingState } from "@tanstack/react-table";
import {
  createSortedRowModel,
  rowSortingFeature,
  sortFns,
  tableFeatures,
  useTable,
} from "@tanstack/react-table";
import type { ReactNode } from "react";
import { useMemo, useState } from "react";
import { toDelimited } from "./to-delimited";

export interface DataColumn<T> {
  id: string;
  header: string;
  /** Head of the column in a copy or a file, where the unit is not in the cells; else `header`. */
  exportHeader?: string;
  align?: "left" | "right";
  mono?: boolean;
  /** What is sorted, copied and exported; null sorts last. */
  value: (row: T) => string | number | null;
  /** What is shown; the value itself when left out. */
  cell?: (row: T) => ReactNode;
}

interface DataTableProps<T> {
  label: string;
  columns: DataColumn<T>[];
  rows: T[];
  rowKey: (row: T) => string;
  /** Name of the CSV file; without it the table cannot be exported. */
  exportName?: string;
  highlighted?: string | null;
  onHighlight?: (key: string | null) => void;
}

const features = tableFeatures({
  rowSortingFeature,
  sortedRowModel: createSortedRowModel(),
  sortFns,
});

/** A table that sorts by its heads, copies as TSV and exports as CSV in the order shown. */
export function DataTable<T extends object>(props: DataTableProps<T>) {
  const { label, columns, rows, rowKey, exportName, highlighted, onHighlight } = props;
  const [sorting, setSorting] = useState<SortingState>([]);
  const [copied, setCopied] = useState(false);
  const definitions = useMemo(
    () =>
      columns.map((column): ColumnDef<typeof features, T> => ({
        id: column.id,
        header: column.header,
        accessorFn: (row) => column.value(row) ?? undefined,
        sortUndefined: "last",
      })),
    [columns],
  );
  const table = useTable({
    features,
    columns: definitions,
    data: rows,
    state: { sorting },
    onSortingChange: setSorting,
  });
  const shown = table.getRowModel().rows.map((row) => row.original);
  const delimited = (by: string) =>
    toDelimited(
      [
        columns.map((c) => c.exportHeader ?? c.header),
        ...shown.map((row) => columns.map((c) => c.value(row))),
      ],
      by,
    );

  async function copy() {
    await navigator.clipboard.writeText(delimited("\t"));
    setCopied(true);
    setTimeout(() => setCopied(false), 2000);
  }

  return (
    <div>
      {exportName && rows.length > 0 ? (
        <div className="mb-2 flex justify-end gap-4 text-sm print:hidden">
          <button type="button" onClick={copy} className="cursor-pointer text-deep underline">
            {copied ? "Copied" : "Copy table"}
          </button>
          <a
            href={`data:text/csv;charset=utf-8,${encodeURIComponent(delimited(","))}`}
            download={`${exportName}.csv`}
            className="text-deep underline"
          >
            Save as CSV
          </a>
        </div>
      ) : null}
      <div
        className="overflow-x-auto border border-rule bg-sheet"
        tabIndex={0}
        role="region"
        aria-label={label}
      >
        <table className="w-full text-left">
          <thead className="text-sm text-ink-soft">
            <tr className="border-b border-rule">
              {table.getHeaderGroups()[0]?.headers.map((header, i) => {
                const sorted = header.column.getIsSorted();
                return (
                  <th
                    key={header.id}
                    aria-sort={
                      sorted === "asc" ? "ascending" : sorted === "desc" ? "descending" : "none"
                    }
                    className={`px-3 py-1 font-medium ${columns[i]?.align === "right" ? "text-right" : ""}`}
                  >
                    <button
                      type="button"
                      onClick={header.column.getToggleSortingHandler()}
                      className={`cursor-pointer py-1 tracking-[inherit] hover:text-ink ${(columns[i]?.header.length ?? 0) > 14 ? "text-[inherit] [text-align:inherit]" : "whitespace-nowrap"}`}
                    >
                      {columns[i]?.align === "right" ? <SortMark sorted={sorted} /> : null}
                      {columns[i]?.header}
                      {columns[i]?.align === "right" ? null : <SortMark sorted={sorted} />}
                    </button>
                  </th>
                );
              })}
            </tr>
          </thead>
          <tbody>
            {shown.map((row) => {
              const key = rowKey(row);
              return (
                <tr
                  key={key}
                  onMouseEnter={() => onHighlight?.(key)}
                  onMouseLeave={() => onHighlight?.(null)}
                  className={`border-b border-rule last:border-0 ${highlighted === key ? "bg-water-1" : ""}`}
                >
                  {columns.map((column) => (
                    <td
                      key={column.id}
                      className={`px-3 py-2 ${column.align === "right" ? "text-right" : ""} ${column.mono ? "font-mono whitespace-nowrap" : ""}`}
                    >
                      {column.cell ? column.cell(row) : column.value(row)}
                    </td>
                  ))}
                </tr>
              );
            })}
          </tbody>
        </table>
      </div>
    </div>
  );
}

/** Drawn, because none of the shipped fonts has these signs. */
function SortMark({ sorted }: { sorted: false | "asc" | "desc" }) {
  return (
    <svg aria-hidden width="8" height="8" viewBox="0 0 8 8" className="mx-1 inline-block">
      {sorted ? (
        <path d={sorted === "asc" ? "M0 6 L4 1 L8 6 Z" : "M0 2 L4 7 L8 2 Z"} fill="currentColor" />
      ) : null}
    </svg>
  );
}
