"use client";

import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { SelectField } from "@/components/ui/select-field";
import { TRANSDUCER_KINDS } from "@/lib/core/bench/signal-path";
import { equipmentOptions, type EquipmentToChoose } from "./fill-from-equipment";
import { FactorTableField } from "./factor-table-field";
import type { TransducerDraft } from "./transducer-draft";
import { FACTOR_MEANINGS, TRANSDUCER_KIND_LABELS } from "./transducer-kinds";

const KIND_OPTIONS = [
  { value: "", label: "Choose…" },
  ...TRANSDUCER_KINDS.map((kind) => ({ value: kind, label: TRANSDUCER_KIND_LABELS[kind] })),
];

interface TransducerFieldsProps {
  draft: TransducerDraft;
  place: number;
  count: number;
  equipment: readonly EquipmentToChoose[];
  /** Error of one field ("name", "dueOn", "factors"), as the server said it. */
  errorOf: (field: string) => string | undefined;
  onPatch: (change: Partial<TransducerDraft>) => void;
  onTable: (change: Partial<TransducerDraft>) => void;
  /** A piece was chosen, or none: what is known of it is filled in. */
  onEquipment: (equipmentId: string) => void;
  onMove: (by: -1 | 1) => void;
  onRemove: () => void;
}

/** One transducer of the path with its place, its dates and its factor table. */
export function TransducerFields(props: TransducerFieldsProps) {
  const { draft, place, count, errorOf, onPatch, onTable, onMove, onRemove } = props;
  const chosen = props.equipment.find((piece) => piece.id === draft.equipmentId);
  const at = `transducers.${place}`;
  const called = draft.name.trim() || `transducer ${place + 1}`;
  return (
    <fieldset className="mb-6 min-w-0 border border-rule bg-sheet p-4">
      <legend className="px-2 font-title text-lg">
        {place + 1}. {draft.name.trim() || "New transducer"}
      </legend>
      <div className="mb-3 flex flex-wrap gap-2">
        <Button
          look="quiet"
          disabled={place === 0}
          aria-label={`Move ${called} towards the field`}
          onClick={() => onMove(-1)}
        >
          Towards the field
        </Button>
        <Button
          look="quiet"
          disabled={place === count - 1}
          aria-label={`Move ${called} towards the instrument`}
          onClick={() => onMove(1)}
        >
          Towards the instrument
        </Button>
        <Button look="quiet" aria-label={`Remove ${called}`} onClick={onRemove}>
          Remove
        </Button>
      </div>
      <div className="grid gap-x-6 sm:grid-cols-2">
        <div>
          <SelectField
            label="Equipment"
            name={`${at}.equipmentId`}
            options={equipmentOptions(props.equipment, draft.equipmentId)}
            value={draft.equipmentId}
            hint={
              chosen && chosen.factors === null
                ? "Its newest calibration brings no factors: the table beside is as you typed it."
                : "Fills in name, kind, dates and factors from its newest calibration."
            }
            onChange={(event) => props.onEquipment(event.target.value)}
            error={errorOf("equipmentId")}
          />
          <Field
            label="Name"
            name={`${at}.name`}
            value={draft.name}
            autoFocus={draft.name === "" && draft.text === ""}
            onChange={(event) => onPatch({ name: event.target.value })}
            error={errorOf("name")}
          />
          <SelectField
            label="Kind"
            name={`${at}.kind`}
            options={KIND_OPTIONS}
            value={draft.kind}
            hint={draft.kind !== "" ? FACTOR_MEANINGS[draft.kind] : undefined}
            onChange={(event) =>
              onPatch({
                kind: TRANSDUCER_KINDS.find((known) => known === event.target.value) ?? "",
              })
            }
            error={errorOf("kind")}
          />
          <div className="grid gap-x-4 lg:grid-cols-2">
            <Field
              label="Calibrated on"
              name={`${at}.calibratedOn`}
              type="date"
              value={draft.calibratedOn}
              onChange={(event) => onPatch({ calibratedOn: event.target.value })}
              error={errorOf("calibratedOn")}
            />
            <Field
              label="Calibration due on"
              name={`${at}.dueOn`}
              type="date"
              value={draft.dueOn}
              onChange={(event) => onPatch({ dueOn: event.target.value })}
              error={errorOf("dueOn")}
            />
          </div>
        </div>
        <FactorTableField
          draft={draft}
          name={`${at}.factors`}
          error={errorOf("factors")}
          onChange={onTable}
        />
      </div>
    </fieldset>
  );
}
