import type { MeasurementSettings } from "../sweep/settings";
import type { Reading, RemeasurePoint } from "./reading";

/** A spot to measure, with the position of the sweep whose bound lies over the line. */
export interface RemeasureRow extends RemeasurePoint {
  sweepName: string;
  polarization: MeasurementSettings["polarization"];
  heightM: number | null;
  azimuthDeg: number | null;
}

/** The points of a reading to measure again; `sweeps` are those that it was made of, in order. */
export function remeasureRows(
  reading: Pick<Reading, "remeasure">,
  sweeps: readonly { name: string; settings: MeasurementSettings }[],
): RemeasureRow[] {
  return reading.remeasure.map((point) => {
    const sweep = sweeps[point.partIndex];
    return {
      ...point,
      sweepName: sweep?.name ?? "",
      polarization: sweep?.settings.polarization ?? null,
      heightM: sweep?.settings.heightM ?? null,
      azimuthDeg: sweep?.settings.azimuthDeg ?? null,
    };
  });
}
