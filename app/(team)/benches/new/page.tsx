import type { Metadata } from "next";
import { BenchForm } from "@/components/benches/bench-form";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listEquipmentChoices } from "@/lib/queries/equipment/list-equipment-choices";
import { addBench } from "../actions";

export const metadata: Metadata = { title: "New bench" };

export default async function NewBenchPage() {
  const ctx = await currentContext();
  const instruments = (await listEquipmentChoices(ctx)).filter((e) => e.kind === "instrument");
  return (
    <>
      <PageHead
        title="New bench"
        trail={[{ href: "/benches", label: "Benches" }]}
        lead="The signal path comes next."
      />
      {isAllowed(ctx, "bench.write") ? (
        <BenchForm action={addBench} instruments={instruments} />
      ) : (
        <p>Your role in this team may read benches, not change them.</p>
      )}
    </>
  );
}
