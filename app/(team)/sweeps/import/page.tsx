import type { Metadata } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { ImportDesk } from "@/components/sweeps/import-desk";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { readImportPlace } from "@/lib/queries/sweep/read-import-place";
import { importUpload, previewUpload } from "./actions";
import { readImportParams } from "./search-params";

export const metadata: Metadata = { title: "Import sweeps" };

export default async function ImportPage(props: {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}) {
  const { buildId, stepId } = readImportParams(await props.searchParams);
  const ctx = await currentContext();
  if (buildId === "") {
    return (
      <>
        <PageHead title="Import sweeps" lead="A sweep is stored with the build that was swept." />
        <EmptyState>
          Open the build first; its page has the import.{" "}
          <Link href="/programs" className="text-deep underline">
            Choose a program
          </Link>
        </EmptyState>
      </>
    );
  }
  const place = await readImportPlace(ctx, buildId, stepId);
  if (!place) notFound();
  const { build } = place;
  return (
    <>
      <PageHead
        title="Import sweeps"
        trail={[
          { href: `/programs/${build.programId}`, label: build.programName },
          { href: `/programs/${build.programId}/builds/${build.id}`, label: build.name },
        ]}
        lead="What is in these files? See it before anything is stored."
      />
      {isAllowed(ctx, "sweep.write") ? (
        <ImportDesk
          buildId={build.id}
          stepId={stepId}
          steps={place.steps}
          benches={place.benches}
          last={place.last}
          actions={{ preview: previewUpload, store: importUpload }}
        />
      ) : (
        <p>Your role in this team may read sweeps, not import them.</p>
      )}
    </>
  );
}
