import { memo } from "react";
import { BUOY_RADIUS_PX, type Buoy } from "./place-buoys";
import { STANDING_COLOURS, StandingMark } from "./standing-shape";

function Float({ buoy, x, y, lit }: { buoy: Buoy; x: number; y: number; lit: boolean }) {
  const r = BUOY_RADIUS_PX;
  const colour = STANDING_COLOURS[buoy.standing];
  const over = buoy.standing === "over";
  const d = r * 1.3;
  const shape = over ? (
    <path d={`M${x},${y - d}L${x + d},${y}L${x},${y + d}L${x - d},${y}Z`} />
  ) : (
    <circle cx={x} cy={y} r={r} />
  );
  const filled = lit || over;
  return (
    <g>
      <g
        fill={filled ? colour : "var(--sheet)"}
        stroke={colour}
        strokeWidth="1.25"
        strokeDasharray={buoy.standing === "undecided" ? "3 2" : undefined}
      >
        {shape}
      </g>
      {buoy.standing === "inside-guard" && !lit ? (
        <path
          d={`M${x - r},${y}A${r},${r} 0 0 0 ${x + r},${y}Z`}
          fill={colour}
          fillOpacity="0.35"
        />
      ) : null}
      {lit ? <circle cx={x} cy={y} r={r + 4} fill="none" stroke={colour} /> : null}
      <text
        x={x}
        y={y}
        dy="0.36em"
        textAnchor="middle"
        fontSize={buoy.number > 99 ? 8 : 10}
        fontWeight="600"
        className="font-mono"
        fill={filled ? "var(--sheet)" : "var(--ink)"}
      >
        {buoy.number}
      </text>
    </g>
  );
}

/** Numbered buoys moored at the suspects. */
export const Buoys = memo(function Buoys(props: {
  buoys: readonly Buoy[];
  highlighted: number | null;
}) {
  const lit = props.buoys.find((buoy) => buoy.number === props.highlighted);
  const rest = props.buoys.filter((buoy) => buoy !== lit);
  return (
    <g>
      {[...rest, ...(lit ? [lit] : [])].map((buoy) => {
        const at = buoy.float ?? (buoy === lit ? { x: buoy.peakX, y: buoy.peakY - 16 } : null);
        const colour = STANDING_COLOURS[buoy.standing];
        return (
          <g key={buoy.number}>
            {at ? (
              <>
                <line
                  x1={at.x}
                  y1={at.y}
                  x2={buoy.peakX}
                  y2={buoy.peakY}
                  stroke={colour}
                  strokeWidth="1"
                />
                <circle cx={buoy.peakX} cy={buoy.peakY} r="1.75" fill={colour} />
                <Float buoy={buoy} x={at.x} y={at.y} lit={buoy === lit} />
              </>
            ) : (
              <StandingMark standing={buoy.standing} x={buoy.peakX} y={buoy.peakY} radius={3} />
            )}
          </g>
        );
      })}
    </g>
  );
});
