import type { Metadata } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { ArchiveButton } from "@/components/programs/archive-button";
import { ArchivedList } from "@/components/programs/archived-list";
import { MasksForm } from "@/components/programs/masks-form";
import { MilestonesForm } from "@/components/programs/milestones-form";
import { ProgramForm } from "@/components/programs/program-form";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listArchivedBuilds } from "@/lib/queries/program/list-archived";
import { listMaskChoices } from "@/lib/queries/program/list-mask-choices";
import { listMilestones } from "@/lib/queries/program/list-milestones";
import { readProgram } from "@/lib/queries/program/read-program";
import {
  bringBuildBack,
  putProgramAway,
  storeMilestones,
  storeProgram,
  storeProgramMasks,
} from "../../edit-actions";

export const metadata: Metadata = { title: "Edit program" };

export default async function EditProgramPage(props: { params: Promise<{ programId: string }> }) {
  const { programId } = await props.params;
  const ctx = await currentContext();
  const program = await readProgram(ctx, programId);
  if (!program) notFound();
  const head = (
    <PageHead
      title={`Edit ${program.name}`}
      trail={[
        { href: "/programs", label: "Programs" },
        { href: `/programs/${program.id}`, label: program.name },
      ]}
    />
  );
  if (!isAllowed(ctx, "program.write")) {
    return (
      <>
        {head}
        <p>Your role in this team may read programs, not change them.</p>
      </>
    );
  }
  if (program.archivedAt) {
    return (
      <>
        {head}
        <EmptyState>
          This program is archived. Restore it under{" "}
          <Link href="/programs/archived" className="text-deep underline">
            archived programs
          </Link>{" "}
          to change it.
        </EmptyState>
      </>
    );
  }
  const [choices, milestones, archivedBuilds] = await Promise.all([
    listMaskChoices(ctx, program.id),
    listMilestones(ctx, program.id),
    listArchivedBuilds(ctx, program.id),
  ]);
  return (
    <>
      {head}
      <Section title="Details">
        <ProgramForm action={storeProgram} program={program} />
      </Section>
      <Section
        title="Masks"
        lead="What the product must fit under. Its sweeps are held against these."
      >
        <MasksForm programId={program.id} choices={choices} action={storeProgramMasks} />
      </Section>
      <Section
        title="Milestones"
        lead="By when which margin has to be there. Without a margin of its own a milestone asks for the program's target."
      >
        <MilestonesForm programId={program.id} milestones={milestones} action={storeMilestones} />
      </Section>
      {archivedBuilds.length > 0 ? (
        <Section title="Archived builds">
          <ArchivedList
            label="Archived builds"
            items={archivedBuilds.map(({ archivedAt, ...row }) => ({
              ...row,
              archivedOn: archivedAt?.toISOString().slice(0, 10) ?? "",
            }))}
            restore={bringBuildBack}
          />
        </Section>
      ) : null}
      <Section title="Archive">
        <ArchiveButton
          subject="program"
          name={program.name}
          action={putProgramAway.bind(null, program.id)}
          href="/programs"
        />
      </Section>
    </>
  );
}
