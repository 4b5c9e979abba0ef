import { BigMargin } from "@/components/readings/big-margin";
import type { Standing } from "@/lib/core/reading/reading";
import { formatDelta, formatLevel, formatMargin } from "@/lib/core/units/format";
import type { LevelUnit } from "@/lib/core/units/level-units";

interface SeenBuild {
  buildName: string;
  kind: "seen" | "not-seen" | "not-swept";
  best: {
    levelDb: number;
    unit: LevelUnit;
    marginDb: number | null;
    standing: Standing | null;
    lineName: string | null;
    maskTitle: string;
  } | null;
}

interface SuspectHeadlineProps {
  /** The newest build that was swept there. */
  newest: SeenBuild | null;
  builds: SeenBuild[];
  change: {
    fromBuild: string;
    toBuild: string;
    marginDb: number | null;
    levelDb: number | null;
    reasons: string[];
    cautions: string[];
  } | null;
}

/** Where a followed suspect stands now, and how far it came since it was first seen. */
export function SuspectHeadline({ newest, builds, change }: SuspectHeadlineProps) {
  const last = builds.findLast((build) => build.kind === "seen");
  const later = builds.slice(builds.findLastIndex((build) => build === newest) + 1);
  const unswept =
    later.length > 0
      ? `Not swept there since: ${later.map((build) => build.buildName).join(", ")}.`
      : null;
  if (!newest || !last)
    return (
      <p className="text-lg">
        {newest
          ? `Not seen in ${newest.buildName}, nor in any build on the line of record.`
          : "No sweep on the line of record tells of this suspect."}
      </p>
    );
  const changed = <Change change={change} />;
  if (newest.kind === "not-seen" || !newest.best)
    return (
      <div>
        <p className="text-5xl tracking-tight">not seen</p>
        <p className="mt-1.5 text-ink-soft">
          In {newest.buildName} it was swept, but no peak stood out within 20 dB of the mask. Last
          seen in {last.buildName} at {formatMargin(last.best?.marginDb ?? null)}. {unswept}
        </p>
      </div>
    );
  const { best } = newest;
  const where = `${newest.buildName}, ${best.lineName ?? "no"} line of ${best.maskTitle}, at ${formatLevel(best.levelDb, best.unit)}.`;
  return (
    <div>
      {best.standing ? (
        <BigMargin marginDb={best.marginDb} standing={best.standing}>
          {where} {unswept}
        </BigMargin>
      ) : (
        <>
          <p className="font-mono text-5xl tracking-tight">
            {formatLevel(best.levelDb, best.unit)}
          </p>
          <p className="mt-1.5 text-ink-soft">
            {where} {unswept}
          </p>
        </>
      )}
      {changed}
    </div>
  );
}

function Change({ change }: Pick<SuspectHeadlineProps, "change">) {
  if (!change) return <p className="mt-1 text-ink-soft">Seen in one build so far.</p>;
  if (change.levelDb === null)
    return (
      <p className="mt-1 text-ink-soft">
        No change is told since {change.fromBuild}, for these are not the same measurement:{" "}
        {change.reasons.join("; ")}.
      </p>
    );
  return (
    <p className="mt-1">
      Since {change.fromBuild} the margin moved{" "}
      <span className="font-mono">{formatDelta(change.marginDb)}</span> and the level{" "}
      <span className="font-mono">{formatDelta(change.levelDb)}</span>.{" "}
      <span className="text-shoal">{change.cautions.join(" ")}</span>
    </p>
  );
}
