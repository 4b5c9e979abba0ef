import type { EquipmentState } from "./equipment-words";
import { STATE_WORDS } from "./equipment-words";

/** The state of a calibration in its words; what needs doing stands out. */
export function DueMark({ state }: { state: EquipmentState }) {
  const isQuiet = state === "in-date" || state === "undated";
  return (
    <span className={isQuiet ? "" : "bg-shoal-bed px-1 text-shoal"}>{STATE_WORDS[state]}</span>
  );
}
