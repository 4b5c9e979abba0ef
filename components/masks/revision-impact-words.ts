import type { Standing } from "@/lib/core/reading/reading";
import { formatDelta } from "@/lib/core/units/format";

/** Where a sweep stands under a revision; null when it is not held against it. */
interface Held {
  standing: Standing;
  marginDb: number;
}

export interface ChangedSweep {
  sweepId: string;
  name: string;
  programName: string;
  buildName: string;
  onRecord: boolean;
  before: Held | null;
  after: Held | null;
  changeDb: number | null;
}

/** What a revision that is not saved yet would change for the sweeps that are here. */
export interface Impact {
  revision: number;
  inForceRevision: number;
  looked: number;
  more: number;
  summary: {
    standings: number;
    onRecord: number;
    becomeOver: number;
    becomeUndecided: number;
    becomeUnheld: number;
    becomeHeld: number;
    largestChangeDb: number | null;
  };
  changed: ChangedSweep[];
}

const sweeps = (count: number) => `${count} ${count === 1 ? "sweep" : "sweeps"}`;

/** The one sentence: how many sweeps change their standing, and into what. */
export function describeStandings({ looked, summary, changed }: Impact): string {
  if (summary.standings === 0) {
    const margins = changed.length === 0 ? " and none its margin" : "";
    return `None of ${sweeps(looked)} changes its standing${margins}.`;
  }
  const count = `${summary.standings} of ${sweeps(looked)}`;
  const into = (n: number, what: string, many = what.replace("becomes", "become")) =>
    n === 0 ? [] : [`${n} ${n === 1 ? what : many}`];
  const parts = [
    ...into(summary.becomeOver, "becomes over"),
    ...into(summary.becomeUndecided, "becomes undecided"),
    ...into(summary.becomeUnheld, "is no longer reached", "are no longer reached"),
    ...into(summary.becomeHeld, "is newly reached", "are newly reached"),
  ];
  const tail = parts.length === 0 ? "" : `; ${parts.join(", ")}`;
  return `${count} ${summary.standings === 1 ? "changes its" : "change their"} standing${tail}.`;
}

/** What else has to be known before saving, a sentence each. */
export function describeRest({ revision, inForceRevision, more, summary }: Impact): string[] {
  const { onRecord, standings, largestChangeDb } = summary;
  return [
    ...(standings > 0
      ? [
          onRecord === 0
            ? "None of them is on the line of record."
            : `${onRecord} of them ${onRecord === 1 ? "is" : "are"} on the line of record.`,
        ]
      : []),
    ...(largestChangeDb === null
      ? []
      : [`The largest change of margin is ${formatDelta(largestChangeDb)}.`]),
    ...(more > 0
      ? [
          `Only the newest sweeps were looked at; ${sweeps(more)} more ${more === 1 ? "is" : "are"} read once the revision is saved.`,
        ]
      : []),
    ...(inForceRevision < revision - 1
      ? [
          `Compared with revision ${inForceRevision}, which is in force; revision ${revision} would take the place of revision ${revision - 1}, whose sweeps are still being read.`,
        ]
      : []),
  ];
}
