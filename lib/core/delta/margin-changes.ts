import type { Standing } from "../reading/reading";
import { powerMeanMarginDb } from "../stats/power-mean";
import type { Detector } from "../sweep/settings";
import { DETECTOR_LABELS } from "../sweep/settings";
import type { ComparedLine, ComparedMargin, ComparedSweep } from "./compared-sweep";
import type { BandChange, MarginChange } from "./delta";
import { measureChange } from "./measured-change";
import type { Repeats } from "./pair-sweeps";
import type { TracePair } from "./trace-pairs";

const WORST_FIRST: readonly Standing[] = ["over", "undecided", "inside-guard", "clear"];

const said = (detector: Detector | null | undefined) =>
  detector ? DETECTOR_LABELS[detector] : "nothing";

/** Why two margins are no change of the product; null when they are. */
function whyNoChange(
  before: readonly ComparedMargin[],
  after: readonly ComparedMargin[],
  sound: readonly TracePair[],
): string | null {
  const all = [...before, ...after];
  // Where one side has no margin there is nothing to explain away.
  if (all.some((margin) => margin.marginDb === null)) return null;
  const [a, b] = [before[0]?.decidedBy, after[0]?.decidedBy];
  const isMixed = (side: readonly ComparedMargin[]) =>
    side.some((margin) => margin.decidedBy !== side[0]?.decidedBy);
  if (isMixed(before) || isMixed(after))
    return "The repeats were decided by different detectors, so the difference is not a change of the product.";
  if (a !== b)
    return `Decided by ${said(a)} before and ${said(b)} after, so the difference is not a change of the product.`;
  if (!a || !sound.some((pair) => pair.detector === a))
    return `Decided by ${said(a)}, whose traces are not comparable.`;
  return null;
}

function marginPair(
  before: readonly ComparedMargin[],
  after: readonly ComparedMargin[],
  sound: readonly TracePair[],
) {
  const margins = (side: readonly ComparedMargin[]) => side.map((margin) => margin.marginDb);
  const measured = measureChange(margins(before), margins(after), powerMeanMarginDb);
  const note = whyNoChange(before, after, sound);
  const none = { changeDb: null, uncertaintyDb: null, isWithinRepeatability: null };
  return { ...measured, ...(note ? none : {}), note };
}

/** The line of each repeat; null when a repeat lacks it. */
function linesOf(
  side: readonly ComparedSweep[],
  maskRevisionId: string,
  name: string,
): ComparedLine[] | null {
  const found = side.flatMap((sweep) => {
    const reading = sweep.readings.find((r) => r.maskRevisionId === maskRevisionId);
    const line = reading?.lines.find((l) => l.name === name);
    return line ? [line] : [];
  });
  return found.length === side.length ? found : null;
}

function bandChanges(
  before: readonly ComparedLine[],
  after: readonly ComparedLine[],
  sound: readonly TracePair[],
): BandChange[] {
  return (before[0]?.bands ?? []).flatMap(({ startHz, stopHz }) => {
    const own = (side: readonly ComparedLine[]) =>
      side.flatMap(({ bands }) => {
        const band = bands.find((b) => b.startHz === startHz && b.stopHz === stopHz);
        return band ? [band] : [];
      });
    const [a, b] = [own(before), own(after)];
    // Readings of an older engine have no bands.
    if (a.length < before.length || b.length < after.length) return [];
    return [{ startHz, stopHz, ...marginPair(a, b, sound) }];
  });
}

const worstOf = (lines: readonly ComparedLine[]): Standing =>
  WORST_FIRST.find((standing) => lines.some((line) => line.standing === standing)) ?? "undecided";

/**
 * Change of the worst margin of every line that both sides were held against, and of its bands.
 * Two margins are only a change when the traces of one detector decided both and are comparable.
 */
export function changeOfMargins(
  before: Repeats,
  after: Repeats,
  sound: readonly TracePair[],
): MarginChange[] {
  return before[0].readings.flatMap(({ maskRevisionId, maskTitle, lines }) =>
    lines.flatMap(({ name }) => {
      const earlier = linesOf(before, maskRevisionId, name);
      const later = linesOf(after, maskRevisionId, name);
      if (!earlier || !later) return [];
      return [
        {
          maskRevisionId,
          maskTitle,
          lineName: name,
          ...marginPair(earlier, later, sound),
          beforeStanding: worstOf(earlier),
          afterStanding: worstOf(later),
          bands: bandChanges(earlier, later, sound),
        },
      ];
    }),
  );
}

/** The detector that decided the lowest margin of a side; null without a margin. */
export function decidingDetector(side: readonly ComparedSweep[]): Detector | null {
  let lowest: ComparedMargin | null = null;
  for (const sweep of side)
    for (const line of sweep.readings.flatMap((reading) => reading.lines))
      if (
        line.marginDb !== null &&
        (lowest?.marginDb === undefined ||
          lowest.marginDb === null ||
          line.marginDb < lowest.marginDb)
      )
        lowest = line;
  return lowest?.decidedBy ?? null;
}
