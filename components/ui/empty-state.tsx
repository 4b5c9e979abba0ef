import type { ReactNode } from "react";

/** Nothing here yet, and what makes the first one. */
export function EmptyState({ children }: { children: ReactNode }) {
  return (
    <div className="border border-dashed border-ink-soft/50 p-8 text-ink-soft">{children}</div>
  );
}
