import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { EquipmentForm } from "@/components/equipment/equipment-form";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { readEquipment } from "@/lib/queries/equipment/read-equipment";
import { changeEquipment } from "../../actions";

export const metadata: Metadata = { title: "Edit equipment" };

export default async function EditEquipmentPage(props: {
  params: Promise<{ equipmentId: string }>;
}) {
  const { equipmentId } = await props.params;
  const ctx = await currentContext();
  const piece = await readEquipment(ctx, equipmentId);
  if (!piece) notFound();
  const { id, kind, name, inventoryNumber, notes } = piece;
  return (
    <>
      <PageHead
        title="Edit equipment"
        trail={[
          { href: "/benches", label: "Benches" },
          { href: "/benches/equipment", label: "Equipment" },
          { href: `/benches/equipment/${id}`, label: name },
        ]}
      />
      {!isAllowed(ctx, "bench.write") ? (
        <p>Your role in this team may read equipment, not change it.</p>
      ) : piece.archivedAt !== null ? (
        <p>This is archived: restore it before changing it.</p>
      ) : (
        <EquipmentForm
          action={changeEquipment}
          piece={{ id, kind, name, inventoryNumber, notes }}
        />
      )}
    </>
  );
}
