import type { MeasuredChange } from "@/lib/core/delta/delta";
import { formatDelta } from "@/lib/core/units/format";

interface DeltaValueProps {
  change: MeasuredChange;
  /** Which direction is the good one; for the eye only, the sign says it too. */
  better: "up" | "down";
}

/** A change with its arrow, drawn because the number's font has none, and its ± where known. */
export function DeltaValue({ change, better }: DeltaValueProps) {
  const { changeDb, uncertaintyDb, isWithinRepeatability } = change;
  if (changeDb === null) return <span className="text-ink-soft">no change known</span>;
  const rising = changeDb > 0;
  const good = changeDb === 0 || isWithinRepeatability ? null : rising === (better === "up");
  const tint = good === null ? "text-ink-soft" : good ? "text-deep" : "text-shoal";
  return (
    <span className={`inline-flex flex-wrap items-baseline gap-x-1.5 ${tint}`}>
      <span className="inline-flex items-baseline gap-1.5 whitespace-nowrap">
        {changeDb === 0 ? null : (
          <svg aria-hidden width="9" height="9" viewBox="0 0 9 9" className="self-center">
            <path
              d={rising ? "M4.5 1 L8.5 8 H0.5 Z" : "M4.5 8 L8.5 1 H0.5 Z"}
              fill="currentColor"
            />
          </svg>
        )}
        <span className="font-mono">
          {formatDelta(changeDb)}
          {uncertaintyDb === null ? "" : ` ± ${uncertaintyDb.toFixed(1)}`}
        </span>
      </span>
      {isWithinRepeatability ? <span className="text-sm">within repeatability</span> : null}
    </span>
  );
}
