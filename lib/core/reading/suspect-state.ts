import type { Basis, Standing } from "./reading";

/** What has become of a suspect that is followed over builds. */
export const SUSPECT_STATES = ["open", "explained", "treated", "accepted"] as const;
export type SuspectState = (typeof SUSPECT_STATES)[number];

/** States that close the question, so that they need a reason in writing. */
export const REASONED_STATES: ReadonlySet<SuspectState> = new Set(["explained", "accepted"]);

/**
 * Where one suspect stands by itself: its margin and guard in dB, and how its margin was decided.
 * An upper bound can only clear it; null when no limit applies at its frequency.
 */
export function standingOfSuspect(
  suspect: { marginDb: number | null; basis: Basis },
  guardDb: number,
): Standing | null {
  const { marginDb, basis } = suspect;
  if (marginDb === null) return null;
  if (basis === "cannot-decide") return "undecided";
  if (marginDb < 0) return basis === "like-for-like" ? "over" : "undecided";
  return marginDb < guardDb ? "inside-guard" : "clear";
}
