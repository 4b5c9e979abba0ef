import type { EquipmentKind } from "@/lib/core/bench/equipment";
import type { FactorPoint, SignalPath } from "@/lib/core/bench/signal-path";
import { draftTable, type TransducerDraft } from "./transducer-draft";

/** A piece of equipment with what its newest calibration says. */
export interface EquipmentToChoose {
  id: string;
  kind: EquipmentKind;
  name: string;
  inventoryNumber: string;
  calibratedOn: string | null;
  dueOn: string | null;
  factors: FactorPoint[] | null;
}

/** What can stand in a signal path; one that is chosen but gone (archived) keeps a line of its own. */
export function equipmentOptions(equipment: readonly EquipmentToChoose[], chosen: string) {
  const transducers = equipment.filter((piece) => piece.kind !== "instrument");
  const isGone = chosen !== "" && !transducers.some((piece) => piece.id === chosen);
  return [
    { value: "", label: "none named" },
    ...(isGone ? [{ value: chosen, label: "archived equipment" }] : []),
    ...transducers.map(({ id, name, inventoryNumber }) => ({
      value: id,
      label: inventoryNumber ? `${name} (${inventoryNumber})` : name,
    })),
  ];
}

/**
 * What choosing a piece changes in a draft. A table is replaced only where the newest calibration
 * brought one: typed factors are never lost to an empty table.
 */
export function fillFromEquipment(piece: EquipmentToChoose | undefined): Partial<TransducerDraft> {
  if (!piece || piece.kind === "instrument") return { equipmentId: "" };
  return {
    equipmentId: piece.id,
    name: piece.name,
    kind: piece.kind,
    calibratedOn: piece.calibratedOn ?? "",
    dueOn: piece.dueOn ?? "",
    ...(piece.factors === null ? {} : draftTable(piece.factors)),
  };
}

/** The path with dates and factors of the newest calibrations, and what that changed in words. */
export function pathWithNewest(
  path: SignalPath,
  equipment: readonly EquipmentToChoose[],
): { path: SignalPath; changes: string[] } {
  const changes: string[] = [];
  const transducers = path.transducers.map((transducer) => {
    const piece = equipment.find((e) => e.id === transducer.equipmentId);
    if (!piece || piece.calibratedOn === null) return transducer;
    const { calibratedOn, dueOn, factors } = piece;
    if (calibratedOn === transducer.calibratedOn && dueOn === transducer.dueOn) return transducer;
    changes.push(
      `${transducer.name}: calibration of ${calibratedOn}${factors === null ? ", which brings no factors, so the table is still the earlier one" : " with its factors"}.`,
    );
    return { ...transducer, calibratedOn, dueOn, factors: factors ?? transducer.factors };
  });
  return { path: { ...path, transducers }, changes };
}
