import type { Doubt } from "@/lib/core/reading/reading";
import type { SweepDelta } from "@/lib/core/delta/delta";
import type { StepState } from "@/lib/core/delta/ladder-order";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { Standing } from "@/lib/core/reading/reading";

/** A delta with the newest sweep of each side. */
export interface RungDelta extends SweepDelta {
  beforeId: string;
  afterId: string;
}

export interface RungStep {
  id: string;
  position: number;
  name: string;
  description: string;
  branchOfId: string | null;
  state: StepState;
  base: { id: string; position: number; name: string } | null;
  isOnLine: boolean;
  doubts: (Doubt & { sweeps: number })[];
  link: LinkSettings | null;
  onRecord: boolean;
  sweeps: { id: string; name: string; purpose: string }[];
  worst: {
    marginDb: number | null;
    standing: Standing;
    lineName: string | null;
    maskTitle: string;
    provenance: string;
  } | null;
  againstPrevious: RungDelta[];
  againstStart: RungDelta[];
  unpaired: string[];
}

export type ActionResult = { ok: true } | { ok: false; message: string };

type Refusal = { ok: false; message: string; fieldErrors: Record<string, string> };

export interface AcceptanceActions {
  accept: (input: unknown) => Promise<{ ok: true; data: { acceptanceId: string } } | Refusal>;
  withdraw: (acceptanceId: string) => Promise<{ ok: true } | { ok: false; message: string }>;
}

export interface RungActions extends AcceptanceActions {
  edit: (
    input: unknown,
  ) => Promise<
    | { ok: true; data: { stepId: string } }
    | { ok: false; message: string; fieldErrors: Record<string, string> }
  >;
  remove: (stepId: string) => Promise<ActionResult>;
  record: (stepId: string) => Promise<ActionResult>;
  /** Kept or dropped. */
  mark: (stepId: string, state: StepState) => Promise<ActionResult>;
  /** All steps in the wanted order. */
  reorder: (stepIds: string[]) => Promise<ActionResult>;
}
