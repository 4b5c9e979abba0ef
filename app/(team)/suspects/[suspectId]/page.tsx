import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { SuspectTrend } from "@/components/charts/suspect-trend";
import { NoteFeed } from "@/components/suspects/note-feed";
import { NoteForm } from "@/components/suspects/note-form";
import { OwnerForm } from "@/components/suspects/owner-form";
import { SightingsTable } from "@/components/suspects/sightings-table";
import { SourceForm } from "@/components/suspects/source-form";
import { StateForm } from "@/components/suspects/state-form";
import { StateTag } from "@/components/suspects/state-tag";
import { SuspectHeadline } from "@/components/suspects/suspect-headline";
import { Facts } from "@/components/ui/facts";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { formatFrequency } from "@/lib/core/units/format";
import { readSuspect } from "@/lib/queries/suspect/read-suspect";
import { changeOwner, changeSource, changeState, sayNote } from "../actions";
import { trendPoints, trendUnit } from "./prepare-trend";

export const metadata: Metadata = { title: "Suspect" };

export default async function SuspectPage(props: { params: Promise<{ suspectId: string }> }) {
  const { suspectId } = await props.params;
  const ctx = await currentContext();
  const suspect = await readSuspect(ctx, suspectId);
  if (!suspect) notFound();
  const { program } = suspect;
  const inUse = program.archivedAt === null;
  const mayWrite = inUse && isAllowed(ctx, "sweep.write");
  const mayAssign = inUse && isAllowed(ctx, "suspect.assign");
  const mayComment = inUse && isAllowed(ctx, "sweep.comment");
  return (
    <>
      <PageHead
        title={`Suspect ${suspect.number} at ${formatFrequency(suspect.frequencyHz, suspect.toleranceHz)}`}
        trail={[
          { href: `/programs/${program.id}`, label: program.name },
          { href: `/suspects?program=${program.id}`, label: "Suspects" },
        ]}
        lead={suspect.source || "Likely source not stated."}
      />
      {inUse ? null : (
        <p className="mb-4 border-l-4 border-shoal bg-shoal-bed px-3 py-2">
          The program is archived: nothing changes here.
        </p>
      )}
      <SuspectHeadline newest={suspect.newest} builds={suspect.builds} change={suspect.change} />
      <div className="mt-5">
        <Facts
          items={[
            { label: "State", value: <StateTag state={suspect.state} /> },
            { label: "Owner", value: suspect.ownerName ?? "nobody yet" },
            { label: "Likely source", value: suspect.source || null },
            { label: "Recognised within", value: `± ${formatFrequency(suspect.toleranceHz)}` },
          ]}
        />
      </div>
      <Section
        title="Margin and level over builds"
        lead="The lowest margin of each build over its sweeps on the line of record, and the level that it belongs to."
      >
        <SuspectTrend points={trendPoints(suspect)} unit={trendUnit(suspect)} />
      </Section>
      {mayWrite || mayAssign ? (
        <Section title="What becomes of it">
          <div className="grid gap-x-10 gap-y-8 md:grid-cols-2 xl:grid-cols-3">
            {mayWrite ? (
              <StateForm suspectId={suspect.id} state={suspect.state} action={changeState} />
            ) : null}
            {mayAssign ? (
              <OwnerForm
                suspectId={suspect.id}
                ownerId={suspect.ownerId}
                ownerName={suspect.ownerName}
                owners={suspect.owners}
                action={changeOwner}
              />
            ) : null}
            {mayWrite ? (
              <SourceForm
                suspectId={suspect.id}
                source={suspect.source}
                toleranceHz={suspect.toleranceHz}
                action={changeSource}
              />
            ) : null}
          </div>
        </Section>
      ) : null}
      <Section title="Notes">
        <NoteFeed notes={suspect.notes} now={suspect.readAt} />
        {mayComment ? <NoteForm suspectId={suspect.id} action={sayNote} /> : null}
      </Section>
      <Section title="Sightings" lead="The newest build first; within a build the lowest margin.">
        <SightingsTable builds={suspect.builds} programId={program.id} />
      </Section>
    </>
  );
}
