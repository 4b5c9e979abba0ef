import { and, desc, eq, isNull, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { benchChecks } from "@/db/schema";
import type { BenchCheckContent } from "@/lib/core/bench/bench-check";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency } from "@/lib/core/units/format";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import type { FieldErrors } from "../result";
import { CommandError } from "../result";

export interface CheckReference {
  id: string;
  measuredOn: string;
  content: BenchCheckContent;
}

/** The newest open reference of a bench for a source, whose case does not matter; or a refusal. */
export async function findReference(
  tx: Transaction,
  teamId: string,
  benchId: string,
  source: string,
): Promise<CheckReference> {
  const ofBench = and(
    eq(benchChecks.teamId, teamId),
    eq(benchChecks.benchId, benchId),
    eq(benchChecks.isReference, true),
    isNull(benchChecks.archivedAt),
  );
  const [reference] = await tx
    .select({
      id: benchChecks.id,
      measuredOn: benchChecks.measuredOn,
      content: benchChecks.content,
    })
    .from(benchChecks)
    .where(and(ofBench, sql`lower(${benchChecks.source}) = lower(${source})`))
    .orderBy(desc(benchChecks.measuredOn), desc(benchChecks.createdAt))
    .limit(1);
  if (reference) return reference;
  const others = await tx
    .selectDistinct({ source: benchChecks.source })
    .from(benchChecks)
    .where(ofBench)
    .orderBy(benchChecks.source);
  const known = others.map((other) => `"${other.source}"`).join(", ");
  const text = `This bench has no reference of "${source}"${known ? `, only of ${known}` : ""}. Record one first, or make this sweep the reference.`;
  throw new CommandError("conflict", text, { source: text });
}

type Taken = Pick<BenchCheckContent, "unit" | "detector" | "rbwHz">;

const rbwWords = (hz: number | null) => (hz === null ? "not stated" : formatFrequency(hz));

/** A file that says 0.12 MHz and one that says 120 kHz differ in the last binary digits. */
const isSameRbw = (a: number | null, b: number | null) =>
  a !== null && b !== null && Math.abs(a - b) <= 1e-6 * b;

/** Refuses what cannot be compared, and says at the field what the reference has instead. */
export function refuseDifferent(check: Taken, reference: CheckReference): void {
  const { content, measuredOn } = reference;
  const detectorWords = ({ detector }: Taken) =>
    detector === null ? "not stated" : DETECTOR_LABELS[detector];
  const inFile: string[] = [];
  const fieldErrors: FieldErrors = {};
  if (check.unit !== content.unit)
    inFile.push(
      `Its levels are in ${LEVEL_UNIT_LABELS[check.unit]}, those of the reference in ${LEVEL_UNIT_LABELS[content.unit]}.`,
    );
  if (check.detector !== content.detector)
    inFile.push(
      `Its detector is ${detectorWords(check)}, that of the reference ${detectorWords(content)}.`,
    );
  if (inFile.length > 0) fieldErrors.file = inFile.join(" ");
  if (!isSameRbw(check.rbwHz, content.rbwHz))
    fieldErrors.rbwHz = `The reference was taken with an RBW of ${rbwWords(content.rbwHz)}, not ${rbwWords(check.rbwHz)}.`;
  const reasons = Object.values(fieldErrors);
  if (reasons.length > 0)
    throw new CommandError(
      "conflict",
      `The check was not stored: it cannot be compared with the reference of ${measuredOn}. ${reasons.join(" ")}`,
      fieldErrors,
    );
}
