import { TRANSDUCER_KINDS } from "./signal-path";

/** What a bench is made of and what can be calibrated: the instrument and its transducers. */
export const EQUIPMENT_KINDS = ["instrument", ...TRANSDUCER_KINDS] as const;
export type EquipmentKind = (typeof EQUIPMENT_KINDS)[number];

/** The instrument of a sweep as it was on the day of the import; ISO dates or null: not stated. */
export interface SweepInstrument {
  equipmentId: string;
  name: string;
  calibratedOn: string | null;
  dueOn: string | null;
}
