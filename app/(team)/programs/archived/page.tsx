import type { Metadata } from "next";
import { ArchivedList } from "@/components/programs/archived-list";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listArchivedPrograms } from "@/lib/queries/program/list-archived";
import { bringProgramBack } from "../edit-actions";

export const metadata: Metadata = { title: "Archived programs" };

export default async function ArchivedProgramsPage() {
  const ctx = await currentContext();
  const items = (await listArchivedPrograms(ctx)).map(({ archivedAt, ...row }) => ({
    ...row,
    archivedOn: archivedAt?.toISOString().slice(0, 10) ?? "",
  }));
  return (
    <>
      <PageHead
        title="Archived programs"
        trail={[{ href: "/programs", label: "Programs" }]}
        lead="Out of the lists, with everything they hold."
      />
      <ArchivedList
        label="Archived programs"
        items={items}
        {...(isAllowed(ctx, "program.write") ? { restore: bringProgramBack } : {})}
      />
      {items.length === 0 ? <EmptyState>No program is archived.</EmptyState> : null}
    </>
  );
}
