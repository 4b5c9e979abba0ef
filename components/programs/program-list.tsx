import type { ReactNode } from "react";
import { ButtonLink } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import type { ProgramLine } from "./program-table";
import { ProgramTable } from "./program-table";

interface ProgramListProps {
  title: string;
  lead: ReactNode;
  programs: ProgramLine[];
  today: string;
  mayCreate: boolean;
  actions?: ReactNode;
}

/** The team's programs, or how to make the first one. */
export function ProgramList(props: ProgramListProps) {
  const { title, lead, programs, today, mayCreate, actions } = props;
  return (
    <>
      <PageHead
        title={title}
        lead={lead}
        actions={
          <>
            {actions}
            {mayCreate ? <ButtonLink href="/programs/new">New program</ButtonLink> : null}
          </>
        }
      />
      {programs.length > 0 ? (
        <ProgramTable programs={programs} today={today} />
      ) : (
        <EmptyState>
          No programs yet.{" "}
          {mayCreate
            ? "Make the first one: a product under development with its target margin."
            : "An engineer or a manager of your team makes them."}
        </EmptyState>
      )}
    </>
  );
}
