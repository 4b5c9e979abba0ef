import type { Standing } from "@/lib/core/reading/reading";
import { STANDING_LABELS } from "@/lib/core/reading/reading";

const TINT: Record<Standing, string> = {
  clear: "text-deep",
  "inside-guard": "text-shoal",
  over: "text-aground",
  undecided: "text-ink-soft",
};

/** Open ring, half-filled ring, solid diamond or dashed ring: never colour alone. */
export function StandingSign({ standing, size = 14 }: { standing: Standing; size?: number }) {
  return (
    <svg
      aria-hidden
      width={size}
      height={size}
      viewBox="0 0 14 14"
      className={`inline-block shrink-0 ${TINT[standing]}`}
    >
      {standing === "over" ? (
        <path d="M7 0.5 L13.5 7 L7 13.5 L0.5 7 Z" fill="currentColor" />
      ) : null}
      {standing === "inside-guard" ? (
        <path d="M7 1.5 A5.5 5.5 0 0 0 7 12.5 Z" fill="currentColor" />
      ) : null}
      {standing !== "over" ? (
        <circle
          cx="7"
          cy="7"
          r="5.5"
          fill="none"
          stroke="currentColor"
          strokeWidth="1.75"
          strokeDasharray={standing === "undecided" ? "2.6 2.2" : undefined}
        />
      ) : null}
    </svg>
  );
}

/** The sign of a standing with its word. */
export function StandingMark({ standing, note }: { standing: Standing; note?: string }) {
  return (
    <span className="inline-flex items-center gap-1.5 whitespace-nowrap">
      <StandingSign standing={standing} />
      <span className={TINT[standing]}>{STANDING_LABELS[standing]}</span>
      {note ? <span className="text-ink-soft">{note}</span> : null}
    </span>
  );
}
