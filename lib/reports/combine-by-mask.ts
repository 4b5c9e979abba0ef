import { combineReadings } from "@/lib/core/reading/combine-readings";
import type { LineReading, Reading } from "@/lib/core/reading/reading";
import type {
  ReportContent,
  SnapshotCombined,
  SnapshotReading,
  SnapshotSweep,
} from "./report-content";

interface Held {
  sweep: SnapshotSweep;
  held: SnapshotReading;
}

/** Why the combined standing of a line needs a word, in the words of the sweep that gave it. */
function explain(
  line: Pick<LineReading, "standing" | "worst">,
  coverage: number,
  own: string | null,
) {
  if (line.standing !== "undecided") return null;
  if (line.worst && line.worst.marginDb >= 0 && coverage < 1) {
    const percent = Math.min(99, Math.floor(coverage * 100));
    return `Within the mask on ${percent} % of it; the rest was not swept.`;
  }
  return own;
}

function combine(group: readonly Held[]): SnapshotCombined[] {
  const [first] = group;
  if (!first) return [];
  const { mask, maskRevision, maskRevisionId, confirmation, reading } = first.held;
  const together = combineReadings(
    mask,
    group.map(({ held }) => held.reading),
  );
  const lines = together.lines.flatMap((line, i): LineReading[] => {
    const source = line.source ?? 0;
    const own = group[source]?.held.reading.lines[i] ?? reading.lines[i];
    if (!own) return [];
    const { standing, worst, coverage } = line;
    return [
      {
        ...own,
        standing,
        worst: worst && { ...worst, partIndex: source },
        coverage: { fraction: coverage, gaps: [] },
        bands: [],
        explanation: explain(line, coverage, own.explanation),
      },
    ];
  });
  const all = <T>(pick: (one: Reading) => readonly T[]) =>
    group.flatMap(({ held }, partIndex) =>
      pick(held.reading).map((one) => ({ ...one, partIndex })),
    );
  const doubts = group.flatMap(({ held }) => held.reading.doubts);
  return [
    {
      maskRevisionId,
      maskRevision,
      mask,
      confirmation,
      sweepIds: group.map(({ sweep }) => sweep.sweepId),
      ambient: [],
      reading: {
        ...reading,
        standing: together.standing,
        lines,
        coverage: { fraction: together.coverage, gaps: [] },
        suspects: all((one) => one.suspects)
          .sort((a, b) => (a.marginDb ?? Infinity) - (b.marginDb ?? Infinity))
          .map((suspect, i) => ({ ...suspect, number: i + 1 })),
        remeasure: all((one) => one.remeasure),
        remeasureOmitted: group.reduce((sum, { held }) => sum + held.reading.remeasureOmitted, 0),
        doubts: [...new Map(doubts.map((doubt) => [doubt.text, doubt])).values()],
      },
    },
  ];
}

/**
 * The product sweeps of a report mask by mask as version 1 took them together: from their readings
 * alone, because it kept no levels.
 */
export function combineByMask(
  sweeps: readonly SnapshotSweep[],
): Pick<ReportContent, "combined" | "notHeld"> {
  const groups = new Map<string, Held[]>();
  for (const sweep of sweeps)
    for (const held of sweep.purpose === "product" ? sweep.readings : [])
      groups.set(held.maskRevisionId, [
        ...(groups.get(held.maskRevisionId) ?? []),
        { sweep, held },
      ]);
  const combined: SnapshotCombined[] = [];
  const notHeld: ReportContent["notHeld"] = [];
  for (const group of groups.values()) {
    const comparable = group.filter(({ held }) => held.reading.notComparable === null);
    combined.push(...combine(comparable));
    const [first] = group;
    if (comparable.length > 0 || !first) continue;
    const { mask, maskRevision, confirmation } = first.held;
    notHeld.push({
      title: mask.title,
      maskRevision,
      provenance: mask.provenance,
      confirmation,
      reasons: group.map(({ sweep, held }) => `${sweep.name}: ${held.reading.notComparable ?? ""}`),
    });
  }
  return { combined, notHeld };
}
