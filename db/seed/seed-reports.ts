import type { Context } from "@/lib/auth/context";
import { approveReport } from "@/lib/commands/report/approve-report";
import { createReport } from "@/lib/commands/report/create-report";
import { issueReport } from "@/lib/commands/report/issue-report";
import type { SeededLadder } from "./sweeps/seed-ladders";

const REPORTS = [
  {
    buildName: "G2",
    title: "Gannet G2, bench summary",
    summary: "Scrambler on by default. The connector is still the first shell.",
    approve: true,
  },
  {
    buildName: "G3",
    title: "Gannet G3, bench summary before the chamber days",
    summary:
      "New connector shell, cable clamp and gasket. Please start with the camera in its docking mode: it is the worst on our bench.",
    approve: true,
  },
  {
    buildName: "P2",
    title: "Plover P2, bench summary",
    summary: "Die-cast housing with the spread clock on. Short of the target by about 2 dB.",
    approve: false,
  },
];

/** Reports of the demo: two approved, one waiting for its approval, one draft. */
export async function seedReports(
  engineer: Context,
  manager: Context,
  ladders: SeededLadder[],
): Promise<void> {
  const ladderOf = (buildName: string) => {
    const found = ladders.find((ladder) => ladder.buildName === buildName);
    if (!found) throw new Error(`The demo has no ladder on ${buildName}.`);
    return found;
  };
  const draft = async (buildName: string, title: string, summary: string) => {
    const { buildId, ladderId, lastSweepIds } = ladderOf(buildName);
    return createReport(engineer, {
      buildId,
      title,
      summary,
      paper: "a4",
      sweepIds: lastSweepIds,
      ladderId,
      replacesId: null,
    });
  };
  for (const { buildName, title, summary, approve } of REPORTS) {
    const { reportId } = await draft(buildName, title, summary);
    await issueReport(engineer, { reportId });
    if (approve) await approveReport(manager, { reportId });
  }
  await draft("T1", "Tern T1, first bench look", "");
}
