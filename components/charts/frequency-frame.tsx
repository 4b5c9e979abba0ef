"use client";

import type { ReactNode } from "react";
import { ChartFrame } from "./chart-frame";
import type { ChartMargin, ChartPlane } from "./chart-plane";
import type { FrequencyTick } from "./frequency-ticks";
import { labelLevel } from "./level-ticks";

/** A frame whose axes are frequency and dB, with the level's unit written over its axis. */
export function FrequencyFrame(props: {
  plane: ChartPlane;
  frequencyTicks: readonly FrequencyTick[];
  levelTicks: readonly number[];
  unit: string | null;
  width: number;
  height: number;
  margin: ChartMargin;
  label: string;
  children: ReactNode;
}) {
  const { plane, unit, width, height, margin, label, children } = props;
  const { levels } = plane;
  return (
    <ChartFrame
      {...{ width, height, margin, label }}
      x={{
        kind: plane.scale,
        from: plane.hzAt(plane.left),
        to: plane.view.toHz,
        ticks: props.frequencyTicks.map(({ hz, label: text, weight }) => ({
          value: hz,
          label: text ?? "",
          minor: weight === "minor",
        })),
      }}
      y={{
        kind: "linear",
        from: levels.fromDb,
        to: levels.toDb,
        // Without a unit the numbers would mean nothing.
        ticks: props.levelTicks.map((level) => ({
          value: level,
          label: unit ? labelLevel(level) : "",
        })),
      }}
    >
      {children}
      {unit ? (
        <text x={0} y={11} fontSize="11" fill="var(--ink-soft)">
          {unit}
        </text>
      ) : null}
    </ChartFrame>
  );
}
