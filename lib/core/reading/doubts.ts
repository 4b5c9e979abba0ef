import type { Mask } from "../mask/mask";
import type { Port } from "../sweep/settings";
import { formatFrequency } from "../units/format";
import { bandwidthDoubts, stepDoubts } from "./bandwidth-doubts";
import { calibrationDoubts, overloadDoubts, scanTimeDoubts } from "./bench-doubts";
import { distanceDoubts, planeWaveDoubts } from "./distance-doubts";
import type { HeldTrace } from "./held-trace";
import type { Doubt, LineReading } from "./reading";
import type { SweepPart } from "./sweep-part";

/** The doubt of a radiated sweep without an ambient sweep of its bench and day; else none. */
export function ambientDoubt(port: Port, ambientTaken: boolean): Doubt[] {
  if (port !== "radiated" || ambientTaken) return [];
  const text =
    "No ambient sweep of this bench and day is here: take one with the product off and import it.";
  return [{ code: "ambient-not-taken", text, valueDb: null }];
}

/** Sweeps that state one polarization only, under a mask that holds for both. */
export function polarizationDoubts(
  mask: Mask,
  parts: readonly Pick<SweepPart, "settings">[],
): Doubt[] {
  if (mask.port !== "radiated") return [];
  const stated = [...new Set(parts.flatMap(({ settings }) => settings.polarization ?? []))];
  const [only] = stated;
  if (stated.length > 1) return [];
  const text = only
    ? `Only the ${only} polarization was swept: the mask holds in both. Sweep the other one.`
    : "No sweep states its polarization: the mask holds in both. State it on the sweeps.";
  return [{ code: "polarization-missing", text, valueDb: null }];
}

function coverageDoubts(lines: readonly LineReading[]): Doubt[] {
  return lines
    .filter(({ coverage }) => coverage.fraction < 1)
    .map(({ name, coverage }) => {
      const shown = coverage.gaps
        .slice(0, 3)
        .map((g) => `${formatFrequency(g.startHz)} to ${formatFrequency(g.stopHz)}`);
      const more = coverage.gaps.length - shown.length;
      const text = `${name} was swept on ${Math.min(99, Math.floor(coverage.fraction * 100))} % of its range; missing: ${shown.join(", ")}${more > 0 ? ` and ${more} more` : ""}. Sweep the rest.`;
      return { code: "not-covered", text, valueDb: null };
    });
}

function doubtsOfPart(mask: Mask, part: SweepPart, held: readonly HeldTrace[]): Doubt[] {
  const { context = {}, settings } = part;
  const scans = held.filter(({ trace, levels }) => trace.kind === "scan" && levels.count > 0);
  return [
    ...bandwidthDoubts(mask, settings, held),
    ...stepDoubts(mask, settings, scans),
    ...scanTimeDoubts(settings, scans),
    ...(context.calibration ? calibrationDoubts(context.calibration) : []),
    ...(context.instrumentLevelsDb ? overloadDoubts(settings, context.instrumentLevelsDb) : []),
    ...(context.ambientTaken === undefined
      ? []
      : ambientDoubt(settings.port, context.ambientTaken)),
    ...distanceDoubts(mask, settings, held),
    ...planeWaveDoubts(part.traces, mask.unit),
  ];
}

/** Doubts of several sweeps, each once, with the sweeps that have it unless all do. */
function gather(byPart: readonly Doubt[][]): Doubt[] {
  const found = new Map<string, Doubt & { partIndexes: number[] }>();
  byPart.forEach((doubts, part) => {
    for (const doubt of doubts) {
      const key = `${doubt.code} ${doubt.text}`;
      const known = found.get(key) ?? { ...doubt, partIndexes: [] };
      if (!known.partIndexes.includes(part)) known.partIndexes.push(part);
      found.set(key, known);
    }
  });
  return [...found.values()].map(({ partIndexes, ...doubt }) =>
    partIndexes.length === byPart.length ? doubt : { ...doubt, partIndexes },
  );
}

/** Everything that weakens the reading of these sweeps, each with its number and what to do. */
export function doubtsOf(
  mask: Mask,
  parts: readonly SweepPart[],
  held: readonly HeldTrace[],
  lines: readonly LineReading[],
): Doubt[] {
  const byPart = parts.map((part, i) => {
    const own = held.filter(({ origins }) => origins.some((origin) => origin.partIndex === i));
    return own.length === 0 ? [] : doubtsOfPart(mask, part, own);
  });
  const memory: Doubt = {
    code: "mask-from-memory",
    text: "This mask was written down from memory: confirm it against your own copy of the document.",
    valueDb: null,
  };
  return [
    ...gather(byPart),
    ...coverageDoubts(lines),
    ...(mask.provenance === "from memory" ? [memory] : []),
  ];
}
