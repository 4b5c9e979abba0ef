import type { Basis, Standing, Suspect } from "@/lib/core/reading/reading";
import type { ChartPlane } from "./chart-plane";
import { overlaps, type Box } from "./place-names";

export interface Buoy {
  number: number;
  standing: Standing;
  /** The peak itself. */
  peakX: number;
  peakY: number;
  /** Middle of the float that carries the number; null when there was no room for it. */
  float: { x: number; y: number } | null;
}

export const BUOY_RADIUS_PX = 8;
const LIFTS_PX = [17, 35, 53, 71];
const SHIFTS_PX = [0, -12, 12, -24, 24];

/** What a suspect alone says. Without a guard it is told only whether it lies over the line. */
export function suspectStanding(
  suspect: { marginDb: number | null; basis: Basis },
  guardDb: number | null,
): Standing {
  const { marginDb, basis } = suspect;
  if (marginDb === null || basis === "cannot-decide") return "undecided";
  if (marginDb < 0) return basis === "like-for-like" ? "over" : "undecided";
  return guardDb !== null && marginDb < guardDb ? "inside-guard" : "clear";
}

function boxAround(x: number, y: number): Box {
  const half = BUOY_RADIUS_PX + 1;
  return { left: x - half, right: x + half, top: y - half, bottom: y + half };
}

/**
 * Buoys over the suspects in view. Lower numbers (lower margins) are placed first, and a float
 * moves up or aside until it is clear of the others; one without room is drawn as its peak alone.
 */
export function placeBuoys(
  suspects: readonly Suspect[],
  plane: ChartPlane,
  guardDb: number | null,
): Buoy[] {
  const taken: Box[] = [];
  const inView = suspects.filter(
    (s) => s.sampleHz >= plane.view.fromHz && s.sampleHz <= plane.view.toHz,
  );
  return [...inView]
    .sort((a, b) => a.number - b.number)
    .map((suspect) => {
      const peakX = plane.xOf(suspect.sampleHz);
      const peakY = Math.min(plane.bottom, Math.max(plane.top, plane.yOf(suspect.levelDb)));
      const spots = LIFTS_PX.flatMap((lift) =>
        SHIFTS_PX.map((shift) => ({ x: peakX + shift, y: peakY - lift })),
      );
      const spot = spots.find(({ x, y }) => {
        const box = boxAround(x, y);
        const inside =
          box.left >= plane.left && box.right <= plane.right && box.top >= plane.top - 4;
        return inside && !taken.some((other) => overlaps(box, other));
      });
      if (spot) taken.push(boxAround(spot.x, spot.y));
      const standing = suspectStanding(suspect, guardDb);
      return { number: suspect.number, standing, peakX, peakY, float: spot ?? null };
    });
}

/** The buoy under the pointer, by its float or its peak. */
export function buoyAt(buoys: readonly Buoy[], x: number, y: number): Buoy | null {
  const near = (cx: number, cy: number, reach: number) => Math.hypot(cx - x, cy - y) <= reach;
  return (
    buoys.find(
      ({ float, peakX, peakY }) =>
        (float !== null && near(float.x, float.y, BUOY_RADIUS_PX + 3)) || near(peakX, peakY, 5),
    ) ?? null
  );
}
