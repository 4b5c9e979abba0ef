import Link from "next/link";
import { UnconfirmedMark } from "@/components/masks/unconfirmed-mark";
import { StandingMark } from "@/components/readings/standing-mark";
import type { Standing } from "@/lib/core/reading/reading";
import { formatReportNumber } from "@/lib/core/report/report-number";
import { formatMargin } from "@/lib/core/units/format";
import { TrendThumb } from "./trend-thumb";

export interface ProgramLine {
  id: string;
  name: string;
  description: string;
  targetMarginDb: number;
  builds: number;
  now: {
    marginDb: number | null;
    standing: Standing;
    maskTitle: string;
    provenance: string;
    buildName: string;
    sweepId: string;
    missing: string[];
  } | null;
  trend: { buildName: string; marginDb: number; standing: Standing }[];
  nextMilestone: { name: string; dueOn: string; requiredMarginDb: number | null } | null;
  week: { sweeps: number; reports: number[] };
}

const day = (iso: string) => Date.parse(`${iso}T00:00:00Z`) / 86_400_000;

/** "in 12 days"; the date itself stands in the title. */
function untilText(dueOn: string, today: string): string {
  const days = day(dueOn) - day(today);
  if (days === 0) return "today";
  return days === 1
    ? "in 1 day"
    : days < 21
      ? `in ${days} days`
      : `in ${Math.round(days / 7)} weeks`;
}

/** What a program still lacks of its target, in words. */
function againstTarget({ now, targetMarginDb }: ProgramLine): string {
  if (!now || now.marginDb === null) return `target ${formatMargin(targetMarginDb)}`;
  const lacking = targetMarginDb - now.marginDb;
  if (lacking > 0)
    return `${formatMargin(lacking).slice(1)} short of ${formatMargin(targetMarginDb)}`;
  return now.standing === "undecided" || now.missing.length > 0
    ? `target ${formatMargin(targetMarginDb)} reached where it was swept and decided`
    : `target ${formatMargin(targetMarginDb)} met`;
}

/** What came in the last seven days, in words; null when nothing did. */
function weekText({ week }: ProgramLine): string | null {
  const sweeps =
    week.sweeps === 0
      ? []
      : [week.sweeps === 1 ? "1 sweep imported" : `${week.sweeps} sweeps imported`];
  const numbers = week.reports.map((number) => formatReportNumber(number).replace("-", "\u2011"));
  const reports = numbers.length === 0 ? [] : [`${numbers.join(", ")} issued`];
  const news = [...sweeps, ...reports];
  return news.length === 0 ? null : `This week: ${news.join(", ")}.`;
}

/** One program a row: where it stands, how that moved, what is due next. */
export function ProgramTable({ programs, today }: { programs: ProgramLine[]; today: string }) {
  return (
    <ul className="space-y-4">
      {programs.map((program) => (
        <li
          key={program.id}
          className="grid gap-x-8 gap-y-4 border border-rule bg-sheet p-5 md:grid-cols-[minmax(0,1.1fr)_minmax(0,1.2fr)_minmax(0,1fr)]"
        >
          <div>
            <h2 className="text-xl">
              <Link href={`/programs/${program.id}`} className="text-deep underline">
                {program.name}
              </Link>
            </h2>
            <p className="text-sm text-ink-soft">{program.description}</p>
            {program.nextMilestone ? (
              <p className="mt-3 text-sm" title={program.nextMilestone.dueOn}>
                {program.nextMilestone.name} {untilText(program.nextMilestone.dueOn, today)}
                {program.nextMilestone.requiredMarginDb === null ? null : (
                  <>
                    , asks{" "}
                    <span className="font-mono">
                      {formatMargin(program.nextMilestone.requiredMarginDb)}
                    </span>
                  </>
                )}
              </p>
            ) : (
              <p className="mt-3 text-sm text-ink-soft">No milestone ahead</p>
            )}
            <p className="text-sm text-ink-soft">{weekText(program)}</p>
          </div>
          <div>
            {program.now ? (
              <>
                <p className="flex flex-wrap items-baseline gap-x-3">
                  <Link
                    href={`/sweeps/${program.now.sweepId}`}
                    className="font-mono text-3xl tracking-tight whitespace-nowrap no-underline hover:underline"
                  >
                    {formatMargin(program.now.marginDb)}
                  </Link>
                  <StandingMark standing={program.now.standing} />
                </p>
                <p className="mt-1 text-sm text-ink-soft">
                  {program.now.buildName} under {program.now.maskTitle}{" "}
                  <UnconfirmedMark provenance={program.now.provenance} />
                </p>
                <p className="text-sm">{againstTarget(program)}</p>
                {program.now.missing.length > 0 ? (
                  <p className="text-sm text-shoal">Not swept: {program.now.missing.join("; ")}</p>
                ) : null}
              </>
            ) : (
              <>
                <p className="text-xl text-ink-soft">no reading yet</p>
                <p className="mt-1 text-sm text-ink-soft">
                  {program.builds === 0
                    ? "It has no build yet."
                    : "No sweep is on the line of record."}
                </p>
                <p className="text-sm">{againstTarget(program)}</p>
              </>
            )}
          </div>
          <TrendThumb points={program.trend} targetDb={program.targetMarginDb} />
        </li>
      ))}
    </ul>
  );
}
