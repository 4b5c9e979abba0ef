import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { BenchArchiveButton } from "@/components/benches/bench-archive-button";
import { BenchCautions } from "@/components/benches/bench-cautions";
import { BudgetSection } from "@/components/benches/budget-section";
import { GapNote } from "@/components/benches/gap-note";
import { InstrumentState } from "@/components/benches/instrument-state";
import { PathAnswer } from "@/components/benches/path-answer";
import { RevisionList } from "@/components/benches/revision-list";
import { SignalPathTable } from "@/components/benches/signal-path-table";
import { FactorChart } from "@/components/charts/factor-chart";
import { ButtonLink } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { Facts } from "@/components/ui/facts";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { today } from "@/lib/adapters/clock";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { readBench } from "@/lib/queries/bench/read-bench";
import { readBenchQuality } from "@/lib/queries/bench/read-bench-quality";
import { bringBenchBack, putBenchAway } from "../actions";
import type { SearchParams } from "../search-params";
import { readRevisionParam } from "../search-params";
import { BenchCheckSection } from "./checks/bench-check-section";

export const metadata: Metadata = { title: "Bench" };

interface BenchPageProps {
  params: Promise<{ benchId: string }>;
  searchParams: Promise<SearchParams>;
}

export default async function BenchPage(props: BenchPageProps) {
  const { benchId } = await props.params;
  const asked = readRevisionParam(await props.searchParams);
  const ctx = await currentContext();
  const bench = await readBench(ctx, benchId);
  const current = bench?.revisions[0];
  const shown = asked === null ? current : bench?.revisions.find((r) => r.revision === asked);
  if (!bench || !current || !shown) notFound();
  const quality = await readBenchQuality(ctx, bench.id, current.content);
  if (!quality) notFound();
  const day = today();
  const { transducers, impedanceOhm } = shown.content;
  const mayWrite = isAllowed(ctx, "bench.write");
  const archived = bench.archivedAt !== null;
  return (
    <>
      <PageHead
        title={bench.name}
        trail={[{ href: "/benches", label: "Benches" }]}
        lead={archived ? "This bench is archived." : "Can I trust this arrangement?"}
        actions={
          mayWrite ? (
            <>
              {archived ? null : (
                <ButtonLink href={`/benches/${bench.id}/edit`}>Edit bench</ButtonLink>
              )}
              <BenchArchiveButton
                bench={{ id: bench.id, name: bench.name, archived }}
                archive={putBenchAway}
                restore={bringBenchBack}
              />
            </>
          ) : undefined
        }
      />
      <PathAnswer transducers={current.content.transducers} today={day} />
      <Facts
        items={[
          { label: "Site", value: bench.site || null },
          {
            label: "Instrument",
            value: (
              <InstrumentState
                instrument={quality.instrument}
                words={bench.instrument}
                today={day}
              />
            ),
          },
          {
            label: "Distance",
            value: bench.distanceM === null ? null : `${bench.distanceM} m`,
            mono: true,
          },
          {
            label: "Guard",
            value: bench.guardDb === 0 ? "none" : `${bench.guardDb} dB`,
            mono: bench.guardDb !== 0,
          },
          { label: "Drift allowed in a check", value: `${bench.checkToleranceDb} dB`, mono: true },
          { label: "Impedance", value: <Ohms value={impedanceOhm} /> },
          { label: "Notes", value: bench.notes || null },
        ]}
      />
      <Section
        title={shown === current ? "Signal path" : `Signal path, revision ${shown.revision}`}
        lead={
          shown === current
            ? undefined
            : `An earlier revision; revision ${current.revision} is the current one.`
        }
        actions={
          mayWrite && !archived ? (
            <ButtonLink href={`/benches/${bench.id}/signal-path`}>Edit signal path</ButtonLink>
          ) : undefined
        }
      >
        <GapNote
          gaps={quality.gaps}
          href={mayWrite && !archived ? `/benches/${bench.id}/signal-path?newest=1` : null}
        />
        {transducers.length > 0 ? (
          <>
            <SignalPathTable path={shown.content} today={day} />
            <div className="mt-6">
              <FactorChart transducers={transducers} />
            </div>
          </>
        ) : (
          <EmptyState>
            No transducers: levels at the instrument&apos;s input are taken as they are, and only
            masks in voltage can be held against them.
          </EmptyState>
        )}
      </Section>
      <BenchCheckSection ctx={ctx} benchId={bench.id} />
      <BudgetSection
        rule={quality.guardRule}
        guardDb={quality.guardDb}
        newest={quality.budgets[0] ?? null}
        href={mayWrite && !archived ? `/benches/${bench.id}/budget` : null}
      />
      <Section title="Before you connect anything">
        <BenchCautions kinds={transducers.map((t) => t.kind)} />
      </Section>
      <Section
        title="Revisions"
        lead="A sweep keeps the signal path it was taken with; saving adds a revision."
      >
        <RevisionList
          revisions={bench.revisions.map(({ revision, createdAt, content }) => ({
            revision,
            createdAt,
            summary: content.transducers.map((t) => t.name).join(" → ") || "no transducers",
          }))}
          shown={shown.revision}
          href={(revision) => `/benches/${bench.id}?revision=${revision}`}
        />
      </Section>
    </>
  );
}

/** The number in the number's face; only the interface's face has the sign. */
function Ohms({ value }: { value: number }) {
  return (
    <>
      <span className="font-mono">{value}</span> Ω
    </>
  );
}
