import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { inTeam } from "@/db/client";
import { folderStore } from "@/lib/adapters/folder-store";
import type { Context } from "@/lib/auth/context";
import { createBench } from "@/lib/commands/bench/create-bench";
import { reviseSignalPath } from "@/lib/commands/bench/revise-signal-path";
import { addShippedMasks } from "@/lib/commands/mask/add-shipped-masks";
import { createBuild } from "@/lib/commands/program/create-build";
import { createProgram } from "@/lib/commands/program/create-program";
import { setProgramMasks } from "@/lib/commands/program/set-program-masks";
import type { ImportedSweep } from "@/lib/commands/sweep/import-sweep";
import { importSweep } from "@/lib/commands/sweep/import-sweep";
import type { Mask } from "@/lib/core/mask/mask";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import { readShippedMasks } from "@/lib/formats/shipped-masks";
import type { TestDatabase } from "../support/database";
import { makeMember, openTestDatabase } from "../support/database";

const MASKS = [
  "cispr-32-radiated-class-b-3m",
  "cispr-32-radiated-class-a-3m",
  "fcc-15-109-class-b-3m",
];

export const SETTINGS: MeasurementSettings = {
  rbwHz: 120e3,
  rbwKind: "6dB",
  vbwHz: 1e6,
  sweepTimeS: 5,
  attenuationDb: 10,
  preamplifier: false,
  referenceLevelDb: null,
  polarization: "vertical",
  heightM: 1,
  azimuthDeg: 0,
  distanceM: 3,
  port: "radiated",
};

const LINK = {
  bitRateHz: null,
  payload: null,
  patternBits: null,
  scrambler: null,
  scramblerPolynomial: null,
  scramblerRestartBits: null,
  coding: null,
  spread: null,
  spreadOff: null,
  edgeTimeS: null,
  cable: null,
};

/** A team with a bench, a build and three masks to hold its sweeps against. */
export interface Place {
  ctx: Context;
  database: TestDatabase;
  masks: Mask[];
  importFile: (bytes: Uint8Array) => Promise<ImportedSweep>;
  close: () => Promise<void>;
}

const transducer = (
  name: string,
  kind: "antenna" | "cable",
  factorDb: (mhz: number) => number,
) => ({
  name,
  kind,
  calibratedOn: "2026-03-02",
  dueOn: "2027-03-02",
  factors: Array.from({ length: 100 }, (_, i) => 20 + 10 * i).map((mhz) => ({
    frequencyHz: mhz * 1e6,
    factorDb: factorDb(mhz),
  })),
});

async function arrange(ctx: Context, shipped: Mask[]) {
  await inTeam(ctx.db, ctx.teamId, (tx) => addShippedMasks(tx, ctx.teamId, shipped));
  const found = await inTeam(ctx.db, ctx.teamId, (tx) =>
    tx.query.masks.findMany({ columns: { id: true } }),
  );
  const program = { name: "Gannet", description: "", targetMarginDb: 6 };
  const { programId } = await createProgram(ctx, program);
  await setProgramMasks(ctx, { programId, maskIds: found.map(({ id }) => id) });
  const { buildId } = await createBuild(ctx, { programId, name: "EVT", builtOn: null, notes: "" });
  const { benchId } = await createBench(ctx, {
    name: "Chamber",
    site: "",
    instrument: "",
    distanceM: 3,
    guardDb: 3,
    notes: "",
    impedanceOhm: 50,
  });
  await reviseSignalPath(ctx, {
    benchId,
    impedanceOhm: 50,
    transducers: [
      transducer("Antenna", "antenna", (mhz) => 6 + 14 * Math.log10(1 + mhz / 60)),
      transducer("Cable", "cable", (mhz) => 0.02 * Math.sqrt(mhz)),
    ],
  });
  return { buildId, benchId };
}

export async function openPlace(): Promise<Place> {
  const folder = mkdtempSync(join(tmpdir(), "neap-bench-"));
  const database = await openTestDatabase();
  const close = async () => {
    await database.close();
    rmSync(folder, { recursive: true, force: true });
  };
  try {
    const member = await makeMember(database, "admin");
    const ctx = { ...member, files: folderStore(folder) };
    const shipped = (await readShippedMasks()).filter(({ key }) => MASKS.includes(key));
    if (shipped.length !== MASKS.length) throw new Error(`Not all shipped: ${MASKS.join(", ")}.`);
    const where = await arrange(ctx, shipped);
    let number = 0;
    const importFile = async (bytes: Uint8Array) => {
      number += 1;
      const imported = await importSweep(ctx, {
        ...where,
        stepId: null,
        fileName: `sweep-${number}.csv`,
        bytes,
        answers: {},
        name: `Sweep ${number}`,
        purpose: "product",
        measuredOn: "2026-11-24",
        corrected: false,
        settings: SETTINGS,
        link: LINK,
        notes: "",
        onRecord: true,
        again: false,
      });
      // A reading that was refused costs nothing, and would make the figures look well.
      if (imported.readings.length !== MASKS.length)
        throw new Error(`Held against ${imported.readings.length} masks, not ${MASKS.length}.`);
      return imported;
    };
    return { ctx, database, masks: shipped, importFile, close };
  } catch (error) {
    await close();
    throw error;
  }
}
