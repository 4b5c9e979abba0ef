import { hzAtShare, shareOfHz, type AxisScaleKind, type FrequencyView } from "./frequency-scale";

/** Narrowest view as a share of the whole extent: one sample in a million still gets its place. */
const NARROWEST_SHARE = 1e-6;

/** The part [left, right] of the extent, in shares of it, pushed back inside when it sticks out. */
function viewOfShares(
  extent: FrequencyView,
  scale: AxisScaleKind,
  left: number,
  right: number,
): FrequencyView {
  const width = Math.min(1, Math.max(NARROWEST_SHARE, right - left));
  const middle = (left + right) / 2;
  const from = Math.min(1 - width, Math.max(0, middle - width / 2));
  if (width >= 1) return { ...extent };
  return {
    fromHz: from <= 0 ? extent.fromHz : hzAtShare(extent, scale, from),
    toHz: from + width >= 1 ? extent.toHz : hzAtShare(extent, scale, from + width),
  };
}

function sharesOf(view: FrequencyView, extent: FrequencyView, scale: AxisScaleKind) {
  const left = shareOfHz(extent, scale, view.fromHz);
  return {
    left: Number.isFinite(left) ? left : 0,
    right: shareOfHz(extent, scale, view.toHz),
  };
}

/** Zooms so that the frequency at `share` of the view stays where it is; `factor` < 1 goes in. */
export function zoomAround(
  view: FrequencyView,
  extent: FrequencyView,
  scale: AxisScaleKind,
  factor: number,
  share: number,
): FrequencyView {
  const { left, right } = sharesOf(view, extent, scale);
  const at = left + (right - left) * share;
  return viewOfShares(extent, scale, at - (at - left) * factor, at + (right - at) * factor);
}

/** Moves the view by a share of its own width; it stops at the ends of the extent. */
export function panBy(
  view: FrequencyView,
  extent: FrequencyView,
  scale: AxisScaleKind,
  share: number,
): FrequencyView {
  const { left, right } = sharesOf(view, extent, scale);
  const by = (right - left) * share;
  return viewOfShares(extent, scale, left + by, right + by);
}

/** The view between two shares of the present one, in whichever order they were dragged. */
export function selectShares(
  view: FrequencyView,
  extent: FrequencyView,
  scale: AxisScaleKind,
  one: number,
  other: number,
): FrequencyView {
  const { left, right } = sharesOf(view, extent, scale);
  const at = (share: number) => left + (right - left) * Math.min(1, Math.max(0, share));
  return viewOfShares(extent, scale, at(Math.min(one, other)), at(Math.max(one, other)));
}

/** Whether everything is in view, so that zooming out has nothing left to show. */
export function showsAll(view: FrequencyView, extent: FrequencyView): boolean {
  return view.fromHz <= extent.fromHz && view.toHz >= extent.toHz;
}

/** What a key does to the view; null when the key means nothing to the chart. */
export function viewForKey(
  key: string,
  view: FrequencyView,
  extent: FrequencyView,
  scale: AxisScaleKind,
): FrequencyView | null {
  if (key === "+" || key === "=") return zoomAround(view, extent, scale, 0.5, 0.5);
  if (key === "-" || key === "\u2212" || key === "_")
    return zoomAround(view, extent, scale, 2, 0.5);
  if (key === "ArrowLeft") return panBy(view, extent, scale, -0.2);
  if (key === "ArrowRight") return panBy(view, extent, scale, 0.2);
  if (key === "0") return { ...extent };
  return null;
}
