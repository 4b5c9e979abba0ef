import type { ReactNode } from "react";
import type { Standing } from "@/lib/core/reading/reading";
import { formatMargin } from "@/lib/core/units/format";
import { StandingMark } from "./standing-mark";

interface BigMarginProps {
  marginDb: number | null;
  standing: Standing;
  /** What the margin is of, in words. */
  children?: ReactNode;
}

/** The one large number of a page, with its standing. */
export function BigMargin({ marginDb, standing, children }: BigMarginProps) {
  return (
    <div>
      <div className="flex flex-wrap items-baseline gap-x-5 gap-y-1">
        <span className="font-mono text-5xl tracking-tight whitespace-nowrap">
          {formatMargin(marginDb)}
        </span>
        <span className="text-lg">
          <StandingMark standing={standing} />
        </span>
      </div>
      {children ? <p className="mt-1.5 text-ink-soft">{children}</p> : null}
    </div>
  );
}
