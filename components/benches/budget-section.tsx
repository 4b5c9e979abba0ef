import { ButtonLink } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { Section } from "@/components/ui/section";
import { expandedUncertainty } from "@/lib/core/bench/expanded-uncertainty";
import type { GuardRule, UncertaintyBudget } from "@/lib/core/bench/uncertainty-budget";
import { BudgetResult, BudgetTable } from "./budget-table";
import { guardSentence } from "./budget-words";

interface BudgetSectionProps {
  rule: GuardRule;
  guardDb: number;
  /** Newest revision; null while there is none. */
  newest: {
    revision: number;
    content: UncertaintyBudget;
    createdAt: Date;
    createdBy: string;
  } | null;
  /** Address of the editor; null: this member may not change it. */
  href: string | null;
}

/** A bench's uncertainty and the guard that follows from it. */
export function BudgetSection({ rule, guardDb, newest, href }: BudgetSectionProps) {
  const lines = newest?.content.lines ?? [];
  const result = newest && lines.length > 0 ? expandedUncertainty(newest.content) : null;
  const reference = newest?.content.reference ?? null;
  return (
    <Section
      title="Uncertainty and guard"
      lead={guardSentence(rule, guardDb, result, reference)}
      actions={href ? <ButtonLink href={href}>Edit budget and guard</ButtonLink> : undefined}
    >
      {newest && result ? (
        <>
          <BudgetResult result={result} reference={reference} />
          <p className="mt-4 mb-2 text-sm text-ink-soft">
            {newest.content.title ? `${newest.content.title}. ` : null}Revision {newest.revision},
            by {newest.createdBy} on{" "}
            <span className="font-mono">{newest.createdAt.toISOString().slice(0, 10)}</span>.
          </p>
          <BudgetTable result={result} />
        </>
      ) : (
        <EmptyState>
          No uncertainty budget yet.
          {href
            ? " List what is uncertain about a level measured here, and the guard can be computed from it."
            : null}
        </EmptyState>
      )}
    </Section>
  );
}
