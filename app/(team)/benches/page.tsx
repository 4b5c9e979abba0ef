import type { Metadata } from "next";
import Link from "next/link";
import { BenchAnswer } from "@/components/benches/bench-answer";
import { BenchTable } from "@/components/benches/bench-table";
import { OverdueNote } from "@/components/equipment/overdue-note";
import { ButtonLink } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { today } from "@/lib/adapters/clock";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listBenches } from "@/lib/queries/bench/list-benches";
import { listEquipment } from "@/lib/queries/equipment/list-equipment";
import type { SearchParams } from "./search-params";
import { showsArchived } from "./search-params";

export const metadata: Metadata = { title: "Benches" };

export default async function BenchesPage(props: { searchParams: Promise<SearchParams> }) {
  const withArchived = showsArchived(await props.searchParams);
  const ctx = await currentContext();
  const mayWrite = isAllowed(ctx, "bench.write");
  const day = today();
  const all = await listBenches(ctx, day);
  const equipment = (await listEquipment(ctx, day)).filter((piece) => !piece.archived);
  const open = all.filter((bench) => !bench.archived);
  const archived = all.length - open.length;
  const shown = withArchived ? all : open;
  return (
    <>
      <PageHead
        title="Benches"
        lead="Can I trust this arrangement?"
        actions={
          <>
            <ButtonLink href="/benches/equipment">Equipment</ButtonLink>
            {mayWrite ? (
              <ButtonLink look="primary" href="/benches/new">
                New bench
              </ButtonLink>
            ) : null}
          </>
        }
      />
      <BenchAnswer benches={open} />
      <OverdueNote equipment={equipment} />
      {shown.length > 0 ? (
        <BenchTable benches={shown} />
      ) : (
        <EmptyState>
          {archived > 0 ? "Every bench is archived. " : "No benches yet. "}
          {mayWrite
            ? "Make one: where it stands, its instrument, and the signal path between field and instrument."
            : "An engineer of your team makes them."}
        </EmptyState>
      )}
      {archived > 0 ? (
        <p className="mt-3 text-sm">
          <Link
            href={withArchived ? "/benches" : "/benches?archived=1"}
            className="text-deep underline"
          >
            {withArchived ? "Hide archived benches" : `Show archived benches (${archived})`}
          </Link>
        </p>
      ) : null}
    </>
  );
}
