import type { MeasurementSettings } from "../sweep/settings";

type Position = Pick<MeasurementSettings, "port" | "polarization" | "heightM" | "azimuthDeg">;

/**
 * Whether a tighter trace speaks for the position in which a looser one was taken: the same port
 * and polarization (both stated alike, or neither), and the same height and azimuth unless the
 * looser one states none, as a scan that was held over several does not.
 */
export function speaksFor(tight: Position, loose: Position): boolean {
  return (
    tight.port === loose.port &&
    tight.polarization === loose.polarization &&
    (loose.heightM === null || loose.heightM === tight.heightM) &&
    (loose.azimuthDeg === null || loose.azimuthDeg === tight.azimuthDeg)
  );
}
