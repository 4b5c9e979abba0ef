import type { Context } from "@/lib/auth/context";
import { recordBenchCheck } from "@/lib/commands/bench-check/record-bench-check";
import { onDay } from "../demo-day";
import { CHECKED_BENCH, COMB_SOURCE, DEMO_CHECKS, makeCheckCsv } from "./demo-checks";

/** Records the bench checks of the demo in the order of their days. */
export async function seedChecks(
  ctx: Context,
  benchIds: ReadonlyMap<string, string>,
): Promise<void> {
  for (const check of DEMO_CHECKS) {
    await recordBenchCheck(ctx, {
      benchId: benchIds.get(CHECKED_BENCH),
      fileName: `comb-${check.measuredOn}.csv`,
      bytes: new TextEncoder().encode(makeCheckCsv(check)),
      answers: { hold: "none" },
      traceIndex: null,
      source: COMB_SOURCE,
      measuredOn: onDay(check.measuredOn),
      corrected: false,
      rbwHz: 120e3,
      isReference: check.isReference,
      notes: check.notes,
    });
  }
}
