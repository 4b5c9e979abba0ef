"use client";

import { memo, useMemo, useState, type PointerEvent } from "react";
import type { Mask } from "@/lib/core/mask/mask";
import { formatFrequency } from "@/lib/core/units/format";
import type { CoastTrace } from "./coast-trace";
import { drawTrace } from "./draw-trace";
import { hzAtShare, shareOfHz, type AxisScaleKind, type FrequencyView } from "./frequency-scale";
import { makePlane } from "./chart-plane";
import type { LevelRange } from "./level-ticks";
import { prepareCoastline } from "./prepare-coastline";
import { panBy, showsAll } from "./zoom";

const HEIGHT_PX = 40;
/** The strip with the two frequencies below it. */
export const STRIP_HEIGHT_PX = HEIGHT_PX + 19;

/** The whole span below the chart, with the part in view between two posts; drag it along. */
export const OverviewStrip = memo(function OverviewStrip(props: {
  traces: readonly CoastTrace[];
  mask: Mask | null;
  levels: LevelRange;
  view: FrequencyView;
  extent: FrequencyView;
  scale: AxisScaleKind;
  width: number;
  left: number;
  right: number;
  onView: (view: FrequencyView) => void;
}) {
  const { traces, mask, levels, view, extent, scale, width, left, right, onView } = props;
  const [grip, setGrip] = useState<number | null>(null);
  const drawn = useMemo(() => {
    const margin = { left, right: width - right, top: 1, bottom: 1 };
    const plane = makePlane({ view: extent, scale, levels, width, height: HEIGHT_PX, margin });
    const lead = traces.find((trace) => trace.role === "main") ?? traces[0];
    const whole = lead?.overview ?? lead?.view ?? null;
    return {
      trace: whole ? drawTrace(whole, plane) : null,
      coast: mask ? prepareCoastline(mask, plane).lines : [],
    };
  }, [traces, mask, levels, extent, scale, width, left, right]);
  const across = right - left;
  const xOf = (hz: number) => left + shareOfHz(extent, scale, hz) * across;
  const from = Math.max(left, Math.min(right - 2, xOf(view.fromHz)));
  const to = Math.min(right, Math.max(from + 2, xOf(view.toHz)));
  const all = showsAll(view, extent);
  const clip = `M${left},0H${right}V${HEIGHT_PX}H${left}Z`;

  function shareAt(event: PointerEvent) {
    const x = event.clientX - event.currentTarget.getBoundingClientRect().left;
    return (x - left) / across;
  }

  function moveTo(share: number) {
    const hz = hzAtShare(extent, scale, Math.min(1, Math.max(0, share)));
    onView(panBy(view, extent, scale, shareOfHz(view, scale, hz) - 0.5));
  }

  function onPointerDown(event: PointerEvent) {
    if (event.button !== 0 || all) return;
    event.currentTarget.setPointerCapture(event.pointerId);
    const share = shareAt(event);
    const middle = ((from + to) / 2 - left) / across;
    const inside = share * across + left >= from && share * across + left <= to;
    setGrip(inside ? share - middle : 0);
    if (!inside) moveTo(share);
  }

  return (
    <div aria-hidden="true">
      <svg
        width={width}
        height={HEIGHT_PX}
        className={`block touch-pan-y select-none ${all ? "" : "cursor-grab"}`}
        onPointerDown={onPointerDown}
        onPointerMove={(event) => grip !== null && moveTo(shareAt(event) - grip)}
        onPointerUp={() => setGrip(null)}
        onPointerCancel={() => setGrip(null)}
      >
        <path d={clip} fill="var(--sheet)" stroke="var(--rule)" />
        {drawn.trace ? (
          <>
            <path d={drawn.trace.water} fill="var(--water-1)" />
            <path d={drawn.trace.edge} fill="none" stroke="var(--water-3)" strokeWidth="0.75" />
          </>
        ) : null}
        {drawn.coast.map((line, i) => (
          <path key={i} d={line.path} fill="none" stroke="var(--land-edge)" strokeWidth="0.75" />
        ))}
        {all ? null : (
          <>
            <path
              d={`M${left},0H${from}V${HEIGHT_PX}H${left}ZM${to},0H${right}V${HEIGHT_PX}H${to}Z`}
              fill="var(--paper)"
              fillOpacity="0.7"
            />
            <path
              d={`M${from},0.5H${to}V${HEIGHT_PX - 0.5}H${from}Z`}
              fill="none"
              stroke="var(--deep)"
              strokeWidth="1"
            />
            <path
              d={`M${from},${HEIGHT_PX / 2 - 7}v14M${to},${HEIGHT_PX / 2 - 7}v14`}
              stroke="var(--deep)"
              strokeWidth="4"
            />
          </>
        )}
      </svg>
      <div
        className="flex justify-between pt-0.5 font-mono text-[0.72rem] text-ink-soft"
        style={{ paddingLeft: left, paddingRight: width - right }}
      >
        <span>{formatFrequency(view.fromHz)}</span>
        <span>{formatFrequency(view.toHz)}</span>
      </div>
    </div>
  );
});
