import type { Metadata } from "next";
import { ProgramList } from "@/components/programs/program-list";
import { ButtonLink } from "@/components/ui/button";
import { today } from "@/lib/adapters/clock";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listPrograms } from "@/lib/queries/program/list-programs";

export const metadata: Metadata = { title: "Programs" };

export default async function ProgramsPage() {
  const ctx = await currentContext();
  const day = today();
  const programs = await listPrograms(ctx, day);
  return (
    <ProgramList
      title="Programs"
      lead="Products under development, by name."
      programs={[...programs].sort((a, b) => a.name.localeCompare(b.name, "en"))}
      today={day}
      mayCreate={isAllowed(ctx, "program.write")}
      actions={<ButtonLink href="/programs/archived">Archived</ButtonLink>}
    />
  );
}
