import type { Detector, Hold, MeasurementSettings } from "../sweep/settings";
import { DETECTOR_LABELS, HOLD_LABELS } from "../sweep/settings";
import type { Trace } from "../sweep/trace";
import { convertLevel } from "../units/convert-level";
import { formatFrequency } from "../units/format";
import type { LevelUnit } from "../units/level-units";
import { LEVEL_UNIT_LABELS } from "../units/level-units";

/** An ambient sweep with its levels after its signal path. */
export interface AmbientSweep {
  traces: readonly Trace[];
  settings: MeasurementSettings;
  /** Of the instrument; null: not stated. */
  impedanceOhm: number | null;
}

/** What has to be known of a trace of the product's sweep; its levels are in the reading. */
export interface ProductTrace {
  detector: Detector | null;
  unit: LevelUnit;
  hold: Hold;
  firstHz: number;
  lastHz: number;
  /** null: not one step. */
  stepHz: number | null;
}

/** An ambient trace that speaks about the product's traces of one detector. */
export interface ComparableTrace {
  trace: Trace;
  detector: Detector;
  /** What restates its levels in the reading's unit. */
  addDb: number;
}

export interface Comparison {
  traces: ComparableTrace[];
  notComparable: string | null;
  caveats: string[];
}

/** Why two sweeps of one bench and day were not measured alike; null when they were. */
function settingsMismatch(
  ambient: MeasurementSettings,
  product: MeasurementSettings,
): string | null {
  if (ambient.port !== product.port)
    return `It was taken at the port "${ambient.port}" and the sweep at the port "${product.port}".`;
  if (ambient.rbwHz === null || product.rbwHz === null)
    return "The resolution bandwidth is not stated for both.";
  if (ambient.rbwHz !== product.rbwHz)
    return `It was taken with a bandwidth of ${formatFrequency(ambient.rbwHz)} and the sweep with ${formatFrequency(product.rbwHz)}.`;
  if (ambient.rbwKind !== null && product.rbwKind !== null && ambient.rbwKind !== product.rbwKind)
    return `Its bandwidth counts at ${ambient.rbwKind.replace("dB", " dB")} and that of the sweep at ${product.rbwKind.replace("dB", " dB")}.`;
  if (product.port !== "radiated") return null;
  const [a, p] = [ambient.polarization, product.polarization];
  if (a !== null && p !== null && a !== p)
    return `It was taken with ${a} polarization and the sweep with ${p}.`;
  if (
    ambient.distanceM !== null &&
    product.distanceM !== null &&
    ambient.distanceM !== product.distanceM
  )
    return `Its antenna stood at ${ambient.distanceM} m and that of the sweep at ${product.distanceM} m.`;
  return null;
}

function settingsCaveats(ambient: MeasurementSettings, product: MeasurementSettings): string[] {
  const caveats: string[] = [];
  if (product.port === "radiated") {
    const silent = [ambient, product].filter((settings) => settings.polarization === null);
    if (silent.length === 2) caveats.push("Neither sweep states its polarization.");
    else if (silent[0] === ambient) caveats.push("The ambient sweep states no polarization.");
    else if (silent[0] === product) caveats.push("The sweep states no polarization.");
  }
  if ((ambient.rbwKind === null) !== (product.rbwKind === null))
    caveats.push("Only one of the two states whether its bandwidth counts at 3 dB or 6 dB.");
  return caveats;
}

/**
 * What restates a level of the ambient in the reading's unit, by the rules that hold for the
 * product's own traces in read-sweep; null when it cannot be had.
 */
function restateDb(from: LevelUnit, to: LevelUnit, impedanceOhm: number | null): number | null {
  if (from === to) return 0;
  const add = convertLevel(0, from, to, impedanceOhm ?? 50);
  // Volt and ampere follow from each other at the instrument's input, not behind a current probe.
  if (add === null || (from === "dBuA") !== (to === "dBuA")) return null;
  return impedanceOhm === null && add !== convertLevel(0, from, to, 75) ? null : add;
}

/**
 * Which traces of an ambient sweep can be held beside a product's: of the same port, bandwidth,
 * detector, polarization and antenna distance, and in a unit that can be restated. An unstated
 * polarization on either side, and a hold that differs, make the comparison one with a caveat.
 * Where a detector has a trace with the product's own hold, the others of it are left out. Min
 * hold never speaks for the ambient, which it shows at its quietest.
 */
export function compareAmbient(
  ambient: AmbientSweep,
  product: { traces: readonly ProductTrace[]; settings: MeasurementSettings; unit: LevelUnit },
): Comparison {
  const refuse = (notComparable: string): Comparison => ({
    traces: [],
    notComparable,
    caveats: [],
  });
  const mismatch = settingsMismatch(ambient.settings, product.settings);
  if (mismatch) return refuse(mismatch);
  const caveats = settingsCaveats(ambient.settings, product.settings);
  const detectors = [...new Set(product.traces.flatMap((t) => t.detector ?? []))];
  const found: ComparableTrace[] = [];
  const wrongUnits = new Set<LevelUnit>();
  for (const detector of detectors) {
    const holds = product.traces.filter((t) => t.detector === detector).map((t) => t.hold);
    const own: ComparableTrace[] = [];
    for (const trace of ambient.traces) {
      if (trace.detector !== detector || trace.hold === "min-hold") continue;
      const addDb = restateDb(trace.unit, product.unit, ambient.impedanceOhm);
      if (addDb === null) wrongUnits.add(trace.unit);
      else own.push({ trace, detector, addDb });
    }
    const alike = own.filter(({ trace }) => holds.includes(trace.hold));
    const [first] = own;
    if (alike.length === 0 && first)
      caveats.push(
        `The ambient's ${DETECTOR_LABELS[detector]} trace has ${HOLD_LABELS[first.trace.hold]} and the sweep's ${holds.map((hold) => HOLD_LABELS[hold]).join(" and ")}.`,
      );
    found.push(...(alike.length > 0 ? alike : own));
  }
  if (found.length > 0) return { traces: found, notComparable: null, caveats };
  if (wrongUnits.size > 0) {
    const units = [...wrongUnits].map((unit) => LEVEL_UNIT_LABELS[unit]).join(", ");
    return refuse(
      `Its levels are in ${units}, which cannot be restated in ${LEVEL_UNIT_LABELS[product.unit]}.`,
    );
  }
  const names = detectors.map((detector) => DETECTOR_LABELS[detector]).join(" or ");
  return refuse(
    names === ""
      ? "The sweep states no detector."
      : `It has no ${names} trace, so none of the sweep's own detector.`,
  );
}
