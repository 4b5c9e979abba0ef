import type { Context } from "@/lib/auth/context";
import { importSweep } from "@/lib/commands/sweep/import-sweep";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import { onDay } from "../demo-day";
import { makeDemoCsv, type DemoSweep } from "../spectra/demo-sweep";

/** A product that is off has no link settings to state. */
const LINK_OFF: LinkSettings = {
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

interface SweepPlace {
  buildId: string;
  stepId: string | null;
  benchIds: ReadonlyMap<string, string>;
}

interface ImportedAs {
  /** The file, where it is not the sweep's own. */
  csv?: string;
  /** Single-frequency readings instead of a continuous sweep. */
  isSpots?: boolean;
  notes?: string;
  onRecord?: boolean;
}

/** Takes a demo sweep in as a person would: as the file that the analyzer wrote. */
export async function importDemoSweep(
  ctx: Context,
  place: SweepPlace,
  sweep: DemoSweep,
  { csv, isSpots = false, notes = "", onRecord = false }: ImportedAs = {},
): Promise<string> {
  const { sweepId } = await importSweep(ctx, {
    buildId: place.buildId,
    stepId: place.stepId,
    benchId: place.benchIds.get(sweep.benchKey),
    fileName: sweep.fileName,
    bytes: new TextEncoder().encode(csv ?? makeDemoCsv(sweep)),
    answers: { hold: "none", ...(isSpots ? { kind: "spots" } : {}) },
    name: sweep.name,
    purpose: sweep.purpose,
    measuredOn: onDay(sweep.measuredOn),
    corrected: false,
    settings: sweep.settings,
    link: sweep.link ?? LINK_OFF,
    notes,
    onRecord,
    again: false,
  });
  return sweepId;
}
