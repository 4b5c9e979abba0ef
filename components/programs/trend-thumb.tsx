import { StandingShape } from "@/components/charts/standing-shape";
import type { Standing } from "@/lib/core/reading/reading";
import { formatMargin } from "@/lib/core/units/format";

interface TrendThumbProps {
  points: { buildName: string; marginDb: number; standing: Standing }[];
  targetDb: number;
}

const WIDTH = 240;
const HEIGHT = 84;
const SIDE = 14;

/** Margin over builds at a glance: land below zero, the target dashed, one mark a build. */
export function TrendThumb({ points, targetDb }: TrendThumbProps) {
  if (points.length === 0) return <div />;
  const values = [...points.map((p) => p.marginDb), targetDb, 0];
  const low = Math.min(...values) - 2;
  const high = Math.max(...values) + 2;
  const y = (db: number) => 6 + ((high - db) / (high - low)) * (HEIGHT - 26);
  const x = (i: number) =>
    points.length === 1 ? WIDTH / 2 : SIDE + (i / (points.length - 1)) * (WIDTH - 2 * SIDE);
  const path = points.map((p, i) => `${i === 0 ? "M" : "L"}${x(i)},${y(p.marginDb)}`).join("");
  const said = points.map((p) => `${p.buildName} ${formatMargin(p.marginDb)}`).join(", ");
  return (
    <svg
      role="img"
      aria-label={`Worst margin over builds: ${said}; target ${formatMargin(targetDb)}`}
      viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
      className="w-full max-w-72 self-center md:ml-auto"
    >
      <rect x="0" y={y(0)} width={WIDTH} height={HEIGHT - 20 - y(0)} fill="var(--land)" />
      <path d={`M0,${y(0)}H${WIDTH}`} stroke="var(--land-edge)" strokeWidth="1.25" />
      <path
        d={`M0,${y(targetDb)}H${WIDTH}`}
        stroke="var(--ink-soft)"
        strokeWidth="0.75"
        strokeDasharray="4 3"
      />
      <path d={path} fill="none" stroke="var(--deep)" strokeWidth="1.5" />
      {points.map((p, i) => (
        <g key={p.buildName}>
          <circle cx={x(i)} cy={y(p.marginDb)} r="7" fill="var(--sheet)" />
          <g transform={`translate(${x(i) - 6},${y(p.marginDb) - 6})`}>
            <StandingShape standing={p.standing} size={12} />
          </g>
          <text
            x={x(i)}
            y={HEIGHT - 4}
            textAnchor="middle"
            fontSize="11"
            fill="var(--ink-soft)"
            fontFamily="var(--font-number), monospace"
          >
            {p.buildName}
          </text>
        </g>
      ))}
    </svg>
  );
}
