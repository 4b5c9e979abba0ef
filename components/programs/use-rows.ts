"use client";

import { useState } from "react";

export interface Row<T> {
  key: number;
  value: T;
}

/** Rows of a form that come and go. The keys outlive a removal, so what was typed stays in its row. */
export function useRows<T>(initial: T[]) {
  const [rows, setRows] = useState<Row<T>[]>(() => initial.map((value, key) => ({ key, value })));
  const [nextKey, setNextKey] = useState(initial.length);
  /** Keys of the rows as they were sent: the server's errors name rows by their place then. */
  const [sent, setSent] = useState<number[]>([]);

  return {
    rows,
    add: (value: T) => {
      setRows([...rows, { key: nextKey, value }]);
      setNextKey(nextKey + 1);
    },
    remove: (key: number) => setRows(rows.filter((row) => row.key !== key)),
    markSent: () => setSent(rows.map((row) => row.key)),
    /** The error of one field of a row, wherever that row stands by now. */
    errorOf: (errors: Record<string, string>, list: string, key: number, field: string) => {
      const place = sent.indexOf(key);
      return place < 0 ? undefined : errors[`${list}.${place}.${field}`];
    },
  };
}
