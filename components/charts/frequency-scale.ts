export type AxisScaleKind = "log" | "linear";

/** Part of the frequency axis that is in view, Hz. */
export interface FrequencyView {
  fromHz: number;
  toHz: number;
}

/** A log axis cannot start at 0 Hz; six decades below its end is as far as it goes. */
function logStartHz({ fromHz, toHz }: FrequencyView): number {
  return fromHz > 0 ? fromHz : toHz / 1e6;
}

/** Where a frequency lies in a view, 0 at its left edge and 1 at its right. */
export function shareOfHz(view: FrequencyView, scale: AxisScaleKind, hz: number): number {
  if (scale === "linear") return (hz - view.fromHz) / (view.toHz - view.fromHz);
  const from = logStartHz(view);
  return Math.log(hz / from) / Math.log(view.toHz / from);
}

/** The frequency in Hz at a share of the view; the inverse of `shareOfHz`. */
export function hzAtShare(view: FrequencyView, scale: AxisScaleKind, share: number): number {
  if (scale === "linear") return view.fromHz + (view.toHz - view.fromHz) * share;
  const from = logStartHz(view);
  return from * Math.pow(view.toHz / from, share);
}
