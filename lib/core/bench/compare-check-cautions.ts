import { HOLD_LABELS } from "../sweep/settings";
import { formatFrequency } from "../units/format";
import type { BenchCheckContent } from "./bench-check";

export interface ComparedCheck extends Pick<
  BenchCheckContent,
  "hold" | "rbwHz" | "stepHz" | "corrected"
> {
  /** Revision of the signal path that was applied. */
  pathRevision: number;
}

/**
 * A line midway between two points reads low by 6.02·(step/B₆)² dB through a Gaussian filter, and
 * by half of that where the RBW is a 3 dB one: the larger is told, since which it is, is not asked.
 */
function stepCaution(what: string, { rbwHz, stepHz }: ComparedCheck): string[] {
  if (rbwHz === null || !(stepHz > rbwHz / 2)) return [];
  const lowDb = 6.02 * (stepHz / rbwHz) ** 2;
  return [
    `The step of the ${what}, ${formatFrequency(stepHz)}, is coarser than half the RBW: a line between two points may read up to ${lowDb.toFixed(1)} dB low, which shows as drift.`,
  ];
}

/**
 * What, other than the bench, may stand behind a drift, in sentences; empty when check and
 * reference were taken alike. What makes them not comparable is refused before this.
 */
export function checkCautions(check: ComparedCheck, reference: ComparedCheck): string[] {
  const cautions: string[] = [];
  if (check.pathRevision !== reference.pathRevision && !check.corrected && !reference.corrected)
    cautions.push(
      `Revision ${check.pathRevision} of the signal path was applied here and revision ${reference.pathRevision} to the reference: what differs between the two shows as drift.`,
    );
  if (check.corrected !== reference.corrected) {
    const [own, other] = check.corrected ? ["the instrument", "Neap"] : ["Neap", "the instrument"];
    cautions.push(
      `Here ${own} applied the factors, in the reference ${other} did: a difference between the two tables shows as drift.`,
    );
  }
  if (check.hold !== reference.hold)
    cautions.push(
      `The check was taken with ${HOLD_LABELS[check.hold]}, the reference with ${HOLD_LABELS[reference.hold]}.`,
    );
  return [...cautions, ...stepCaution("check", check), ...stepCaution("reference", reference)];
}
