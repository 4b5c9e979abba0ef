import type { Metadata } from "next";
import { AuditFilter } from "@/components/team/audit-filter";
import { AuditList } from "@/components/team/audit-list";
import { ButtonLink } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listAuditChoices, listAuditEvents } from "@/lib/queries/team/list-audit-events";
import { auditAddress, readAuditParams } from "./search-params";

export const metadata: Metadata = { title: "Audit trail" };

interface AuditPageProps {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function AuditPage(props: AuditPageProps) {
  const ctx = await currentContext();
  if (!isAllowed(ctx, "audit.read")) {
    return (
      <>
        <PageHead title="Audit trail" />
        <p>Only an admin of your team reads its audit trail.</p>
      </>
    );
  }
  const filter = readAuditParams(await props.searchParams);
  const [page, choices] = await Promise.all([listAuditEvents(ctx, filter), listAuditChoices(ctx)]);
  const isFiltered = Boolean(filter.action ?? filter.actorId);
  return (
    <>
      <PageHead title="Audit trail" lead="Every change in this team, the newest first." />
      <AuditFilter choices={choices} action={filter.action} actorId={filter.actorId} />
      {page.events.length > 0 ? (
        <AuditList events={page.events} now={page.readAt} />
      ) : (
        <EmptyState>
          {isFiltered || filter.before
            ? "Nothing matches. Clear the filters to see everything."
            : "Nothing has been changed yet."}
        </EmptyState>
      )}
      <div className="mt-4 flex gap-2 print:hidden">
        {filter.before ? (
          <ButtonLink href={auditAddress(null, filter)}>Back to the newest</ButtonLink>
        ) : null}
        {page.nextBefore ? (
          <ButtonLink href={auditAddress(page.nextBefore, filter)}>Older</ButtonLink>
        ) : null}
      </div>
    </>
  );
}
