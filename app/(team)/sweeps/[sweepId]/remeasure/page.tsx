import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { UnconfirmedMark } from "@/components/masks/unconfirmed-mark";
import { BenchSheet } from "@/components/readings/bench-sheet";
import { PrintButton } from "@/components/readings/print-button";
import { RemeasureOmitted } from "@/components/readings/remeasure-omitted";
import { MeasurementFacts } from "@/components/sweeps/sweep-facts";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { currentContext } from "@/lib/auth/session";
import { remeasureRows } from "@/lib/core/reading/remeasure-rows";
import { readSweepDetail } from "@/lib/queries/sweep/read-sweep";

export const metadata: Metadata = { title: "Measure again" };

interface RemeasurePageProps {
  params: Promise<{ sweepId: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function RemeasurePage(props: RemeasurePageProps) {
  const { sweepId } = await props.params;
  const { mask: maskId } = await props.searchParams;
  const sweep = await readSweepDetail(await currentContext(), sweepId);
  const held = sweep?.readings.find((reading) => reading.maskId === maskId);
  if (!sweep || !held) notFound();
  const rows = remeasureRows(held.reading, [sweep]);
  return (
    <>
      <PageHead
        title="Measure again"
        trail={[{ href: `/sweeps/${sweep.id}?mask=${held.maskId}`, label: sweep.name }]}
        lead={
          <>
            {`${sweep.programName} ${sweep.buildName} · ${sweep.benchName} · ${held.mask.title}`}{" "}
            <UnconfirmedMark provenance={held.mask.provenance} />
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
          <RemeasureOmitted count={held.reading.remeasureOmitted} />
          <BenchSheet rows={rows} unit={held.reading.unit} />
        </>
      )}
      <Section title="As it was swept">
        <MeasurementFacts settings={sweep.settings} />
      </Section>
    </>
  );
}
