import type { Standing } from "@/lib/core/reading/reading";

export const STANDING_COLOURS: Record<Standing, string> = {
  clear: "var(--deep)",
  "inside-guard": "var(--shoal)",
  over: "var(--aground)",
  undecided: "var(--ink-soft)",
};

/** The mark of a standing inside a chart, centred on (x, y): its shape tells it without colour. */
export function StandingMark(props: { standing: Standing; x: number; y: number; radius: number }) {
  const { standing, x, y, radius: r } = props;
  const colour = STANDING_COLOURS[standing];
  const strokeWidth = Math.max(1.25, r / 4);
  if (standing === "over") {
    const d = r * 1.25;
    return <path d={`M${x},${y - d}L${x + d},${y}L${x},${y + d}L${x - d},${y}Z`} fill={colour} />;
  }
  return (
    <g>
      <circle
        cx={x}
        cy={y}
        r={r}
        fill="var(--sheet)"
        stroke={colour}
        strokeWidth={strokeWidth}
        strokeDasharray={standing === "undecided" ? `${r * 0.6} ${r * 0.447}` : undefined}
      />
      {standing === "inside-guard" ? (
        <path d={`M${x - r},${y}A${r},${r} 0 0 0 ${x + r},${y}Z`} fill={colour} />
      ) : null}
    </g>
  );
}

/** The same mark for use in text; the word stands beside it, so it is silent for readers. */
export function StandingShape({ standing, size = 14 }: { standing: Standing; size?: number }) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 16 16"
      aria-hidden="true"
      className="inline-block shrink-0 align-[-0.125em]"
    >
      <StandingMark standing={standing} x={8} y={8} radius={standing === "over" ? 5.6 : 6} />
    </svg>
  );
}
