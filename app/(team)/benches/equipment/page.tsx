import type { Metadata } from "next";
import Link from "next/link";
import { EquipmentAnswer } from "@/components/equipment/equipment-answer";
import {
  EQUIPMENT_VIEWS,
  EquipmentFilter,
  filterEquipment,
} from "@/components/equipment/equipment-filter";
import { EquipmentTable } from "@/components/equipment/equipment-table";
import { ButtonLink } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { today } from "@/lib/adapters/clock";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listEquipment } from "@/lib/queries/equipment/list-equipment";
import type { SearchParams } from "../search-params";

export const metadata: Metadata = { title: "Equipment" };

export default async function EquipmentPage(props: { searchParams: Promise<SearchParams> }) {
  const { show } = await props.searchParams;
  const view = EQUIPMENT_VIEWS.find((known) => known === show) ?? "all";
  const ctx = await currentContext();
  const mayWrite = isAllowed(ctx, "bench.write");
  const all = await listEquipment(ctx, today());
  const shown = filterEquipment(all, view);
  return (
    <>
      <PageHead
        title="Equipment"
        trail={[{ href: "/benches", label: "Benches" }]}
        lead="What is due?"
        actions={
          mayWrite ? (
            <ButtonLink look="primary" href="/benches/equipment/new">
              New equipment
            </ButtonLink>
          ) : undefined
        }
      />
      <EquipmentAnswer equipment={filterEquipment(all, "all")} />
      {all.length === 0 ? (
        <EmptyState>
          No equipment yet.{" "}
          {mayWrite
            ? "Add the instrument of a bench and the transducers in front of it, then record their calibrations: Neap tells you before one falls due."
            : "An engineer of your team adds it."}
        </EmptyState>
      ) : (
        <>
          <EquipmentFilter all={all} view={view} />
          {shown.length > 0 ? (
            <EquipmentTable equipment={shown} />
          ) : (
            <EmptyState>
              Nothing here is shown in this view.{" "}
              <Link href="/benches/equipment" className="text-deep underline">
                Show all equipment
              </Link>
            </EmptyState>
          )}
        </>
      )}
    </>
  );
}
