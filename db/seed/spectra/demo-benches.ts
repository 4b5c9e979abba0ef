import type { SignalPath } from "@/lib/core/bench/signal-path";
import type { Receiver } from "./setup";
import { PATH_ABOVE_1_GHZ, PATH_BELOW_1_GHZ, RECALIBRATED_PATH_BELOW_1_GHZ } from "./transducers";

export interface DemoBench {
  key: "below-1-ghz" | "above-1-ghz";
  name: string;
  distanceM: number;
  path: SignalPath;
  /** The path from `RECALIBRATED_FROM` on, where it is another one. */
  laterPath?: SignalPath;
  startHz: number;
  stopHz: number;
  points: number;
  rbwHz: number;
  receiver: Receiver;
}

/** 50 kHz and 500 kHz steps: under half the RBW, and exact in a file that is rounded to 1 Hz. */
export const DEMO_BENCHES: DemoBench[] = [
  {
    key: "below-1-ghz",
    name: "3 m semi-open bench (30 MHz–1 GHz)",
    distanceM: 3,
    path: PATH_BELOW_1_GHZ,
    laterPath: RECALIBRATED_PATH_BELOW_1_GHZ,
    startHz: 30e6,
    stopHz: 1e9,
    points: 19_401,
    rbwHz: 120e3,
    receiver: {
      noiseFigureDb: 10,
      attenuationDb: 0,
      preamplifierNoiseFigureDb: 0,
      looks: 3000,
    },
  },
  {
    key: "above-1-ghz",
    name: "3 m horn bench (1–6 GHz)",
    distanceM: 3,
    path: PATH_ABOVE_1_GHZ,
    startHz: 1e9,
    stopHz: 6e9,
    points: 10_001,
    rbwHz: 1e6,
    receiver: {
      noiseFigureDb: 16,
      attenuationDb: 0,
      preamplifierNoiseFigureDb: 3.5,
      looks: 5000,
    },
  },
];

/** The day from which the long cable's new calibration is in the signal path. */
export const RECALIBRATED_FROM = "2026-09-14";

/** The signal path of a bench on one day (ISO date). */
export function pathOn(bench: DemoBench, day: string): SignalPath {
  return day >= RECALIBRATED_FROM ? (bench.laterPath ?? bench.path) : bench.path;
}
