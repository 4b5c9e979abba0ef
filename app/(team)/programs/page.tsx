import type { Metadata } from "next";
import { ProgramList } from "@/components/programs/program-list";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listPrograms } from "@/lib/queries/program/list-programs";

export const metadata: Metadata = { title: "Programs" };

export default async function ProgramsPage() {
  const ctx = await currentContext();
  return (
    <ProgramList
      title="Programs"
      lead="Products under development."
      programs={await listPrograms(ctx)}
      mayCreate={isAllowed(ctx, "program.write")}
    />
  );
}
