import { expandedUncertainty } from "@/lib/core/bench/expanded-uncertainty";
import { U_CISPR_DB } from "@/lib/core/bench/guard";
import type { UncertaintyBudget } from "@/lib/core/bench/uncertainty-budget";
import type { SnapshotBudget } from "./report-content";

/** JSON knows no infinity. */
const finite = (degrees: number) => (Number.isFinite(degrees) ? degrees : null);

/** A budget with its results, frozen: a later engine may not change what was issued. */
export function snapshotBudget(budget: UncertaintyBudget, revision: number): SnapshotBudget {
  const result = expandedUncertainty(budget);
  const { combinedDb, coverageFactor, expandedDb, student } = result;
  const { reference } = budget;
  return {
    revision,
    title: budget.title,
    lines: result.lines.map(({ line, contributionDb, degreesOfFreedom }) => ({
      name: line.name,
      value: line.value,
      distribution: line.distribution,
      observations: line.observations,
      sensitivity: line.sensitivity,
      contributionDb,
      degreesOfFreedom: finite(degreesOfFreedom),
    })),
    combinedDb,
    effectiveDegrees: finite(result.effectiveDegrees),
    coverageFactor,
    expandedDb,
    student,
    reference: reference && { measurement: reference, uncertaintyDb: U_CISPR_DB[reference] },
  };
}
