import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { BudgetEditor } from "@/components/benches/budget-editor";
import { GuardRuleForm } from "@/components/benches/guard-rule-form";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { readBench } from "@/lib/queries/bench/read-bench";
import { readBenchQuality } from "@/lib/queries/bench/read-bench-quality";
import { saveBudget, saveGuardRule } from "../../actions";

export const metadata: Metadata = { title: "Uncertainty budget" };

export default async function BudgetPage(props: { params: Promise<{ benchId: string }> }) {
  const { benchId } = await props.params;
  const ctx = await currentContext();
  const bench = await readBench(ctx, benchId);
  const path = bench?.revisions[0]?.content;
  const quality = path ? await readBenchQuality(ctx, benchId, path) : null;
  if (!bench || !quality) notFound();
  const newest = quality.budgets[0];
  const budget = newest?.content ?? null;
  return (
    <>
      <PageHead
        title="Uncertainty budget"
        trail={[
          { href: "/benches", label: "Benches" },
          { href: `/benches/${bench.id}`, label: bench.name },
        ]}
        lead="How far may a level of this bench be off?"
      />
      {!isAllowed(ctx, "bench.write") ? (
        <p>Your role in this team may read benches, not change them.</p>
      ) : bench.archivedAt !== null ? (
        <p>This bench is archived: restore it before changing it.</p>
      ) : (
        <>
          <BudgetEditor
            benchId={bench.id}
            revision={newest?.revision ?? 0}
            budget={budget}
            save={saveBudget}
          />
          <Section
            title="Guard"
            lead="Counts for sweeps imported from now on; earlier ones keep the guard they have."
          >
            <GuardRuleForm
              benchId={bench.id}
              rule={quality.guardRule}
              guardDb={quality.guardDb}
              budget={budget}
              save={saveGuardRule}
            />
          </Section>
        </>
      )}
    </>
  );
}
