import type { Standing } from "@/lib/core/reading/reading";

/** Where a sweep stands under a revision; null when it cannot be held against it or reaches none of it. */
export interface Held {
  standing: Standing;
  marginDb: number;
}

export interface SweepImpact {
  sweepId: string;
  name: string;
  programName: string;
  buildName: string;
  onRecord: boolean;
  before: Held | null;
  after: Held | null;
  /** Margin after minus margin before in dB; null when one of them is not there. */
  changeDb: number | null;
}

export interface ImpactSummary {
  /** Sweeps whose standing changes, and how many of those are on the line of record. */
  standings: number;
  onRecord: number;
  becomeOver: number;
  becomeUndecided: number;
  /** Sweeps that are held now and no longer will be, and the other way round. */
  becomeUnheld: number;
  becomeHeld: number;
  /** Change of margin that is largest either way, signed, in dB; null when none changes. */
  largestChangeDb: number | null;
}

const changesStanding = ({ before, after }: SweepImpact) => before?.standing !== after?.standing;

/** Those whose standing or margin changes: what becomes over first, then by what they lose. */
export function changedSweeps(impacts: readonly SweepImpact[]): SweepImpact[] {
  const rank = (impact: SweepImpact) => {
    if (!changesStanding(impact)) return 2;
    return impact.after?.standing === "over" ? 0 : 1;
  };
  return impacts
    .filter((impact) => changesStanding(impact) || (impact.changeDb ?? 0) !== 0)
    .toSorted((a, b) => rank(a) - rank(b) || (a.changeDb ?? 0) - (b.changeDb ?? 0));
}

export function summarizeImpact(impacts: readonly SweepImpact[]): ImpactSummary {
  const changed = impacts.filter(changesStanding);
  const become = (standing: Standing) =>
    changed.filter(({ after }) => after?.standing === standing).length;
  let largest = 0;
  for (const { changeDb } of impacts)
    if (changeDb !== null && Math.abs(changeDb) > Math.abs(largest)) largest = changeDb;
  return {
    standings: changed.length,
    onRecord: changed.filter(({ onRecord }) => onRecord).length,
    becomeOver: become("over"),
    becomeUndecided: become("undecided"),
    becomeUnheld: changed.filter(({ after }) => after === null).length,
    becomeHeld: changed.filter(({ before }) => before === null).length,
    largestChangeDb: largest === 0 ? null : largest,
  };
}
