import type { ReactNode } from "react";

/** Stands where a chart will be once there is something to draw. */
export function EmptyPlot({ height, children }: { height: number; children: ReactNode }) {
  return (
    <div
      className="flex items-center justify-center border border-rule bg-sheet px-6 text-center text-ink-soft"
      style={{ height }}
    >
      <p>{children}</p>
    </div>
  );
}
