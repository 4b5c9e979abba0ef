import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { UnconfirmedMark } from "@/components/masks/unconfirmed-mark";
import { BenchSheet } from "@/components/readings/bench-sheet";
import { PrintButton } from "@/components/readings/print-button";
import { RemeasureOmitted } from "@/components/readings/remeasure-omitted";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { currentContext } from "@/lib/auth/session";
import { remeasureRows } from "@/lib/core/reading/remeasure-rows";
import { readBuild } from "@/lib/queries/program/read-build";
import { readBuildReading } from "@/lib/queries/program/read-build-reading";

export const metadata: Metadata = { title: "Measure again" };

interface RemeasurePageProps {
  params: Promise<{ programId: string; buildId: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function BuildRemeasurePage(props: RemeasurePageProps) {
  const { programId, buildId } = await props.params;
  const { mask: maskId } = await props.searchParams;
  const ctx = await currentContext();
  const build = await readBuild(ctx, buildId);
  const combined = (await readBuildReading(ctx, buildId)).find((c) => c.maskId === maskId);
  if (!build || build.programId !== programId || !combined) notFound();
  const rows = remeasureRows(combined.reading, combined.sweeps);
  const benches = [...new Set(combined.sweeps.map((sweep) => sweep.benchName))].join(", ");
  return (
    <>
      <PageHead
        title="Measure again"
        trail={[
          { href: `/programs/${programId}`, label: build.programName },
          { href: `/programs/${programId}/builds/${buildId}`, label: build.name },
        ]}
        lead={
          <>
            {`${benches} · ${combined.mask.title}`}{" "}
            <UnconfirmedMark provenance={combined.mask.provenance} />
          </>
        }
        actions={rows.length > 0 ? <PrintButton /> : null}
      />
      {rows.length === 0 ? (
        <EmptyState>
          No upper bound lies over this mask: there is nothing to measure again.
        </EmptyState>
      ) : (
        <>
          <RemeasureOmitted count={combined.reading.remeasureOmitted} />
          <BenchSheet rows={rows} unit={combined.reading.unit} />
        </>
      )}
    </>
  );
}
