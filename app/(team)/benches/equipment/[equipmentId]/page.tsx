import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { CalibrationForm } from "@/components/equipment/calibration-form";
import { CalibrationHistory } from "@/components/equipment/calibration-history";
import { DueMark } from "@/components/equipment/due-mark";
import { EquipmentArchiveButton } from "@/components/equipment/equipment-archive-button";
import { UseLinks } from "@/components/equipment/equipment-table";
import { EQUIPMENT_KIND_LABELS } from "@/components/equipment/equipment-words";
import { ButtonLink } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { Facts } from "@/components/ui/facts";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { today } from "@/lib/adapters/clock";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { dueState } from "@/lib/core/bench/due-state";
import { readEquipment } from "@/lib/queries/equipment/read-equipment";
import { readTypedTable } from "../../actions";
import {
  addCalibration,
  bringEquipmentBack,
  putEquipmentAway,
  takeCalibrationBack,
} from "../actions";

export const metadata: Metadata = { title: "Equipment" };

export default async function PieceOfEquipmentPage(props: {
  params: Promise<{ equipmentId: string }>;
}) {
  const { equipmentId } = await props.params;
  const ctx = await currentContext();
  const piece = await readEquipment(ctx, equipmentId);
  if (!piece) notFound();
  const day = today();
  const archived = piece.archivedAt !== null;
  const mayChange = isAllowed(ctx, "bench.write") && !archived;
  const inForce = piece.calibrations.find((c) => c.withdrawnAt === null);
  return (
    <>
      <PageHead
        title={piece.name}
        trail={[
          { href: "/benches", label: "Benches" },
          { href: "/benches/equipment", label: "Equipment" },
        ]}
        lead={archived ? "This is archived." : "Is its calibration in date?"}
        actions={
          isAllowed(ctx, "bench.write") ? (
            <>
              {archived ? null : (
                <ButtonLink href={`/benches/equipment/${piece.id}/edit`}>Edit equipment</ButtonLink>
              )}
              <EquipmentArchiveButton
                piece={{ id: piece.id, name: piece.name, archived }}
                archive={putEquipmentAway}
                restore={bringEquipmentBack}
              />
            </>
          ) : undefined
        }
      />
      <p className="mb-6 text-lg">
        {inForce?.dueOn ? (
          <>
            due on <span className="mr-1.5 font-mono text-4xl">{inForce.dueOn}</span>{" "}
          </>
        ) : null}
        <DueMark state={inForce ? dueState(inForce.dueOn, day) : "uncalibrated"} />
      </p>
      <Facts
        items={[
          { label: "Kind", value: EQUIPMENT_KIND_LABELS[piece.kind] },
          { label: "Inventory or serial number", value: piece.inventoryNumber || null, mono: true },
          { label: "Calibrated on", value: inForce?.calibratedOn ?? null, mono: true },
          { label: "Stands on", value: <UseLinks uses={piece.uses} /> },
          { label: "Notes", value: piece.notes || null },
        ]}
      />
      <Section
        title="Calibrations"
        lead="Newest first. A sweep keeps the dates that were in force when it was imported."
      >
        {piece.calibrations.length > 0 ? (
          <CalibrationHistory
            equipmentId={piece.id}
            calibrations={piece.calibrations}
            today={day}
            withdraw={mayChange ? takeCalibrationBack : null}
          />
        ) : (
          <EmptyState>
            No calibration is on record yet.
            {mayChange ? " Record the one on its certificate below." : null}
          </EmptyState>
        )}
      </Section>
      {mayChange ? (
        <Section title="Record a calibration">
          <CalibrationForm
            equipmentId={piece.id}
            hasFactors={piece.kind !== "instrument"}
            record={addCalibration}
            readTable={readTypedTable}
          />
        </Section>
      ) : null}
    </>
  );
}
