import type { SuspectTrendPoint } from "@/components/charts/suspect-trend-data";
import type { LevelUnit } from "@/lib/core/units/level-units";
import type { SuspectDetail } from "@/lib/queries/suspect/read-suspect";

/** The unit of the newest sighting; the trend of levels is drawn in it. */
export function trendUnit(suspect: SuspectDetail): LevelUnit {
  return suspect.builds.findLast((build) => build.best !== null)?.best?.unit ?? "dBuV/m";
}

/** What each build says, as points of the trend. */
export function trendPoints(suspect: SuspectDetail): SuspectTrendPoint[] {
  const unit = trendUnit(suspect);
  return suspect.builds.map(({ buildName, kind, best }) => ({
    buildName,
    kind,
    marginDb: best?.marginDb ?? null,
    levelDb: best && best.unit === unit ? best.levelDb : null,
    standing: best?.standing ?? null,
    // The same that forbids a difference in lib/queries/suspect/change-since-first.ts.
    comparableKey: best
      ? [
          best.maskId,
          best.lineName,
          best.detector,
          best.unit,
          best.rbwHz,
          best.rbwKind,
          best.distanceM,
          best.benchId,
        ].join(" ")
      : "",
    href: best ? `/sweeps/${best.sweepId}?mask=${best.maskId}` : null,
  }));
}
