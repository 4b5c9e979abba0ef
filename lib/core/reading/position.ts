import type { SweepPart } from "./sweep-part";

/** What a sweep was taken in; see `SweepPart`. */
export type Position = Pick<SweepPart, "settings" | "arrangement">;

const conductorOf = ({ settings }: Position) => settings.conductor?.trim().toLowerCase() || null;

/** Whether two sweeps state that they looked at the same thing: what is not stated is not the same. */
function isStatedAlike(a: Position, b: Position): boolean {
  if (a.arrangement !== b.arrangement) return false;
  if (a.settings.port === "radiated" || a.settings.port === "near-field")
    return a.settings.polarization !== null;
  return conductorOf(a) !== null && conductorOf(a) === conductorOf(b);
}

/**
 * Whether a tighter trace speaks for the position in which a looser one was taken: the same port,
 * polarization and conductor, and the same height and azimuth unless the looser one states none, as
 * a scan that was held over several does not. Traces of one sweep share what it leaves unstated; of
 * two sweeps the polarization or the conductor has to be stated, and bench, distance and link
 * settings have to be the same.
 */
export function speaksFor(tight: Position, loose: Position): boolean {
  const [a, b] = [tight.settings, loose.settings];
  return (
    a.port === b.port &&
    a.polarization === b.polarization &&
    (b.heightM === null || b.heightM === a.heightM) &&
    (b.azimuthDeg === null || b.azimuthDeg === a.azimuthDeg) &&
    (tight === loose || isStatedAlike(tight, loose))
  );
}
