import { TRANSDUCER_KIND_LABELS } from "@/components/benches/transducer-kinds";
import type { DueState } from "@/lib/core/bench/due-state";
import type { EquipmentKind } from "@/lib/core/bench/equipment";

export const EQUIPMENT_KIND_LABELS: Record<EquipmentKind, string> = {
  instrument: "instrument",
  ...TRANSDUCER_KIND_LABELS,
};

/** "uncalibrated": no calibration is on record at all. */
export type EquipmentState = DueState | "uncalibrated";

export const STATE_WORDS: Record<EquipmentState, string> = {
  overdue: "overdue",
  "due-soon": "due within 30 days",
  uncalibrated: "no calibration on record",
  undated: "no due date stated",
  "in-date": "in date",
};

interface Counted {
  state: EquipmentState;
}

/** "What is due?" in one number and words; what is archived is left out before. */
export function dueAnswer(equipment: readonly Counted[]) {
  const count = (state: EquipmentState) => equipment.filter((e) => e.state === state).length;
  const overdue = count("overdue");
  const soon = count("due-soon");
  const unknown = count("uncalibrated") + count("undated");
  const rest = [
    ...(soon > 0 ? [`${soon} more ${soon === 1 ? "falls" : "fall"} due within 30 days`] : []),
    ...(unknown > 0
      ? [`of ${unknown} nobody stated when ${unknown === 1 ? "it is" : "they are"} due`]
      : []),
  ].join("; ");
  return {
    number: String(overdue),
    words: overdue === 1 ? "calibration is overdue." : "calibrations are overdue.",
    rest: rest === "" ? "" : `${rest[0]?.toUpperCase()}${rest.slice(1)}.`,
  };
}
