import type { Metadata } from "next";
import Link from "next/link";
import { notFound, redirect } from "next/navigation";
import { SuspectFilterForm } from "@/components/suspects/suspect-filter-form";
import { SuspectList } from "@/components/suspects/suspect-list";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { currentContext } from "@/lib/auth/session";
import { listSuspectPrograms, listSuspects } from "@/lib/queries/suspect/list-suspects";
import { suspectRows } from "./prepare-rows";
import type { SearchParams } from "./search-params";
import { readSuspectFilter } from "./search-params";

export const metadata: Metadata = { title: "Suspects" };

export default async function SuspectsPage(props: { searchParams: Promise<SearchParams> }) {
  const { typed, filter, errors } = readSuspectFilter(await props.searchParams);
  const ctx = await currentContext();
  if (typed.programId === "") return <ProgramChoice />;
  const found = await listSuspects(ctx, typed.programId, filter);
  if (!found) notFound();
  const { program, suspects, total, open, owners } = found;
  const isFiltered = [typed.state, typed.owner, typed.from, typed.to].some((text) => text !== "");
  return (
    <>
      <PageHead
        title="What still sticks out?"
        trail={[
          { href: "/programs", label: "Programs" },
          { href: `/programs/${program.id}`, label: program.name },
        ]}
        lead="Suspects that the program follows over its builds. The worst margin of the newest build that was swept there comes first."
      />
      {total > 0 ? (
        <p className="mb-5">
          <span className="font-mono text-5xl tracking-tight">{open}</span>{" "}
          <span className="text-lg">
            of {total} {total === 1 ? "suspect is" : "suspects are"} still open.
          </span>
        </p>
      ) : null}
      {total > 0 ? (
        <SuspectFilterForm
          key={JSON.stringify(typed)}
          {...typed}
          owners={owners}
          errors={errors}
          isFiltered={isFiltered}
        />
      ) : null}
      {suspects.length > 0 ? (
        <SuspectList rows={suspectRows(suspects)} exportName={`${program.name} suspects`} />
      ) : (
        <EmptyState>
          {total === 0
            ? "Nothing is followed yet. Open a sweep and choose Follow in its table of suspects."
            : "No suspect matches."}
        </EmptyState>
      )}
    </>
  );
}

async function ProgramChoice() {
  const programs = await listSuspectPrograms(await currentContext());
  const inUse = programs.filter((program) => program.archivedAt === null);
  const [only] = inUse;
  if (only && inUse.length === 1) redirect(`/suspects?program=${only.id}`);
  return (
    <>
      <PageHead title="What still sticks out?" lead="Suspects are followed within a program." />
      {inUse.length === 0 ? (
        <EmptyState>There is no program yet.</EmptyState>
      ) : (
        <ul className="max-w-xl border border-rule bg-sheet">
          {inUse.map((program) => (
            <li key={program.id} className="border-b border-rule px-4 py-2.5 last:border-0">
              <Link href={`/suspects?program=${program.id}`} className="text-deep underline">
                {program.name}
              </Link>
            </li>
          ))}
        </ul>
      )}
    </>
  );
}
