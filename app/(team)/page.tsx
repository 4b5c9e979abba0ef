import { ProgramList } from "@/components/programs/program-list";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listPrograms } from "@/lib/queries/program/list-programs";

export default async function OverviewPage() {
  const ctx = await currentContext();
  return (
    <ProgramList
      title="Overview"
      lead="The programs of your team with the margin that each of them aims at."
      programs={await listPrograms(ctx)}
      mayCreate={isAllowed(ctx, "program.write")}
    />
  );
}
