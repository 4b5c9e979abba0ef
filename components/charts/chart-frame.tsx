"use client";

import { Axis, DataContext, DataProvider, Grid } from "@visx/xychart";
import { useContext, useLayoutEffect, type ReactNode } from "react";
import type { ChartMargin } from "./chart-plane";
import type { AxisScaleKind } from "./frequency-scale";

export interface FrameTick {
  value: number;
  /** Empty: a tick without a label. */
  label: string;
  /** Minor ticks are short and have no grid line. */
  minor?: boolean;
}

interface FrameScale {
  kind: AxisScaleKind;
  from: number;
  to: number;
  ticks: FrameTick[];
}

const CORNERS = [{}];
const NUMBER_STYLE = { fontSize: 11, fill: "var(--ink-soft)", className: "font-mono" };

/**
 * The scales know their domain, but xychart makes them only once data is registered. Before the
 * first paint, so that no frame shows an old size beside a new one.
 */
function Corners(props: {
  width: number;
  height: number;
  margin: ChartMargin;
  at: [number, number];
}) {
  const { width, height, margin, at } = props;
  const { registerData, setDimensions } = useContext(DataContext);
  const [x, y] = at;
  useLayoutEffect(() => {
    setDimensions?.({ width, height, margin });
  }, [setDimensions, width, height, margin]);
  useLayoutEffect(() => {
    registerData?.({ key: "corners", data: CORNERS, xAccessor: () => x, yAccessor: () => y });
  }, [registerData, x, y]);
  return null;
}

function labelOf(ticks: readonly FrameTick[]) {
  const labels = new Map(ticks.map((tick) => [tick.value, tick.label]));
  return (value: unknown) => labels.get(Number(value)) ?? "";
}

/** xychart hands `tickValues` on to its grid, though its own type does not name it. */
function gridOf(lines: "rows" | "columns", ticks: readonly FrameTick[]) {
  return {
    rows: lines === "rows",
    columns: lines === "columns",
    tickValues: ticks.filter((tick) => !tick.minor).map((tick) => tick.value),
    lineStyle: { stroke: "var(--rule)", strokeWidth: 1 },
  };
}

/** Axes and grid of a chart around what is drawn in it. The whole drawing is one image. */
export function ChartFrame(props: {
  width: number;
  height: number;
  margin: ChartMargin;
  x: FrameScale;
  y: FrameScale;
  label: string;
  children: ReactNode;
}) {
  const { width, height, margin, x, y, label, children } = props;
  const right = width - margin.right;
  return (
    <DataProvider
      xScale={{ type: x.kind, domain: [x.from, x.to], zero: false }}
      yScale={{ type: y.kind, domain: [y.from, y.to], zero: false }}
      initialDimensions={{ width, height, margin }}
    >
      <Corners width={width} height={height} margin={margin} at={[x.from, y.from]} />
      <svg
        role="img"
        aria-label={label}
        width={width}
        height={height}
        className="block select-none"
      >
        <rect
          x={margin.left}
          y={margin.top}
          width={Math.max(0, right - margin.left)}
          height={Math.max(0, height - margin.top - margin.bottom)}
          fill="var(--sheet)"
        />
        <Grid {...gridOf("rows", y.ticks)} />
        <Grid {...gridOf("columns", x.ticks)} />
        {children}
        <Axis
          orientation="bottom"
          tickValues={x.ticks.filter((tick) => tick.minor).map((tick) => tick.value)}
          tickFormat={() => ""}
          tickLength={3}
          hideAxisLine
          tickStroke="var(--ink-soft)"
          tickComponent={() => null}
        />
        <Axis
          orientation="bottom"
          tickValues={x.ticks.filter((tick) => !tick.minor).map((tick) => tick.value)}
          tickFormat={labelOf(x.ticks)}
          tickLength={5}
          stroke="var(--ink-soft)"
          tickStroke="var(--ink-soft)"
          tickComponent={({ x: at, y: down, formattedValue }) => (
            <text
              {...NUMBER_STYLE}
              x={at}
              y={down}
              dy="0.25em"
              textAnchor={at - margin.left < 22 ? "start" : right - at < 22 ? "end" : "middle"}
            >
              {formattedValue}
            </text>
          )}
        />
        <Axis
          orientation="left"
          tickValues={y.ticks.map((tick) => tick.value)}
          tickFormat={labelOf(y.ticks)}
          tickLength={4}
          stroke="var(--ink-soft)"
          tickStroke="var(--ink-soft)"
          tickComponent={({ x: at, y: down, formattedValue }) => (
            <text {...NUMBER_STYLE} x={at - 3} y={down} dy="0.35em" textAnchor="end">
              {formattedValue}
            </text>
          )}
        />
      </svg>
    </DataProvider>
  );
}
