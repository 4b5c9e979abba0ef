import type { Context } from "@/lib/auth/context";
import { createBench } from "@/lib/commands/bench/create-bench";

export const BENCH = {
  name: "Loft",
  site: "Loft over the boathouse",
  instrument: "An analyzer",
  distanceM: 3,
  guardDb: 2.5,
  notes: "",
  impedanceOhm: 50,
};

export const ANTENNA = {
  name: "Mast antenna",
  kind: "antenna",
  calibratedOn: "2026-02-01",
  dueOn: "2027-02-01",
  factors: [
    { frequencyHz: 30e6, factorDb: 18.5 },
    { frequencyHz: 1e9, factorDb: 24.1 },
  ],
};

export async function benchOf(ctx: Context, name = BENCH.name): Promise<string> {
  return (await createBench(ctx, { ...BENCH, name })).benchId;
}
