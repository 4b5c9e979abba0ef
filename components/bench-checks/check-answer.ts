import { formatDelta } from "@/lib/core/units/format";

/** One check as lists show it; drifts in dB, days as ISO dates. */
export interface CheckSummary {
  id: string;
  measuredOn: string;
  source: string;
  isReference: boolean;
  reference: { id: string; measuredOn: string; archived: boolean } | null;
  driftMeanDb: number | null;
  driftWorstDb: number | null;
  lines: number;
  sunk: number;
  missing: number;
  fileName: string;
  checkedBy: string;
  archived: boolean;
}

export interface CheckAnswer {
  /** null: there is no drift yet. */
  number: string | null;
  words: string;
  /** Outside the tolerance, or not known for today. */
  isDoubt: boolean;
  rest: string[];
  checkId: string | null;
}

const relative = new Intl.RelativeTimeFormat("en", { numeric: "auto" });

/** How long ago an ISO day was, in days: "today", "yesterday", "12 days ago". */
export function daysAgo(day: string, today: string): string {
  const days = Math.round((Date.parse(day) - Date.parse(today)) / 86_400_000);
  return relative.format(days, "day");
}

/** Whether a drift lies outside the tolerance, both in dB. */
export function isDrifted(driftDb: number | null, toleranceDb: number): boolean {
  return driftDb !== null && Math.abs(driftDb) > toleranceDb;
}

/** The check that stands for the newest day: of each source the last, of these the farthest off. */
function standingCheck(checks: readonly CheckSummary[]): CheckSummary | null {
  const day = checks[0]?.measuredOn;
  const seen = new Set<string>();
  let worst: CheckSummary | null = null;
  for (const check of checks) {
    const source = check.source.toLowerCase();
    if (check.measuredOn !== day || seen.has(source)) continue;
    seen.add(source);
    if (!worst || Math.abs(check.driftWorstDb ?? 0) > Math.abs(worst.driftWorstDb ?? 0))
      worst = check;
  }
  return worst;
}

const linesWords = (n: number) => (n === 1 ? "1 line" : `${n} lines`);

/**
 * "Can I trust the bench today?" from the checks, newest first: the largest drift of the newest
 * day, whether it lies within the tolerance, and how long ago that was.
 */
export function checkAnswer(
  all: readonly CheckSummary[],
  toleranceDb: number,
  today: string,
): CheckAnswer {
  const open = all.filter((check) => !check.archived);
  const check = standingCheck(open.filter(({ isReference }) => !isReference));
  if (!check) {
    const reference = open.find(({ isReference }) => isReference);
    const words = reference
      ? `The reference of ${reference.source} stands; no check has been compared with it yet.`
      : "This bench has not been checked yet.";
    return { number: null, words, isDoubt: false, rest: [], checkId: null };
  }
  const { measuredOn, source, driftWorstDb, sunk, missing, reference } = check;
  const isToday = measuredOn === today;
  const drifted = isDrifted(driftWorstDb, toleranceDb);
  const where = `${drifted ? "outside" : "within"} the tolerance of ±${toleranceDb} dB`;
  return {
    number: formatDelta(driftWorstDb),
    words: isToday
      ? `is the largest drift of today's check of ${source}, ${where}.`
      : `was the largest drift of ${source} ${daysAgo(measuredOn, today)}, ${where}.`,
    isDoubt: drifted || !isToday,
    rest: [
      ...(isToday ? [] : ["The bench has not been checked today."]),
      ...(drifted ? ["Look for the cause before you trust a sweep of that day."] : []),
      ...(missing > 0
        ? [
            `${linesWords(missing)} of the reference ${missing === 1 ? "has" : "have"} no level here.`,
          ]
        : []),
      ...(sunk > 0
        ? [`${linesWords(sunk)} no longer ${sunk === 1 ? "stands" : "stand"} out.`]
        : []),
      ...(reference?.archived ? ["Its reference was archived since."] : []),
    ],
    checkId: check.id,
  };
}
