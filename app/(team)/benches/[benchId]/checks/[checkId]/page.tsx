import type { Metadata } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { ArchiveCheckButton } from "@/components/bench-checks/archive-check-button";
import { isDrifted } from "@/components/bench-checks/check-answer";
import { CheckLinesTable } from "@/components/bench-checks/check-lines-table";
import { Facts } from "@/components/ui/facts";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { DETECTOR_LABELS, HOLD_LABELS } from "@/lib/core/sweep/settings";
import { formatDelta, formatFrequency } from "@/lib/core/units/format";
import { readBenchCheck } from "@/lib/queries/bench-check/read-bench-check";
import { putCheckAway } from "../actions";

export const metadata: Metadata = { title: "Bench check" };

interface CheckPageProps {
  params: Promise<{ benchId: string; checkId: string }>;
}

export default async function BenchCheckPage(props: CheckPageProps) {
  const { benchId, checkId } = await props.params;
  const ctx = await currentContext();
  const check = await readBenchCheck(ctx, benchId, checkId);
  if (!check) notFound();
  const { bench, content, isReference, driftMeanDb, driftWorstDb, reference } = check;
  const archived = check.archivedAt !== null;
  const { toleranceDb } = bench;
  const worst = content.lines.find((line) => line.driftDb === driftWorstDb);
  const where = isDrifted(driftWorstDb, toleranceDb) ? "outside" : "within";
  const checksHref = `/benches/${bench.id}/checks`;
  return (
    <>
      <PageHead
        title={`${check.source}, ${check.measuredOn}`}
        trail={[
          { href: "/benches", label: "Benches" },
          { href: `/benches/${bench.id}`, label: bench.name },
          { href: checksHref, label: "Bench checks" },
        ]}
        lead={
          archived
            ? `This ${isReference ? "reference" : "check"} is archived.`
            : isReference
              ? "The reference that checks of this source are compared with."
              : "How far did the bench drift?"
        }
        actions={
          isAllowed(ctx, "bench.write") && !archived ? (
            <ArchiveCheckButton
              check={{ id: check.id, benchId: bench.id, isReference }}
              archive={putCheckAway}
            />
          ) : undefined
        }
      />
      {driftWorstDb !== null ? (
        <p className="mb-6">
          <span className="mr-1.5 font-mono text-4xl [word-spacing:-0.3em] whitespace-nowrap">
            {formatDelta(driftWorstDb)}
          </span>{" "}
          <span className="text-lg">
            is the largest drift
            {worst ? (
              <>
                , at{" "}
                <span className="font-mono">
                  {formatFrequency(worst.frequencyHz, content.stepHz)}
                </span>
              </>
            ) : null}
            , {where} the tolerance of ±{toleranceDb} dB.
            {worst && !worst.standsOut
              ? " The line no longer stands out: it is at least that far off."
              : null}
          </span>
        </p>
      ) : null}
      {check.cautions.map((text) => (
        <p
          key={text}
          className="mb-3 max-w-none border-l-4 border-shoal bg-shoal-bed px-3 py-1.5 text-sm"
        >
          {text}
        </p>
      ))}
      <Facts
        items={[
          ...(isReference
            ? []
            : [
                {
                  label: "Mean drift",
                  value: driftMeanDb === null ? null : formatDelta(driftMeanDb),
                  mono: true,
                },
                {
                  label: "Compared with",
                  value: reference ? (
                    <>
                      <Link
                        href={`${checksHref}/${reference.id}`}
                        className="font-mono text-deep underline"
                      >
                        {reference.measuredOn}
                      </Link>
                      {reference.archived ? ", archived since" : ""}
                    </>
                  ) : null,
                },
              ]),
          { label: "Detector", value: content.detector ? DETECTOR_LABELS[content.detector] : null },
          { label: "Hold", value: HOLD_LABELS[content.hold] },
          {
            label: "RBW",
            value: content.rbwHz === null ? null : formatFrequency(content.rbwHz),
            mono: true,
          },
          { label: "Step", value: formatFrequency(content.stepHz), mono: true },
          {
            label: "Factors",
            value: content.corrected
              ? "applied by the instrument"
              : `signal path, revision ${check.pathRevision}`,
          },
          { label: "Checked by", value: check.checkedBy },
          {
            label: "Original file",
            value: (
              <a href={`${checksHref}/${check.id}/file`} className="text-deep underline">
                {check.fileName}
              </a>
            ),
          },
          { label: "Notes", value: check.notes || null },
        ]}
      />
      <Section
        title="Lines"
        lead={
          isReference
            ? "Everything that stands 10 dB out of what is around it."
            : "Drift is check minus reference: below zero the bench reads too low now."
        }
      >
        <CheckLinesTable content={content} isReference={isReference} toleranceDb={toleranceDb} />
      </Section>
    </>
  );
}
