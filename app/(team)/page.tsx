import type { Metadata } from "next";
import { ProgramList } from "@/components/programs/program-list";
import { today } from "@/lib/adapters/clock";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listPrograms, type ProgramRow } from "@/lib/queries/program/list-programs";

export const metadata: Metadata = { title: "Overview" };

/** Where the team stands, in one sentence. */
function answer(programs: ProgramRow[]): string {
  if (programs.length === 0) return "Where do we stand?";
  const over = programs.filter((program) => program.now?.standing === "over").length;
  const short = programs.filter(
    ({ now, targetMarginDb }) =>
      now && now.standing !== "over" && now.marginDb !== null && now.marginDb < targetMarginDb,
  ).length;
  const unknown = programs.filter((program) => !program.now).length;
  const parts = [
    ...(over > 0 ? [`${over} over the mask`] : []),
    ...(short > 0 ? [`${short} short of the target`] : []),
    ...(unknown > 0 ? [`${unknown} without a reading`] : []),
  ];
  const many = programs.length === 1 ? "One program" : `${programs.length} programs`;
  return parts.length > 0
    ? `${many}: ${parts.join(", ")}. The riskiest comes first.`
    : `${many}, all at or above the target on the bench.`;
}

export default async function OverviewPage() {
  const ctx = await currentContext();
  const day = today();
  const programs = await listPrograms(ctx, day);
  return (
    <ProgramList
      title="Overview"
      lead={answer(programs)}
      programs={programs}
      today={day}
      mayCreate={isAllowed(ctx, "program.write")}
    />
  );
}
