import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { ArchiveButton } from "@/components/programs/archive-button";
import { BuildForm } from "@/components/programs/build-form";
import { ClocksForm } from "@/components/programs/clocks-form";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listClocks } from "@/lib/queries/program/list-clocks";
import { readBuildDetails } from "@/lib/queries/program/read-build-details";
import { putBuildAway, storeBuild, storeClocks } from "../../../../edit-actions";

export const metadata: Metadata = { title: "Edit build" };

interface EditBuildPageProps {
  params: Promise<{ programId: string; buildId: string }>;
}

export default async function EditBuildPage(props: EditBuildPageProps) {
  const ctx = await currentContext();
  const build = await readBuildDetails(ctx, await props.params);
  if (!build) notFound();
  const { program } = build;
  const head = (
    <PageHead
      title={`Edit ${build.name}`}
      trail={[
        { href: "/programs", label: "Programs" },
        { href: `/programs/${program.id}`, label: program.name },
        { href: `/programs/${program.id}/builds/${build.id}`, label: build.name },
      ]}
    />
  );
  if (!isAllowed(ctx, "program.write")) {
    return (
      <>
        {head}
        <p>Your role in this team may read builds, not change them.</p>
      </>
    );
  }
  if (build.archivedAt ?? program.archivedAt) {
    return (
      <>
        {head}
        <EmptyState>
          {program.archivedAt
            ? "The program of this build is archived. Restore it under archived programs to change the build."
            : "This build is archived. Restore it on the page where its program is edited."}
        </EmptyState>
      </>
    );
  }
  const clocks = await listClocks(ctx, build.id);
  return (
    <>
      {head}
      <Section title="Details">
        <BuildForm programId={program.id} build={build} action={storeBuild} />
      </Section>
      <Section
        title="Clocks"
        lead="Known oscillators, bit rates and converters: suspects are held against their harmonics."
      >
        <ClocksForm buildId={build.id} clocks={clocks} action={storeClocks} />
      </Section>
      <Section title="Archive">
        <ArchiveButton
          subject="build"
          name={build.name}
          action={putBuildAway.bind(null, build.id)}
          href={`/programs/${program.id}`}
        />
      </Section>
    </>
  );
}
