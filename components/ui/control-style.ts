/** The one look of inputs, selects and text areas. */
export const CONTROL =
  "min-h-10 w-full rounded-sm border border-ink-soft bg-sheet px-3 aria-invalid:border-aground disabled:opacity-60";
