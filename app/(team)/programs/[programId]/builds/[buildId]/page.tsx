import type { Metadata } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { BuildReading } from "@/components/builds/build-reading";
import { countDoubts, filterByDoubt } from "@/components/builds/doubt-counts";
import { DoubtFilter } from "@/components/builds/doubt-filter";
import { SweepList } from "@/components/builds/sweep-list";
import { LadderForm } from "@/components/ladders/ladder-form";
import { UnconfirmedMark } from "@/components/masks/unconfirmed-mark";
import { BigMargin } from "@/components/readings/big-margin";
import { DOUBT_LABELS } from "@/components/readings/doubt-labels";
import { ButtonLink } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { formatFrequency } from "@/lib/core/units/format";
import type { BuildDetail } from "@/lib/queries/program/read-build";
import { readBuild } from "@/lib/queries/program/read-build";
import { readBuildReading } from "@/lib/queries/program/read-build-reading";
import type { SweepRow } from "@/lib/queries/sweep/list-sweeps";
import { listBuildSweeps } from "@/lib/queries/sweep/list-sweeps";
import { startLadder } from "../../../../ladders/actions";
import type { SearchParams } from "./search-params";
import { readDoubtParam } from "./search-params";

export const metadata: Metadata = { title: "Build" };

interface BuildPageProps {
  params: Promise<{ programId: string; buildId: string }>;
  searchParams: Promise<SearchParams>;
}

export default async function BuildPage(props: BuildPageProps) {
  const { programId, buildId } = await props.params;
  const doubt = readDoubtParam(await props.searchParams);
  const ctx = await currentContext();
  const build = await readBuild(ctx, buildId);
  if (!build || build.programId !== programId) notFound();
  const sweeps = await listBuildSweeps(ctx, buildId);
  const combined = await readBuildReading(ctx, buildId);
  const shown = filterByDoubt(sweeps, doubt);
  const href = `/programs/${programId}/builds/${buildId}`;
  const archived = build.archivedAt !== null || build.programArchivedAt !== null;
  const mayImport = isAllowed(ctx, "sweep.write") && !archived;
  return (
    <>
      <PageHead
        title={`${build.programName} ${build.name}`}
        trail={[
          { href: "/programs", label: "Programs" },
          { href: `/programs/${build.programId}`, label: build.programName },
        ]}
        lead={[build.builtOn ? `Built on ${build.builtOn}` : null, build.notes || null]
          .filter(Boolean)
          .join(" · ")}
        actions={
          <>
            {isAllowed(ctx, "program.write") ? (
              <ButtonLink href={`${href}/edit`}>Edit</ButtonLink>
            ) : null}
            {isAllowed(ctx, "report.write") && !archived ? (
              <ButtonLink href={`/reports/new?build=${buildId}`}>New report</ButtonLink>
            ) : null}
            {mayImport ? (
              <ButtonLink look="primary" href={`/sweeps/import?build=${buildId}`}>
                Import sweeps
              </ButtonLink>
            ) : null}
          </>
        }
      />
      {archived ? (
        <p className="mb-4 border-l-4 border-shoal bg-shoal-bed px-3 py-2">
          This build is archived.
        </p>
      ) : null}
      <OnRecord build={build} sweeps={sweeps} />
      {combined.length > 0 ? (
        <Section
          title="Held against each mask"
          lead="The sweeps on the line of record, taken together frequency by frequency."
        >
          {combined.map((one) => (
            <BuildReading key={one.maskId} href={href} combined={one} />
          ))}
        </Section>
      ) : null}
      <Section title="Ladders" lead="What did each step buy?">
        <LadderList build={build} />
        {mayImport ? (
          <details className="mt-4" open={build.ladders.length === 0}>
            <summary className="mb-3 cursor-pointer text-deep underline">Start a ladder</summary>
            <LadderForm buildId={build.id} action={startLadder} />
          </details>
        ) : null}
      </Section>
      <Section title="Sweeps">
        <DoubtFilter
          href={href}
          counts={countDoubts(sweeps)}
          chosen={doubt}
          total={sweeps.length}
        />
        {shown.length > 0 ? (
          <SweepList sweeps={shown} />
        ) : sweeps.length > 0 && doubt !== null ? (
          <EmptyState>
            No sweep of this build has the doubt &ldquo;{DOUBT_LABELS[doubt]}&rdquo;.{" "}
            <Link href={href} scroll={false} className="text-deep underline">
              Show all sweeps
            </Link>
          </EmptyState>
        ) : (
          <EmptyState>
            No sweeps yet.{" "}
            {mayImport ? (
              <Link href={`/sweeps/import?build=${buildId}`} className="text-deep underline">
                Import the analyzer&rsquo;s files
              </Link>
            ) : (
              "An engineer of your team imports them."
            )}
          </EmptyState>
        )}
      </Section>
      <ClockList build={build} />
    </>
  );
}

function OnRecord({ build, sweeps }: { build: BuildDetail; sweeps: SweepRow[] }) {
  const { worst } = build;
  const count = sweeps.filter((sweep) => sweep.onRecord).length;
  if (!worst) {
    return (
      <p className="text-lg">
        {count === 0
          ? "No sweep of this build is on the line of record, so it has no place in the trend yet."
          : "The sweeps on the line of record reach no mask of the program yet."}
      </p>
    );
  }
  return (
    <BigMargin marginDb={worst.marginDb} standing={worst.standing}>
      {worst.lineName} line of {worst.maskTitle} at {formatFrequency(worst.marginAtHz)}, over{" "}
      {count === 1 ? "one sweep" : `${count} sweeps`} on the line of record:{" "}
      <Link href={`/sweeps/${worst.sweepId}?mask=${worst.maskId}`} className="text-deep underline">
        see the worst one
      </Link>
      . <UnconfirmedMark provenance={worst.provenance} />
    </BigMargin>
  );
}

function LadderList({ build }: { build: BuildDetail }) {
  if (build.ladders.length === 0) {
    return (
      <EmptyState>
        No ladder yet. A ladder holds each mitigation step against the one before.
      </EmptyState>
    );
  }
  return (
    <ul className="border border-rule bg-sheet">
      {build.ladders.map((ladder) => (
        <li
          key={ladder.id}
          className="flex flex-wrap items-baseline gap-x-6 border-b border-rule px-4 py-3 last:border-0"
        >
          <Link href={`/ladders/${ladder.id}`} className="font-medium text-deep underline">
            {ladder.name}
          </Link>
          <span className="text-ink-soft">
            {ladder.steps === 1 ? "1 step" : `${ladder.steps} steps`}
          </span>
          <span className="basis-full text-sm text-ink-soft">{ladder.notes}</span>
        </li>
      ))}
    </ul>
  );
}

function ClockList({ build }: { build: BuildDetail }) {
  if (build.clocks.length === 0) return null;
  return (
    <Section title="Clocks" lead="Known oscillators, bit rates and converters of this build.">
      <ul className="max-w-2xl border border-rule bg-sheet">
        {build.clocks.map((clock) => (
          <li
            key={clock.id}
            className="flex flex-wrap gap-x-6 border-b border-rule px-4 py-2.5 last:border-0"
          >
            <span className="font-medium">{clock.name}</span>
            <span className="ml-auto font-mono">{formatFrequency(clock.frequencyHz)}</span>
            <span className="w-28 text-right text-ink-soft">
              {clock.tolerancePpm === null ? "tolerance unknown" : `± ${clock.tolerancePpm} ppm`}
            </span>
          </li>
        ))}
      </ul>
    </Section>
  );
}
