import type { Metadata } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { BigMargin } from "@/components/readings/big-margin";
import { DoubtList } from "@/components/readings/doubt-list";
import { UnconfirmedMark } from "@/components/masks/unconfirmed-mark";
import { LineTable } from "@/components/readings/line-table";
import { RemeasureList } from "@/components/readings/remeasure-list";
import { RemeasureOmitted } from "@/components/readings/remeasure-omitted";
import { DistanceRestating } from "@/components/sweeps/distance-restating";
import { MaskTabs } from "@/components/sweeps/mask-tabs";
import { SweepChart } from "@/components/sweeps/sweep-chart";
import { LinkFacts, MeasurementFacts } from "@/components/sweeps/sweep-facts";
import { SweepOrigin } from "@/components/sweeps/sweep-origin";
import { TraceTable } from "@/components/sweeps/trace-table";
import { ActionButton } from "@/components/ui/action-button";
import { ButtonLink } from "@/components/ui/button";
import { ConfirmButton } from "@/components/ui/confirm-button";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { reachesMask } from "@/lib/core/reading/combine-readings";
import { decidingPoint } from "@/lib/core/reading/deciding-point";
import { remeasureRows } from "@/lib/core/reading/remeasure-rows";
import { readFollowedMarks } from "@/lib/queries/suspect/followed-of";
import type { SweepDetail } from "@/lib/queries/sweep/load-sweep-detail";
import { readSweepDetail } from "@/lib/queries/sweep/read-sweep";
import { worstOf } from "@/lib/queries/sweep/worst-of";
import { followEveryNear, startToFollow } from "../../suspects/actions";
import { extentOf, headline, leadOf, shownTraces, trailOf } from "./prepare-sweep";
import { chooseOnRecord, chooseRestating, fetchBack, putAside } from "./actions";

export const metadata: Metadata = { title: "Sweep" };

interface SweepPageProps {
  params: Promise<{ sweepId: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function SweepPage(props: SweepPageProps) {
  const { sweepId } = await props.params;
  const { mask: chosenMask } = await props.searchParams;
  const ctx = await currentContext();
  const sweep = await readSweepDetail(ctx, sweepId);
  if (!sweep) notFound();
  const mayWrite = isAllowed(ctx, "sweep.write");
  const summaries = sweep.readings.map(({ maskId, mask, reading }) => ({
    maskId,
    title: mask.title,
    standing: reading.standing,
    marginDb: reachesMask(reading) ? (decidingPoint(reading)?.point.marginDb ?? null) : null,
    notComparable: reading.notComparable !== null,
  }));
  // A mask that the sweep does not reach says nothing about it.
  const worst = worstOf(summaries.filter((summary) => summary.marginDb !== null));
  const chosen =
    sweep.readings.find((r) => r.maskId === chosenMask) ??
    sweep.readings.find((r) => r.maskId === worst?.maskId) ??
    sweep.readings[0] ??
    null;
  const comparable = chosen && chosen.reading.notComparable === null ? chosen : null;
  const followed = comparable ? await readFollowedMarks(ctx, comparable.id) : undefined;
  const mayFollow = mayWrite && comparable !== null && sweep.archivedAt === null;
  return (
    <>
      <PageHead
        title={sweep.name}
        trail={trailOf(sweep)}
        lead={leadOf(sweep)}
        actions={
          <>
            <ButtonLink href={`/api/v1/sweeps/${sweep.id}/file`} prefetch={false}>
              Original file
            </ButtonLink>
            {mayWrite ? <SweepActions sweep={sweep} /> : null}
          </>
        }
      />
      {sweep.archivedAt ? (
        <p className="mb-4 border-l-4 border-shoal bg-shoal-bed px-3 py-2">
          This sweep is archived: it shows in no list, delta or trend.
        </p>
      ) : null}
      {sweep.purpose !== "product" ? (
        <p className="mb-4 text-lg">
          {sweep.purpose === "ambient"
            ? "An ambient sweep: the product was off. It is not held against a mask."
            : "A floor sweep: the instrument alone. It is not held against a mask."}
        </p>
      ) : null}
      {sweep.purpose === "product" && sweep.readings.length === 0 ? (
        <p className="mb-4 text-lg">
          The program names no mask yet, so there is no margin.{" "}
          <Link href={`/programs/${sweep.programId}/edit`} className="text-deep underline">
            Choose its masks
          </Link>
          .
        </p>
      ) : null}
      {comparable ? (
        <div className="mb-5">
          <BigMargin
            marginDb={summaries.find((s) => s.maskId === comparable.maskId)?.marginDb ?? null}
            standing={comparable.reading.standing}
          >
            {headline(comparable)} <UnconfirmedMark provenance={comparable.mask.provenance} />
          </BigMargin>
        </div>
      ) : null}
      {summaries.length > 0 ? (
        <MaskTabs sweepId={sweep.id} items={summaries} chosen={chosen?.maskId ?? ""} />
      ) : null}
      {chosen && !comparable ? (
        <div className="mb-4 border-l-4 border-shoal bg-shoal-bed px-3 py-2">
          <p>
            Not comparable with {chosen.mask.title}. {chosen.reading.notComparable}
          </p>
          {mayWrite ? <Restating sweep={sweep} chosen={chosen} /> : null}
        </div>
      ) : null}
      <SweepChart
        key={chosen?.maskId ?? "none"}
        name={sweep.name}
        traces={shownTraces(sweep)}
        extent={extentOf(sweep)}
        stepHz={sweep.traces[0]?.stepHz ?? null}
        mask={comparable?.mask ?? null}
        suspects={comparable?.reading.suspects ?? []}
        guardDb={sweep.guardDb}
        clocks={sweep.clocks}
        ambient={comparable?.ambient ?? []}
        followed={followed}
        follow={mayFollow ? startToFollow.bind(null, comparable.id) : undefined}
        followNear={mayFollow ? followEveryNear.bind(null, comparable.id) : undefined}
      />
      {comparable ? (
        <>
          <Section
            title={`Held against ${comparable.mask.title}`}
            lead={
              <>
                <Link href={`/masks/${comparable.maskId}`} className="text-deep underline">
                  Revision {comparable.maskRevision}
                </Link>
                . Guard {sweep.guardDb.toFixed(1)} dB
                {sweep.budget ? ", from a bench with an uncertainty budget" : ""}.{" "}
                <UnconfirmedMark provenance={comparable.mask.provenance} />
              </>
            }
          >
            <LineTable reading={comparable.reading} />
            {mayWrite && isRestatedReading(comparable) ? (
              <Restating sweep={sweep} chosen={comparable} />
            ) : null}
          </Section>
          {comparable.reading.remeasure.length > 0 ? (
            <Section
              title="Measure again"
              lead="An upper bound lies over the mask here. Only the line's own detector can decide."
              actions={
                <ButtonLink href={`/sweeps/${sweep.id}/remeasure?mask=${comparable.maskId}`}>
                  Sheet for the bench
                </ButtonLink>
              }
            >
              <RemeasureOmitted count={comparable.reading.remeasureOmitted} />
              <RemeasureList
                rows={remeasureRows(comparable.reading, [sweep])}
                unit={comparable.reading.unit}
                exportName={`${sweep.name} measure again`}
              />
            </Section>
          ) : null}
          <Section title="Doubts">
            <DoubtList doubts={comparable.reading.doubts} />
          </Section>
        </>
      ) : null}
      <Section title="Measurement settings">
        <MeasurementFacts settings={sweep.settings} />
      </Section>
      {sweep.purpose === "product" ? (
        <Section title="Link settings">
          <LinkFacts link={sweep.link} />
        </Section>
      ) : null}
      <Section title="Traces">
        <TraceTable traces={sweep.traces} />
      </Section>
      <SweepOrigin sweep={sweep} />
    </>
  );
}

type Chosen = SweepDetail["readings"][number];

const isRestatedReading = ({ reading }: Chosen) =>
  reading.doubts.some(({ code }) => code === "distance-restated");

/** Where only the distance differs from the mask's: to restate it, or to take that back. */
function Restating({ sweep, chosen }: { sweep: SweepDetail; chosen: Chosen }) {
  const { distanceM, port } = sweep.settings;
  const { mask, maskId } = chosen;
  if (mask.distanceM === null || distanceM === null || distanceM === mask.distanceM) return null;
  if (mask.port !== port) return null;
  return (
    <div className="mt-3">
      <DistanceRestating
        sweptM={distanceM}
        maskM={mask.distanceM}
        programName={sweep.programName}
        maskTitle={mask.title}
        isRestated={isRestatedReading(chosen)}
        action={chooseRestating.bind(null, sweep.programId, maskId)}
      />
    </div>
  );
}

function SweepActions({ sweep }: { sweep: SweepDetail }) {
  if (sweep.archivedAt)
    return <ActionButton action={fetchBack.bind(null, sweep.id)}>Restore</ActionButton>;
  return (
    <>
      {sweep.purpose === "product" ? (
        <ActionButton action={chooseOnRecord.bind(null, sweep.id, !sweep.onRecord)}>
          {sweep.onRecord ? "Take off the line of record" : "Put on the line of record"}
        </ActionButton>
      ) : null}
      <ConfirmButton
        label="Archive"
        title="Archive this sweep?"
        confirmLabel="Archive"
        action={putAside.bind(null, sweep.id)}
      >
        It leaves every list, delta and trend. Its file and its readings stay, and it can be
        restored from its own page.
      </ConfirmButton>
    </>
  );
}
