import type { ChartMargin } from "./chart-plane";
import { Land } from "./land";

/** Land below a margin of zero, the coast on it, and the target as a leading line. */
export function TrendShore(props: {
  id: string;
  width: number;
  height: number;
  margin: ChartMargin;
  zeroY: number;
  targetY: number;
  target: string;
}) {
  const { id, width, height, margin, zeroY, targetY, target } = props;
  const right = width - margin.right;
  const shore = `M${margin.left},${zeroY}H${right}`;
  const land = `${shore}V${height - margin.bottom}H${margin.left}Z`;
  return (
    <g>
      <Land coastline={{ land, shore }} id={id} />
      <path d={shore} fill="none" stroke="var(--land-edge)" strokeWidth="1.75" />
      <text x={margin.left + 6} y={zeroY + 13} fontSize="11" fontWeight="500" fill="var(--ink)">
        mask
      </text>
      <path
        d={`M${margin.left},${targetY}H${right}`}
        stroke="var(--ink)"
        strokeWidth="1"
        strokeDasharray="1.5 3.5"
        strokeLinecap="round"
      />
      <text x={margin.left + 6} y={targetY - 5} fontSize="11" fontWeight="500" fill="var(--ink)">
        {target}
      </text>
    </g>
  );
}
