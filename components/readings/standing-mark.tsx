import { StandingShape } from "@/components/charts/standing-shape";
import type { Standing } from "@/lib/core/reading/reading";
import { STANDING_LABELS } from "@/lib/core/reading/reading";

const TINT: Record<Standing, string> = {
  clear: "text-deep",
  "inside-guard": "text-shoal",
  over: "text-aground",
  undecided: "text-ink-soft",
};

/** The sign of a standing with its word. */
export function StandingMark({ standing, note }: { standing: Standing; note?: string }) {
  return (
    <span className="inline-flex items-center gap-1.5 whitespace-nowrap">
      <StandingShape standing={standing} />
      <span className={TINT[standing]}>{STANDING_LABELS[standing]}</span>
      {note ? <span className="text-ink-soft">{note}</span> : null}
    </span>
  );
}
