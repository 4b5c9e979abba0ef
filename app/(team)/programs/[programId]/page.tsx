import type { Metadata } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { TrendChart } from "@/components/charts/trend-chart";
import { BuildForm } from "@/components/programs/build-form";
import { BuildList } from "@/components/programs/build-list";
import { UnconfirmedMark } from "@/components/masks/unconfirmed-mark";
import { BigMargin } from "@/components/readings/big-margin";
import { SuspectList } from "@/components/suspects/suspect-list";
import { ButtonLink } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { today } from "@/lib/adapters/clock";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { formatFrequency, formatMargin } from "@/lib/core/units/format";
import { newestStanding, unreachedMasks } from "@/lib/queries/program/load-standings";
import type { MaskStanding } from "@/lib/queries/sweep/standings";
import type { ProgramDetail } from "@/lib/queries/program/read-program";
import { readProgram } from "@/lib/queries/program/read-program";
import type { SuspectSummary } from "@/lib/queries/suspect/list-suspects";
import { listOpenSuspects } from "@/lib/queries/suspect/list-suspects";
import { suspectRows } from "../../suspects/prepare-rows";
import { addBuild } from "../actions";

export const metadata: Metadata = { title: "Program" };

export default async function ProgramPage(props: { params: Promise<{ programId: string }> }) {
  const { programId } = await props.params;
  const ctx = await currentContext();
  const program = await readProgram(ctx, programId);
  if (!program) notFound();
  const open = await listOpenSuspects(ctx, programId);
  const { trend } = program;
  const newest = newestStanding(trend);
  const missing = newest ? unreachedMasks(trend, newest.build) : [];
  const mayWrite = isAllowed(ctx, "program.write") && program.archivedAt === null;
  return (
    <>
      <PageHead
        title={program.name}
        trail={[{ href: "/programs", label: "Programs" }]}
        lead={program.description}
        actions={
          <>
            <ButtonLink href={`/reports?program=${program.id}`}>Reports</ButtonLink>
            {isAllowed(ctx, "program.write") ? (
              <ButtonLink href={`/programs/${program.id}/edit`}>Edit</ButtonLink>
            ) : null}
          </>
        }
      />
      {program.archivedAt ? (
        <p className="mb-4 border-l-4 border-shoal bg-shoal-bed px-3 py-2">
          This program is archived.
        </p>
      ) : null}
      {newest ? (
        <BigMargin marginDb={newest.worst.marginDb} standing={newest.worst.standing}>
          {newest.build.name}, {newest.worst.lineName} line of {newest.worst.maskTitle}
          {` at ${formatFrequency(newest.worst.marginAtHz)}`}.{" "}
          {againstTarget(newest.worst, program.targetMarginDb, missing)}{" "}
          <UnconfirmedMark provenance={newest.worst.provenance} />
        </BigMargin>
      ) : (
        <p className="text-lg">
          No sweep is on the line of record yet; the target is{" "}
          <span className="font-mono">{formatMargin(program.targetMarginDb)}</span>.
        </p>
      )}
      <Section
        title="Margin over builds"
        lead="Worst margin of each build over its sweeps on the line of record."
      >
        {trend.masks.length === 0 ? (
          <EmptyState>
            The program names no mask yet.{" "}
            {mayWrite ? (
              <Link href={`/programs/${program.id}/edit`} className="text-deep underline">
                Choose what it must fit under
              </Link>
            ) : (
              "An engineer or a manager of your team chooses them."
            )}
          </EmptyState>
        ) : (
          <TrendChart
            series={seriesOf(program)}
            targetDb={program.targetMarginDb}
            milestones={program.milestones}
            today={today()}
          />
        )}
      </Section>
      <Section title="Builds">
        {trend.builds.length > 0 ? (
          <BuildList programId={program.id} masks={trend.masks} builds={trend.builds} />
        ) : (
          <EmptyState>No builds yet.</EmptyState>
        )}
      </Section>
      <OpenSuspects program={program} suspects={open} />
      <MilestoneList program={program} />
      {mayWrite ? (
        <Section title="Add a build">
          <BuildForm programId={program.id} action={addBuild} />
        </Section>
      ) : null}
    </>
  );
}

function againstTarget(
  { marginDb, standing }: MaskStanding,
  targetDb: number,
  missing: string[],
): string {
  const lacking = targetDb - marginDb;
  const text =
    lacking > 0
      ? `${formatMargin(lacking).slice(1)} short of the target of ${formatMargin(targetDb)}.`
      : standing === "undecided" || missing.length > 0
        ? `The target of ${formatMargin(targetDb)} is reached where it was swept and decided.`
        : `The target of ${formatMargin(targetDb)} is met on the bench.`;
  return missing.length > 0 ? `${text} Not swept: ${missing.join("; ")}.` : text;
}

function seriesOf({ id: programId, trend }: ProgramDetail) {
  return trend.masks.map((mask) => ({
    // Written at the end of the line, so that nobody reads the trend as firmer than it is.
    maskTitle: mask.provenance === "from memory" ? `${mask.title} (from memory)` : mask.title,
    points: trend.builds.flatMap((build) => {
      const found = build.standings.find((standing) => standing.maskId === mask.id);
      if (!found) return [];
      return [
        {
          buildName: build.name,
          builtOn: build.builtOn,
          marginDb: found.marginDb,
          standing: found.standing,
          href: `/programs/${programId}/builds/${build.id}`,
        },
      ];
    }),
  }));
}

const MOST_OPEN = 8;

function OpenSuspects(props: { program: ProgramDetail; suspects: SuspectSummary[] }) {
  const { program, suspects } = props;
  const hasMore = suspects.length > MOST_OPEN;
  return (
    <Section
      title="Suspects still open"
      lead="The worst margin of the newest build that was swept there comes first."
      actions={
        <Link
          href={`/suspects?program=${program.id}${hasMore ? "&state=open" : ""}`}
          className="text-deep underline"
        >
          {hasMore ? `All ${suspects.length} that are open` : "All followed suspects"}
        </Link>
      }
    >
      {suspects.length > 0 ? (
        <SuspectList
          rows={suspectRows(suspects.slice(0, MOST_OPEN))}
          exportName={`${program.name} open suspects`}
        />
      ) : (
        <EmptyState>
          No suspect is followed that is still open. Follow one from the table of a sweep.
        </EmptyState>
      )}
    </Section>
  );
}

function MilestoneList({ program }: { program: ProgramDetail }) {
  if (program.milestones.length === 0) return null;
  return (
    <Section title="Milestones">
      <ul className="max-w-3xl border border-rule bg-sheet">
        {program.milestones.map((milestone) => (
          <li
            key={milestone.id}
            className="flex flex-wrap gap-x-6 border-b border-rule px-4 py-2.5 last:border-0"
          >
            <span className="font-mono">{milestone.dueOn}</span>
            <span className="font-medium">{milestone.name}</span>
            <span className="ml-auto">
              {milestone.requiredMarginDb === null ? (
                <span className="text-ink-soft">no margin asked</span>
              ) : (
                <>
                  asks <span className="font-mono">{formatMargin(milestone.requiredMarginDb)}</span>
                </>
              )}
            </span>
          </li>
        ))}
      </ul>
    </Section>
  );
}
