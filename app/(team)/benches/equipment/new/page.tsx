import type { Metadata } from "next";
import { EquipmentForm } from "@/components/equipment/equipment-form";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { addEquipment } from "../actions";

export const metadata: Metadata = { title: "New equipment" };

export default async function NewEquipmentPage() {
  const ctx = await currentContext();
  return (
    <>
      <PageHead
        title="New equipment"
        trail={[
          { href: "/benches", label: "Benches" },
          { href: "/benches/equipment", label: "Equipment" },
        ]}
        lead="Its calibrations come next."
      />
      {isAllowed(ctx, "bench.write") ? (
        <EquipmentForm action={addEquipment} />
      ) : (
        <p>Your role in this team may read equipment, not change it.</p>
      )}
    </>
  );
}
