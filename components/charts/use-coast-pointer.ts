"use client";

import type { KeyboardEvent, MouseEvent, PointerEvent } from "react";
import { useCallback, useState } from "react";
import type { ChartPlane } from "./chart-plane";
import type { FrequencyView } from "./frequency-scale";
import { buoyAt, type Buoy } from "./place-buoys";
import { panBy, selectShares, showsAll, viewForKey, zoomAround } from "./zoom";

/** A shorter drag is a click with a shaky hand. */
const SHORTEST_DRAG_PX = 5;

interface Options {
  plane: ChartPlane;
  extent: FrequencyView;
  buoys: readonly Buoy[];
  highlighted: number | null;
  onView: (view: FrequencyView) => void;
  onHighlight: (number: number | null) => void;
  /** The next sample left or right of a frequency. */
  onStep: (fromHz: number, direction: 1 | -1) => number | null;
}

/** Everything that pointer, wheel and keys do to a coast chart. */
export function useCoastPointer(options: Options) {
  const { plane, extent, buoys, highlighted, onView, onHighlight, onStep } = options;
  const { view, scale } = plane;
  const [pointedHz, setPointedHz] = useState<number | null>(null);
  const [drag, setDrag] = useState<{ from: number; to: number } | null>(null);
  const share = useCallback(
    (x: number) => (x - plane.left) / (plane.right - plane.left),
    [plane.left, plane.right],
  );
  const inPlot = (x: number) => Math.min(plane.right, Math.max(plane.left, x));

  function place(event: MouseEvent) {
    const box = event.currentTarget.getBoundingClientRect();
    return { x: event.clientX - box.left, y: event.clientY - box.top };
  }

  function onPointerMove(event: PointerEvent) {
    const { x, y } = place(event);
    if (drag) return setDrag({ ...drag, to: inPlot(x) });
    setPointedHz(x >= plane.left && x <= plane.right ? plane.hzAt(x) : null);
    const number = buoyAt(buoys, x, y)?.number ?? null;
    if (number !== highlighted) onHighlight(number);
  }

  function onPointerDown(event: PointerEvent) {
    const { x } = place(event);
    if (event.button !== 0 || x < plane.left || x > plane.right) return;
    event.currentTarget.setPointerCapture(event.pointerId);
    setDrag({ from: x, to: x });
    setPointedHz(plane.hzAt(x));
  }

  function onPointerUp() {
    setDrag(null);
    if (!drag || Math.abs(drag.to - drag.from) < SHORTEST_DRAG_PX) return;
    onView(selectShares(view, extent, scale, share(drag.from), share(drag.to)));
  }

  function onPointerLeave() {
    if (drag) return;
    setPointedHz(null);
    if (highlighted !== null) onHighlight(null);
  }

  function onKeyDown(event: KeyboardEvent) {
    if (event.ctrlKey || event.metaKey || event.altKey || event.target !== event.currentTarget)
      return;
    const direction = event.key === "ArrowLeft" ? -1 : event.key === "ArrowRight" ? 1 : null;
    if (event.shiftKey && direction) {
      event.preventDefault();
      const from = pointedHz ?? plane.hzAt((plane.left + plane.right) / 2);
      const next = onStep(from, direction);
      if (next !== null && next >= view.fromHz && next <= view.toHz) setPointedHz(next);
      return;
    }
    if (event.key === "Escape") return setPointedHz(null);
    const next = viewForKey(event.key, view, extent, scale);
    if (!next) return;
    event.preventDefault();
    onView(next);
  }

  /** React listens to wheels passively, so the page would scroll along; hence a plain listener. */
  const listenToWheel = useCallback(
    (element: HTMLElement | null) => {
      if (!element) return undefined;
      function onWheel(event: WheelEvent) {
        if (event.ctrlKey || !element) return;
        const unit = event.deltaMode === 1 ? 16 : event.deltaMode === 2 ? 400 : 1;
        const sideways = Math.abs(event.deltaX) > Math.abs(event.deltaY) || event.shiftKey;
        const delta = (sideways ? event.deltaX || event.deltaY : event.deltaY) * unit;
        // With everything in view the wheel belongs to the page again.
        if (delta === 0 || (showsAll(view, extent) && (sideways || delta > 0))) return;
        event.preventDefault();
        const x = event.clientX - element.getBoundingClientRect().left;
        const at = Math.min(1, Math.max(0, share(x)));
        onView(
          sideways
            ? panBy(view, extent, scale, delta / 600)
            : zoomAround(view, extent, scale, Math.exp(delta / 400), at),
        );
      }
      element.addEventListener("wheel", onWheel, { passive: false });
      return () => element.removeEventListener("wheel", onWheel);
    },
    [view, extent, scale, share, onView],
  );

  return {
    pointedHz,
    drag,
    listenToWheel,
    onKeyDown,
    surface: {
      onPointerMove,
      onPointerDown,
      onPointerUp,
      onPointerLeave,
      onPointerCancel: () => setDrag(null),
      onDoubleClick: () => onView({ ...extent }),
    },
  };
}
