export type CalibrationState = "in-date" | "overdue" | "undated";

/** ISO dates compare as text; on its due date a calibration still holds. */
export function calibrationState(dueOn: string | null, today: string): CalibrationState {
  if (dueOn === null) return "undated";
  return dueOn < today ? "overdue" : "in-date";
}

interface BenchCalibrations {
  transducers: number;
  overdue: number;
  undated: number;
}

/** A bench is in date when it has a signal path and every part of it is within its due date. */
function isInDate(bench: BenchCalibrations): boolean {
  return bench.transducers > 0 && bench.overdue === 0 && bench.undated === 0;
}

/** The calibrations of one bench in words. */
export function calibrationWords(bench: BenchCalibrations): string {
  if (bench.transducers === 0) return "no transducers yet";
  if (isInDate(bench)) return "in date";
  return [
    ...(bench.overdue > 0 ? [`${bench.overdue} overdue`] : []),
    ...(bench.undated > 0 ? [`${bench.undated} without a due date`] : []),
  ].join(", ");
}

/** The answer to "Can I trust this arrangement?" over all benches. */
export function calibrationAnswer(benches: readonly BenchCalibrations[]) {
  const inDate = benches.filter(isInDate).length;
  const overdue = benches.filter((b) => b.overdue > 0).length;
  const undated = benches.filter((b) => b.overdue === 0 && b.undated > 0).length;
  const bare = benches.filter((b) => b.transducers === 0).length;
  const have = (n: number) => `${n} ${n === 1 ? "has" : "have"}`;
  const rest = [
    ...(overdue > 0 ? [`${have(overdue)} a calibration overdue`] : []),
    ...(undated > 0 ? [`${have(undated)} a transducer without a due date`] : []),
    ...(bare > 0 ? [`${have(bare)} no transducers yet`] : []),
  ];
  return {
    number: `${inDate} of ${benches.length}`,
    words: `${benches.length === 1 ? "bench has its" : "benches have their"} calibrations in date.`,
    rest: rest.length > 0 ? `${rest.join("; ")}.` : "",
  };
}
