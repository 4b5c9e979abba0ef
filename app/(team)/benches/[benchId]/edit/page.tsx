import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { BenchForm } from "@/components/benches/bench-form";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { readBench } from "@/lib/queries/bench/read-bench";
import { listEquipmentChoices } from "@/lib/queries/equipment/list-equipment-choices";
import { changeBench } from "../../actions";

export const metadata: Metadata = { title: "Edit bench" };

export default async function EditBenchPage(props: { params: Promise<{ benchId: string }> }) {
  const { benchId } = await props.params;
  const ctx = await currentContext();
  const instruments = (await listEquipmentChoices(ctx)).filter((e) => e.kind === "instrument");
  const bench = await readBench(ctx, benchId);
  if (!bench) notFound();
  const { id, name, site, instrument, instrumentId, distanceM, notes } = bench;
  const { guardDb, guardRule, checkToleranceDb } = bench;
  return (
    <>
      <PageHead
        title="Edit bench"
        trail={[
          { href: "/benches", label: "Benches" },
          { href: `/benches/${id}`, label: name },
        ]}
      />
      {!isAllowed(ctx, "bench.write") ? (
        <p>Your role in this team may read benches, not change them.</p>
      ) : bench.archivedAt !== null ? (
        <p>This bench is archived: restore it before changing it.</p>
      ) : (
        <BenchForm
          action={changeBench}
          instruments={instruments}
          bench={{
            id,
            name,
            site,
            instrument,
            instrumentId,
            distanceM,
            guardDb,
            guardRule,
            checkToleranceDb,
            notes,
          }}
        />
      )}
    </>
  );
}
