import type { Context } from "@/lib/auth/context";
import type { FactorPoint } from "@/lib/core/bench/signal-path";
import { factorTableSchema } from "@/lib/commands/bench/schemas";
import { tableMessage } from "@/lib/commands/bench/table-message";
import { parseInput, requirePermission } from "@/lib/commands/run";
import { parseFactorTable } from "@/lib/formats/parse-factor-table";

export type FactorTableReading =
  { ok: true; factors: FactorPoint[] } | { ok: false; message: string };

/** What a typed or pasted factor table says, before anything is stored. */
export async function readFactorTable(ctx: Context, input: unknown): Promise<FactorTableReading> {
  requirePermission(ctx, "bench.read");
  const { text, frequencyUnitHz } = parseInput(factorTableSchema, input);
  const read = parseFactorTable(text, frequencyUnitHz ?? undefined);
  return read.ok ? read : { ok: false, message: tableMessage(read.problems) };
}
