import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { checkAnswer } from "@/components/bench-checks/check-answer";
import { CheckAnswerNote } from "@/components/bench-checks/check-answer-note";
import { CheckTable } from "@/components/bench-checks/check-table";
import { groupBySource } from "@/components/bench-checks/group-by-source";
import { DriftChart } from "@/components/charts/drift-chart";
import { ButtonLink } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listBenchChecks } from "@/lib/queries/bench-check/list-bench-checks";

export const metadata: Metadata = { title: "Bench checks" };

export default async function BenchChecksPage(props: { params: Promise<{ benchId: string }> }) {
  const { benchId } = await props.params;
  const ctx = await currentContext();
  const found = await listBenchChecks(ctx, benchId);
  if (!found) notFound();
  const { bench, checks, today } = found;
  const { toleranceDb } = bench;
  const open = checks.filter((check) => !check.archived);
  const archived = checks.filter((check) => check.archived);
  const mayWrite = isAllowed(ctx, "bench.write") && !bench.archived;
  return (
    <>
      <PageHead
        title="Bench checks"
        trail={[
          { href: "/benches", label: "Benches" },
          { href: `/benches/${bench.id}`, label: bench.name },
        ]}
        lead="Can I trust the bench today?"
        actions={
          mayWrite ? (
            <ButtonLink look="primary" href={`/benches/${bench.id}/checks/new`}>
              Record a check
            </ButtonLink>
          ) : undefined
        }
      />
      {open.length > 0 ? (
        <CheckAnswerNote answer={checkAnswer(checks, toleranceDb, today)} />
      ) : (
        <EmptyState>
          No check yet. Sweep a source that never changes, for instance a comb generator, while the
          bench is known to be sound, and record it as the reference; then sweep it again each day
          before the product.
        </EmptyState>
      )}
      {groupBySource(open, bench.id).map(({ source, points, references }) => (
        <Section key={source} title={`Drift of ${source}`}>
          <DriftChart {...{ points, references, toleranceDb, today }} />
        </Section>
      ))}
      {open.length > 0 ? (
        <Section title="Checks">
          <CheckTable
            benchId={bench.id}
            checks={open}
            toleranceDb={toleranceDb}
            label="Bench checks"
          />
        </Section>
      ) : null}
      {archived.length > 0 ? (
        <details className="mt-8">
          <summary className="cursor-pointer text-ink-soft">
            {archived.length === 1 ? "1 archived check" : `${archived.length} archived checks`}
          </summary>
          <div className="mt-3">
            <CheckTable
              benchId={bench.id}
              checks={archived}
              toleranceDb={toleranceDb}
              label="Archived bench checks"
            />
          </div>
        </details>
      ) : null}
    </>
  );
}
