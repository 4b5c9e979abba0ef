"use client";

import { useCallback, useMemo } from "react";
import type { Mask } from "@/lib/core/mask/mask";
import type { Suspect } from "@/lib/core/reading/reading";
import { Buoys } from "./buoys";
import type { ClockMark } from "./clock-marks";
import { CoastControls } from "./coast-controls";
import { CoastKey } from "./coast-key";
import { CoastPlot } from "./coast-plot";
import { CoastReadout } from "./coast-readout";
import type { CoastState, CoastTrace } from "./coast-trace";
import { CoastWeather } from "./coast-weather";
import type { AxisScaleKind, FrequencyView } from "./frequency-scale";
import { OverviewStrip, STRIP_HEIGHT_PX } from "./overview-strip";
import { prepareCoast, shownView } from "./prepare-coast";
import { leadTrace, readAt, readoutRows, stepSample } from "./prepare-readout";
import { useCoastPointer } from "./use-coast-pointer";
import { useWidth } from "./use-width";
import { showsAll } from "./zoom";

export interface CoastChartProps {
  traces: CoastTrace[];
  mask: Mask | null;
  suspects: Suspect[];
  view: FrequencyView;
  extent: FrequencyView;
  scale: AxisScaleKind;
  onView: (view: FrequencyView) => void;
  onScale: (scale: AxisScaleKind) => void;
  highlighted: number | null;
  onHighlight: (number: number | null) => void;
  state: CoastState;
  height?: number;
  /** What the chart is of, "Sweep 12 against …"; it begins the sentence that describes it. */
  label: string;
  /** With the guard, buoys tell inside guard from clear. */
  guardDb?: number;
  /** Known clocks and harmonics to tick off along the top edge. */
  clocks?: ClockMark[];
}

const HINT =
  "Point at the chart to read it. Drag, scroll or press + to zoom, double-click or press 0 for all.";
const NO_CLOCKS: ClockMark[] = [];
const MARGIN = { top: 24, right: 10, bottom: 24, left: 38 };

export function CoastChart(props: CoastChartProps) {
  const [measure, width] = useWidth();
  return (
    <figure ref={measure} className="m-0 min-w-0">
      <SizedChart {...props} width={width} />
    </figure>
  );
}

function SizedChart(props: CoastChartProps & { width: number }) {
  const { traces, mask, suspects, view, extent, scale, label, width } = props;
  const { onView, onScale, highlighted, onHighlight, state, height = 380 } = props;
  const guardDb = props.guardDb ?? null;
  const clocks = props.clocks ?? NO_CLOCKS;
  const prepared = useMemo(
    () =>
      prepareCoast({
        ...{ traces, mask, suspects, view, extent, scale, guardDb, clocks, label },
        ...{ width: Math.max(width, 120), height, margin: MARGIN },
      }),
    [traces, mask, suspects, view, extent, scale, guardDb, clocks, label, width, height],
  );
  const { plane, buoys } = prepared;
  const onStep = useCallback(
    (fromHz: number, direction: 1 | -1) => {
      const lead = leadTrace(traces);
      const what = lead && shownView(lead);
      return what ? stepSample(what, fromHz, direction) : null;
    },
    [traces],
  );
  const { pointedHz, drag, listenToWheel, onKeyDown, surface } = useCoastPointer({
    ...{ plane, extent, buoys, highlighted, onView, onHighlight, onStep },
  });
  // What is drawn can be read and zoomed while more of it is on its way.
  const ready = state !== "error" && !prepared.empty;
  const readout = ready && pointedHz !== null ? readAt(traces, mask, pointedHz, view, scale) : null;
  // On a narrow screen it stands below, where its rows do not push the chart from under the finger.
  const narrow = width < 640;
  const rows = narrow ? 2 : readoutRows(prepared.traces, mask, width);
  const reading = <CoastReadout readout={readout} hint={ready ? HINT : ""} rows={rows} />;
  return (
    <>
      <div className="flex flex-wrap items-start justify-between gap-x-4 gap-y-1">
        <CoastKey traces={prepared.traces} />
        <CoastControls {...{ view, extent, scale, onView, onScale }} />
      </div>
      {narrow ? null : reading}
      <div
        ref={listenToWheel}
        role="group"
        tabIndex={0}
        aria-label={`${label}. Plus and minus zoom, arrows move, 0 shows all, Shift with arrows reads sample by sample.`}
        onKeyDown={onKeyDown}
        className="relative touch-pan-y"
        style={{ height }}
      >
        {width > 0 ? (
          <>
            <CoastPlot prepared={prepared} width={width} height={height} margin={MARGIN} />
            <svg
              aria-hidden="true"
              width={width}
              height={height}
              className={`absolute inset-0 select-none ${ready ? "cursor-crosshair" : ""}`}
              {...(state === "error" ? {} : surface)}
            >
              <rect width={width} height={height} fill="transparent" />
              {ready ? <Buoys buoys={buoys} highlighted={highlighted} /> : null}
              {readout && !drag ? (
                <g pointerEvents="none">
                  <path
                    d={`M${plane.xOf(readout.hz)},${plane.top}V${plane.bottom}M${plane.left},${plane.yOf(readout.levelDb)}H${plane.right}`}
                    stroke="var(--ink-soft)"
                    strokeWidth="0.75"
                    strokeDasharray="3 2"
                  />
                  <circle
                    cx={plane.xOf(readout.hz)}
                    cy={plane.yOf(readout.levelDb)}
                    r="3.5"
                    fill="var(--sheet)"
                    stroke="var(--ink)"
                  />
                </g>
              ) : null}
              {drag ? (
                <path
                  d={`M${drag.from},${plane.top}H${drag.to}V${plane.bottom}H${drag.from}Z`}
                  fill="var(--deep)"
                  fillOpacity="0.12"
                  stroke="var(--deep)"
                />
              ) : null}
            </svg>
            <CoastWeather
              state={state}
              nothing={
                prepared.empty
                  ? traces.length === 0
                    ? "no trace"
                    : showsAll(view, extent)
                      ? "no levels"
                      : "none in view"
                  : null
              }
              plane={plane}
            />
          </>
        ) : null}
      </div>
      {width > 0 ? (
        <OverviewStrip
          {...{ traces, mask, view, extent, scale, width, onView }}
          levels={plane.levels}
          left={plane.left}
          right={plane.right}
        />
      ) : (
        <div style={{ height: STRIP_HEIGHT_PX }} />
      )}
      {narrow ? reading : null}
      {prepared.notes.map((note) => (
        <p key={note} className="mt-1 text-[0.8rem] text-ink-soft">
          {note}
        </p>
      ))}
    </>
  );
}
