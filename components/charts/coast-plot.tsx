"use client";

import { memo, useId } from "react";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import type { ChartMargin } from "./chart-plane";
import { FrequencyFrame } from "./frequency-frame";
import { Coast, Land } from "./land";
import type { PreparedCoast, PreparedTrace } from "./prepare-coast";

function Water({ trace, id, index }: { trace: PreparedTrace; id: string; index: number }) {
  const { role, edge, water, swell, dash, agroundIn } = trace;
  const clip = `${id}-aground-${index}`;
  return (
    <g>
      {role === "main" ? (
        <>
          <path d={water} fill="var(--water-1)" fillOpacity="0.9" />
          <path d={swell} fill="var(--water-2)" />
        </>
      ) : null}
      {role === "ambient" ? <path d={water} fill={`url(#${id}-stipple)`} /> : null}
      <path
        d={edge}
        fill="none"
        stroke={
          role === "main" ? "var(--deep)" : role === "outline" ? "var(--ink)" : "var(--ink-soft)"
        }
        strokeWidth={role === "outline" ? 0.9 : role === "main" ? 1.1 : 0.75}
        strokeDasharray={role === "ambient" ? "1 2" : dash}
        strokeLinejoin="round"
        strokeLinecap="round"
      />
      {agroundIn ? (
        <>
          <clipPath id={clip}>
            <path d={agroundIn} />
          </clipPath>
          <g clipPath={`url(#${clip})`}>
            {role === "main" ? <path d={water} fill="var(--aground)" fillOpacity="0.16" /> : null}
            <path
              d={edge}
              fill="none"
              stroke="var(--aground)"
              strokeWidth={role === "main" ? 1.75 : 1.25}
              strokeDasharray={dash}
              strokeLinejoin="round"
              strokeLinecap="round"
            />
          </g>
        </>
      ) : null}
    </g>
  );
}

/** The drawing without anything that follows the pointer, so that a crosshair costs nothing. */
export const CoastPlot = memo(function CoastPlot(props: {
  prepared: PreparedCoast;
  width: number;
  height: number;
  margin: ChartMargin;
}) {
  const { prepared, width, height, margin } = props;
  const { plane, coastline, traces, unit, clocks } = prepared;
  const id = useId();
  const order = { main: 0, ambient: 1, outline: 2 };
  return (
    <FrequencyFrame
      {...{ plane, width, height, margin }}
      frequencyTicks={prepared.frequencyTicks}
      levelTicks={prepared.levelTicks}
      unit={unit ? LEVEL_UNIT_LABELS[unit] : null}
      label={prepared.summary}
    >
      <defs>
        <clipPath id={`${id}-plot`}>
          <rect
            x={plane.left}
            y={plane.top}
            width={plane.right - plane.left}
            height={plane.bottom - plane.top}
          />
        </clipPath>
        <pattern id={`${id}-stipple`} width="5" height="5" patternUnits="userSpaceOnUse">
          <circle cx="1.2" cy="1.2" r="0.6" fill="var(--ink-soft)" />
          <circle cx="3.7" cy="3.7" r="0.6" fill="var(--ink-soft)" />
        </pattern>
      </defs>
      <g clipPath={`url(#${id}-plot)`}>
        {coastline ? <Land coastline={coastline} id={id} /> : null}
        {[...traces]
          .sort((a, b) => order[a.role] - order[b.role])
          .map((trace, i) => (
            <Water key={trace.id} trace={trace} id={id} index={i} />
          ))}
        {coastline ? <Coast coastline={coastline} /> : null}
      </g>
      <path d={clocks.path} stroke="var(--ink)" strokeWidth="1.25" />
      {clocks.labels.map(({ x, text }, i) => (
        <text
          key={i}
          x={x}
          y={plane.top + 16}
          fontSize="10"
          textAnchor="middle"
          fill="var(--ink)"
          stroke="var(--sheet)"
          strokeWidth="3"
          strokeOpacity="0.75"
          paintOrder="stroke"
        >
          {text}
        </text>
      ))}
    </FrequencyFrame>
  );
});
