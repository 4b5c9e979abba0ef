import type { ChartMargin } from "./chart-plane";
import type { PreparedTrend } from "./prepare-trend";

/** Milestones as beacons: a staff with its name on top and a mark at the margin it asks for. */
export function TrendMilestones(props: {
  prepared: PreparedTrend;
  height: number;
  margin: ChartMargin;
}) {
  const { prepared, height, margin } = props;
  const bottom = height - margin.bottom;
  return (
    <g>
      {prepared.todayX === null ? null : (
        <g>
          <path
            d={`M${prepared.todayX},${margin.top}V${bottom}`}
            stroke="var(--ink-soft)"
            strokeWidth="1"
            strokeDasharray="1 3"
          />
          <text
            x={prepared.todayX - 4}
            y={bottom - 5}
            fontSize="11"
            textAnchor="end"
            fill="var(--ink-soft)"
          >
            today
          </text>
        </g>
      )}
      {prepared.milestones.map(({ name, detail, x, pushed, row, requiredY }, i) => {
        const y = 24 + row * 15;
        return (
          <g key={i}>
            <path d={`M${x},${y - 9}V${bottom}`} stroke="var(--ink-soft)" strokeWidth="1" />
            {requiredY === null ? null : (
              <path d={`M${x - 7},${requiredY}H${x + 7}`} stroke="var(--ink)" strokeWidth="2.5" />
            )}
            <text
              x={pushed ? x - 4 : x + 4}
              y={y}
              fontSize="11"
              textAnchor={pushed ? "end" : "start"}
              fill="var(--ink)"
              stroke="var(--paper)"
              strokeWidth="3"
              strokeLinejoin="round"
              paintOrder="stroke"
            >
              <tspan fontWeight="600">{name}</tspan>
              <tspan dx="5" className="font-mono" fill="var(--ink-soft)">
                {detail}
              </tspan>
            </text>
          </g>
        );
      })}
    </g>
  );
}
