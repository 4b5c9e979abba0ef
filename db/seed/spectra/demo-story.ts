import type { LinkSettings, SpreadSpectrum } from "@/lib/core/link/link-settings";
import type { AmbientSite, ProductModel, Treatment } from "./setup";

export type ProgramName = "Gannet" | "Plover" | "Tern";
export type BuildName = "G1" | "G2" | "G3" | "P1" | "P2" | "P3" | "T1";

export interface StoryStep {
  name: string;
  description: string;
  /** ISO date on which its sweeps were taken. */
  measuredOn: string;
  link: LinkSettings;
  treatments: Treatment[];
}

/** One ladder as it is told: what was changed, when, on which build. */
export interface StoryLadder {
  programName: ProgramName;
  buildName: BuildName;
  name: string;
  description: string;
  product: ProductModel;
  ambient: AmbientSite;
  steps: StoryStep[];
}

export const SITE_SEED = 1_306;

const SPREAD: SpreadSpectrum = {
  depthPercent: 0.5,
  direction: "down",
  modulationHz: 31_500,
  profile: "triangular",
};

export function spreadBy(depthPercent: number): { spread: SpreadSpectrum; spreadOff: false } {
  return { spread: { ...SPREAD, depthPercent }, spreadOff: false };
}

/** A link that sends its idle word over and over. */
export function linkAtRest(
  bitRateHz: number,
  patternBits: number,
  edgeTimeS: number,
  cable: string,
): LinkSettings {
  return {
    bitRateHz,
    payload: "repeating-pattern",
    patternBits,
    scrambler: "none",
    scramblerPolynomial: null,
    scramblerRestartBits: null,
    coding: "none",
    spread: null,
    spreadOff: true,
    edgeTimeS,
    cable,
  };
}

/** The same link with its 16-bit additive scrambler, restarted in every frame. */
export function scrambled(atRest: LinkSettings, restartBits: number): LinkSettings {
  return {
    ...atRest,
    payload: "video-like",
    patternBits: null,
    scrambler: "additive",
    scramblerPolynomial: "x^16+x^5+x^4+x^3+1",
    scramblerRestartBits: restartBits,
  };
}
