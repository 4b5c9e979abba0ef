import type { Metadata } from "next";
import { AddMemberForm } from "@/components/team/add-member-form";
import { MemberTable } from "@/components/team/member-table";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listMembers } from "@/lib/queries/team/list-members";
import { addPerson, letInAgain, shutOut, storeRole } from "./actions";

export const metadata: Metadata = { title: "Team" };

export default async function TeamPage() {
  const ctx = await currentContext();
  if (!isAllowed(ctx, "people.read")) {
    return (
      <>
        <PageHead title="Team" />
        <p>Only an admin of your team sees its people.</p>
      </>
    );
  }
  const members = (await listMembers(ctx)).map(({ deactivatedAt, ...member }) => ({
    ...member,
    deactivatedOn: deactivatedAt?.toISOString().slice(0, 10) ?? null,
  }));
  return (
    <>
      <PageHead title="Team" lead="Who may sign in, and what each may do." />
      <MemberTable
        members={members}
        ownUserId={ctx.userId}
        actions={{ changeRole: storeRole, deactivate: shutOut, reactivate: letInAgain }}
      />
      <Section
        title="Add a member"
        lead="Neap sends no e-mail: you choose a first password and hand it over yourself."
      >
        <AddMemberForm action={addPerson} />
      </Section>
    </>
  );
}
