"use client";

import type { ReactNode } from "react";
import type { AxisScaleKind, FrequencyView } from "./frequency-scale";
import { showsAll, zoomAround } from "./zoom";

function ControlButton(props: {
  label: string;
  onClick: () => void;
  pressed?: boolean;
  disabled?: boolean;
  children: ReactNode;
}) {
  return (
    <button
      type="button"
      aria-label={props.label}
      aria-pressed={props.pressed}
      disabled={props.disabled}
      onClick={props.onClick}
      className="min-h-7 min-w-7 cursor-pointer px-2 text-[0.8rem] text-ink-soft hover:text-ink disabled:cursor-default disabled:opacity-40 aria-pressed:bg-water-1 aria-pressed:text-ink"
    >
      {props.children}
    </button>
  );
}

/** Zoom and scale for those who do not use wheel or keys. */
export function CoastControls(props: {
  view: FrequencyView;
  extent: FrequencyView;
  scale: AxisScaleKind;
  onView: (view: FrequencyView) => void;
  onScale: (scale: AxisScaleKind) => void;
}) {
  const { view, extent, scale, onView, onScale } = props;
  const all = showsAll(view, extent);
  return (
    <div className="flex shrink-0 gap-2 print:hidden">
      <div role="group" aria-label="Zoom" className="flex border border-rule bg-sheet">
        <ControlButton
          label="Zoom out"
          disabled={all}
          onClick={() => onView(zoomAround(view, extent, scale, 2, 0.5))}
        >
          {"\u2212"}
        </ControlButton>
        <ControlButton
          label="Zoom in"
          onClick={() => onView(zoomAround(view, extent, scale, 0.5, 0.5))}
        >
          +
        </ControlButton>
        <ControlButton
          label="Show all frequencies"
          disabled={all}
          onClick={() => onView({ ...extent })}
        >
          All
        </ControlButton>
      </div>
      <div role="group" aria-label="Frequency axis" className="flex border border-rule bg-sheet">
        <ControlButton label="Logarithmic" pressed={scale === "log"} onClick={() => onScale("log")}>
          Log
        </ControlButton>
        <ControlButton
          label="Linear"
          pressed={scale === "linear"}
          onClick={() => onScale("linear")}
        >
          Linear
        </ControlButton>
      </div>
    </div>
  );
}
