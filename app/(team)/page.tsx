import type { Metadata } from "next";
import { ProgramList } from "@/components/programs/program-list";
import { today } from "@/lib/adapters/clock";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import type { Standing } from "@/lib/core/reading/reading";
import { listPrograms, type ProgramRow } from "@/lib/queries/program/list-programs";

export const metadata: Metadata = { title: "Overview" };

/** Where the team stands, in one sentence. */
function answer(programs: ProgramRow[]): string {
  if (programs.length === 0) return "Where do we stand?";
  const standing = (wanted: Standing) =>
    programs.filter((program) => program.now?.standing === wanted).length;
  const over = standing("over");
  const undecided = standing("undecided");
  const short = programs.filter(
    ({ now, targetMarginDb }) =>
      now &&
      (now.standing === "clear" || now.standing === "inside-guard") &&
      now.marginDb < targetMarginDb,
  ).length;
  const partly = programs.filter(
    ({ now }) =>
      now && now.standing !== "over" && now.standing !== "undecided" && now.missing.length > 0,
  ).length;
  const unknown = programs.filter((program) => !program.now).length;
  const parts = [
    ...(over > 0 ? [`${over} over the mask`] : []),
    ...(undecided > 0 ? [`${undecided} undecided`] : []),
    ...(short > 0 ? [`${short} short of the target`] : []),
    ...(partly > 0 ? [`${partly} not swept under every mask`] : []),
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
