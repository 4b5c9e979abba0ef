import { DEMO_BENCHES, pathOn, type DemoBench } from "../spectra/demo-benches";
import { deriveSeed, drawNormal, makeRandom } from "../spectra/random";
import { makeSpectrum } from "../spectra/spectrum";
import { writeSweepCsv } from "../spectra/write-csv";

export const COMB_SOURCE = "Comb source, 10 MHz, upright on the table";
export const CHECKED_BENCH: DemoBench["key"] = "below-1-ghz";

interface DemoCheck {
  measuredOn: string;
  isReference: boolean;
  notes: string;
}

/** A cable at the mast was loose; somebody swept all the same. */
export const LOOSE_ON = "2026-11-02";

const check = (measuredOn: string, notes = ""): DemoCheck => ({
  measuredOn,
  isReference: false,
  notes,
});

/** From the day of the new calibration to the last week. */
export const DEMO_CHECKS: DemoCheck[] = [
  { measuredOn: "2026-09-16", isReference: true, notes: "After the cable's calibration." },
  check("2026-10-05"),
  check("2026-10-13"),
  check("2026-10-20"),
  check("2026-10-27"),
  check(LOOSE_ON, "Connector at the mast only hand-tight. Found in the evening."),
  check("2026-11-03", "Tightened with the torque wrench."),
  check("2026-11-10"),
  check("2026-11-16"),
  check("2026-11-17"),
  check("2026-11-20"),
  check("2026-11-25"),
  check("2026-11-27"),
];

const SPAN = { startHz: 30e6, stopHz: 230e6, points: 4_001 };
const SPACING_HZ = 10e6;
/** How fast the level of the whole bench goes down, dB per day, and what a day adds to it. */
const DRIFT_DB_PER_DAY = -0.009;
const DAY_SPREAD_DB = 0.08;
const LINE_SPREAD_DB = 0.06;

/** Field of one line of the comb at the antenna, dBµV/m; invented. */
const combDb = (hz: number) => 66 - 7 * Math.log10(hz / 30e6);

/** What the bench was off on a day at a frequency, dB. */
function offDb({ measuredOn, isReference }: DemoCheck, hz: number, draw: () => number): number {
  if (isReference) return 0;
  const days = (Date.parse(measuredOn) - Date.parse("2026-09-16")) / 86_400_000;
  // A contact that is not tight loses more the higher the frequency.
  const looseDb = measuredOn === LOOSE_ON ? -2.6 - (1.4 * hz) / 230e6 : 0;
  return days * DRIFT_DB_PER_DAY + looseDb + LINE_SPREAD_DB * draw();
}

/** The file of one bench check: the comb's lines over the receiver's noise. */
export function makeCheckCsv(demo: DemoCheck): string {
  const bench = DEMO_BENCHES.find((candidate) => candidate.key === CHECKED_BENCH);
  if (!bench) throw new Error("The bench that is checked is not there.");
  const { measuredOn } = demo;
  const seed = deriveSeed(4_417, measuredOn);
  const random = makeRandom(seed);
  const draw = () => drawNormal(random);
  const dayDb = demo.isReference ? 0 : DAY_SPREAD_DB * draw();
  const path = pathOn(bench, measuredOn);
  const lines = [];
  for (let hz = SPACING_HZ; hz <= SPAN.stopHz; hz += SPACING_HZ)
    if (hz >= SPAN.startHz) lines.push({ hz, levelDb: combDb(hz) + dayDb + offDb(demo, hz, draw) });
  const { frequenciesHz, levelsDbuv } = makeSpectrum({
    ...SPAN,
    seed,
    rbwHz: bench.rbwHz,
    detector: "peak",
    polarization: "vertical",
    path,
    receiver: bench.receiver,
    product: null,
    link: null,
    treatments: [],
    ambient: null,
    lines,
    driftDb: 0,
  });
  return writeSweepCsv({
    layout: "header-block",
    traces: [{ name: "Peak", detector: "peak", unit: "dBuV", levels: levelsDbuv }],
    frequenciesHz,
    settings: {
      rbwHz: bench.rbwHz,
      rbwKind: "6dB",
      vbwHz: 10 * bench.rbwHz,
      sweepTimeS: 5,
      attenuationDb: bench.receiver.attenuationDb,
      preamplifier: false,
      referenceLevelDb: null,
      polarization: "vertical",
      heightM: 1.5,
      azimuthDeg: null,
      distanceM: bench.distanceM,
      port: "radiated",
    },
    measuredOn,
  });
}
