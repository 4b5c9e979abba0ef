import type { DriftPoint } from "@/components/charts/prepare-drift";
import type { CheckSummary } from "./check-answer";

interface SourceChecks {
  source: string;
  /** Oldest first. */
  points: DriftPoint[];
  /** Days of its references, ISO. */
  references: string[];
}

/** Checks (newest first) by source, whose case does not matter: one drift chart for each. */
export function groupBySource(checks: readonly CheckSummary[], benchId: string): SourceChecks[] {
  const groups = new Map<string, SourceChecks>();
  for (const check of checks) {
    const key = check.source.toLowerCase();
    const group = groups.get(key) ?? { source: check.source, points: [], references: [] };
    groups.set(key, group);
    const { measuredOn, driftWorstDb, driftMeanDb } = check;
    if (check.isReference) group.references.unshift(measuredOn);
    else
      group.points.unshift({
        measuredOn,
        driftWorstDb,
        driftMeanDb,
        referenceId: check.reference?.id ?? null,
        href: `/benches/${benchId}/checks/${check.id}`,
      });
  }
  return [...groups.values()];
}
