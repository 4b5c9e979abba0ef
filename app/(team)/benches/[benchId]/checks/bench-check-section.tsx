import { checkAnswer } from "@/components/bench-checks/check-answer";
import { CheckAnswerNote } from "@/components/bench-checks/check-answer-note";
import { ButtonLink } from "@/components/ui/button";
import { Section } from "@/components/ui/section";
import type { Context } from "@/lib/auth/context";
import { listBenchChecks } from "@/lib/queries/bench-check/list-bench-checks";

/** The newest drift on the bench's own page, and the way to its checks. */
export async function BenchCheckSection({ ctx, benchId }: { ctx: Context; benchId: string }) {
  const found = await listBenchChecks(ctx, benchId);
  if (!found) return null;
  const { bench, checks, today } = found;
  return (
    <Section
      title="Bench checks"
      lead="A known source, swept each day and compared with its reference."
      actions={<ButtonLink href={`/benches/${bench.id}/checks`}>See the checks</ButtonLink>}
    >
      <CheckAnswerNote answer={checkAnswer(checks, bench.toleranceDb, today)} />
    </Section>
  );
}
