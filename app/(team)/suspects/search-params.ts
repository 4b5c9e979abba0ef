import { readFrequency } from "@/components/programs/read-frequency";
import { SUSPECT_STATES } from "@/lib/core/reading/suspect-state";
import type { SuspectFilter } from "@/lib/queries/suspect/list-suspects";

export type SearchParams = Record<string, string | string[] | undefined>;

const one = (params: SearchParams, name: string) => {
  const value = params[name];
  return typeof value === "string" ? value.trim().slice(0, 100) : "";
};

/** The list's filter as it stands in the address, as typed and as understood. */
export function readSuspectFilter(params: SearchParams) {
  const typed = {
    programId: one(params, "program"),
    state: one(params, "state"),
    owner: one(params, "owner"),
    from: one(params, "from"),
    to: one(params, "to"),
  };
  const errors: { from?: string; to?: string } = {};
  const frequency = (name: "from" | "to") => {
    if (typed[name] === "") return null;
    const hz = readFrequency(typed[name]);
    if (!Number.isNaN(hz)) return hz;
    errors[name] = "Write it with its unit, for example 148.5 MHz. It filters nothing now.";
    return null;
  };
  const filter: SuspectFilter = {
    state: SUSPECT_STATES.find((state) => state === typed.state) ?? null,
    owner: typed.owner === "" ? null : typed.owner,
    fromHz: frequency("from"),
    toHz: frequency("to"),
  };
  return { typed, filter, errors };
}
