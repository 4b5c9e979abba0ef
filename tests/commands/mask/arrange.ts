import type { Context } from "@/lib/auth/context";
import { createMask } from "@/lib/commands/mask/create-mask";
import type { Mask, MaskSegment } from "@/lib/core/mask/mask";

export const flat = (startHz: number, stopHz: number, db: number): MaskSegment => ({
  startHz,
  stopHz,
  startDb: db,
  stopDb: db,
  interpolation: "log",
});

export const MASK: Mask = {
  format: "neap-mask",
  version: 1,
  key: "",
  title: "Wheelhouse limit",
  port: "radiated",
  unit: "dBuV/m",
  distanceM: 3,
  document: "House rule 7",
  clause: "2",
  edition: "B",
  provenance: "team",
  note: "",
  lines: [
    {
      name: "Quasi-peak",
      detector: "quasi-peak",
      rbwHz: 120e3,
      rbwKind: "6dB",
      segments: [flat(30e6, 230e6, 40), flat(230e6, 1e9, 47)],
    },
  ],
};

/** Two segments of one line that cross between 30 MHz and 1 GHz. */
export const CROSSING: Mask = {
  ...MASK,
  lines: MASK.lines.map((line) => ({
    ...line,
    segments: [
      { ...flat(30e6, 1e9, 40), stopDb: 50 },
      { ...flat(30e6, 1e9, 50), stopDb: 40 },
    ],
  })),
};

export async function maskOf(ctx: Context, mask: Mask = MASK): Promise<string> {
  return (await createMask(ctx, { mask })).maskId;
}
