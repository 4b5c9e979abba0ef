"use client";

import { useId, useMemo } from "react";
import type { WaterfallBar } from "@/lib/core/delta/waterfall";
import { formatMargin } from "@/lib/core/units/format";
import { EmptyPlot } from "./empty-plot";
import { Land } from "./land";
import type { PreparedWaterfall, WaterfallColumn } from "./prepare-waterfall";
import { prepareWaterfall } from "./prepare-waterfall";
import { useWidth } from "./use-width";

export interface WaterfallChartProps {
  bars: WaterfallBar[];
  guardDb: number;
  targetDb: number;
  height?: number;
}

/**
 * What each step of a ladder did to one margin: below zero is land, up is more room. Steps that
 * are not in the product are outlines; where nothing may be compared the gap says so.
 */
export function WaterfallChart({ bars, guardDb, targetDb, height = 260 }: WaterfallChartProps) {
  const [measure, measured] = useWidth();
  const id = useId();
  const width = Math.max(240, measured);
  const prepared = useMemo(
    () => prepareWaterfall({ bars, guardDb, targetDb, width, height }),
    [bars, guardDb, targetDb, width, height],
  );
  if (bars.every((bar) => bar.toDb === null))
    return <EmptyPlot height={height}>No step has a margin here.</EmptyPlot>;
  return (
    <figure ref={measure} className="m-0 min-w-0" style={{ minHeight: height }}>
      {measured > 0 ? (
        <svg
          role="img"
          aria-label={prepared.summary}
          width={width}
          height={height}
          className="block select-none"
        >
          <Shore {...{ id, prepared, width, height, guardDb, targetDb }} />
          {prepared.joints.map((joint) => (
            <path
              key={`${joint.x1} ${joint.x2}`}
              d={`M${joint.x1},${joint.y}H${joint.x2}`}
              stroke="var(--ink-soft)"
              strokeWidth="1"
            />
          ))}
          {prepared.columns.map((column) => (
            <Column key={column.key} column={column} baseline={height - prepared.margin.bottom} />
          ))}
          <text x={0} y={11} fontSize="11" fill="var(--ink-soft)">
            Margin, dB
          </text>
        </svg>
      ) : null}
    </figure>
  );
}

function Shore(props: {
  id: string;
  prepared: PreparedWaterfall;
  width: number;
  height: number;
  guardDb: number;
  targetDb: number;
}) {
  const { id, prepared, width, height, guardDb, targetDb } = props;
  const { margin, zeroY, guardY, targetY, ticks } = prepared;
  const right = width - margin.right;
  const bottom = height - margin.bottom;
  const shore = `M${margin.left},${zeroY}H${right}`;
  const name = { x: right + 5, fontSize: 11, fill: "var(--ink)" } as const;
  return (
    <g>
      <rect
        x={margin.left}
        y={margin.top}
        width={right - margin.left}
        height={Math.max(0, bottom - margin.top)}
        fill="var(--sheet)"
      />
      {guardY === null ? null : (
        <rect
          x={margin.left}
          y={guardY}
          width={right - margin.left}
          height={Math.max(0, zeroY - guardY)}
          fill="var(--shoal-bed)"
        />
      )}
      {ticks.map(({ y, label }) => (
        <g key={label}>
          <path d={`M${margin.left},${y}H${right}`} stroke="var(--rule)" />
          <text
            x={margin.left - 6}
            y={y + 4}
            fontSize="11"
            textAnchor="end"
            fill="var(--ink-soft)"
            className="font-mono"
          >
            {label}
          </text>
        </g>
      ))}
      <Land coastline={{ land: `${shore}V${bottom}H${margin.left}Z`, shore }} id={id} />
      <path d={shore} stroke="var(--land-edge)" strokeWidth="1.75" />
      <text {...name} y={zeroY + 13} fontWeight="500">
        mask
      </text>
      {guardY === null ? null : (
        <text {...name} y={(guardY + zeroY) / 2 + 1}>
          guard {formatMargin(guardDb)}
        </text>
      )}
      <path
        d={`M${margin.left},${targetY}H${right}`}
        stroke="var(--ink)"
        strokeDasharray="1.5 3.5"
        strokeLinecap="round"
      />
      <text {...name} y={targetY + 4}>
        target {formatMargin(targetDb)}
      </text>
    </g>
  );
}

const FILL: Record<WaterfallColumn["kind"], string> = {
  margin: "var(--water-3)",
  up: "var(--deep)",
  down: "var(--shoal)",
  gap: "none",
};

function Column({ column, baseline }: { column: WaterfallColumn; baseline: number }) {
  const { x, width, kind, isBeside, top, bottom, whisker, text, textY, label } = column;
  const middle = x + width / 2;
  const isOutline = isBeside || kind === "gap";
  return (
    <g>
      <rect
        x={x}
        y={top}
        width={width}
        height={Math.max(kind === "gap" ? 0 : 1.5, bottom - top)}
        fill={isOutline ? "none" : FILL[kind]}
        stroke={isOutline ? (kind === "gap" ? "var(--ink-soft)" : FILL[kind]) : "none"}
        strokeWidth="1.25"
        strokeDasharray={kind === "gap" ? "3 3" : undefined}
      />
      {whisker ? (
        <path
          d={`M${middle},${whisker.top}V${whisker.bottom}M${middle - 5},${whisker.top}h10M${middle - 5},${whisker.bottom}h10`}
          stroke="var(--ink)"
          fill="none"
        />
      ) : null}
      {kind === "gap" ? (
        <text
          fontSize="11"
          fill="var(--ink)"
          transform={`translate(${middle + 4},${Math.max(110, Math.min(baseline - 6, bottom - 6))}) rotate(-90)`}
        >
          {text}
        </text>
      ) : width >= 30 ? (
        <text
          x={middle}
          y={textY}
          fontSize="11"
          textAnchor="middle"
          fill="var(--ink)"
          stroke="var(--sheet)"
          strokeWidth="3"
          paintOrder="stroke"
          className="font-mono"
        >
          {text.replace(" dB", "")}
        </text>
      ) : null}
      <text
        x={middle}
        y={baseline + 16}
        fontSize="11"
        textAnchor="middle"
        fill="var(--ink-soft)"
        className={label === "now" ? undefined : "font-mono"}
      >
        {label}
      </text>
    </g>
  );
}
