import type { z } from "zod";
import type { EquipmentKind } from "@/lib/core/bench/equipment";
import type { FactorPoint } from "@/lib/core/bench/signal-path";
import { validateSignalPath } from "@/lib/core/bench/validate-signal-path";
import { parseFactorTable } from "@/lib/formats/parse-factor-table";
import { MAX_FACTOR_ROWS, TOO_MANY_ROWS, type factorTableSchema } from "../bench/schemas";
import { tableMessage } from "../bench/table-message";
import { CommandError } from "../result";

function refuse(text: string): never {
  throw new CommandError("invalid", "Some fields need another look.", { table: text });
}

/** The factors that came with a calibration; null without a table. Refusals stand at "table". */
export function readFactors(
  kind: EquipmentKind,
  table: z.infer<typeof factorTableSchema> | null,
): FactorPoint[] | null {
  if (table === null || table.text.trim() === "") return null;
  if (kind === "instrument") refuse("An instrument has no factor table: leave it empty.");
  const read = parseFactorTable(table.text, table.frequencyUnitHz ?? undefined);
  if (!read.ok) refuse(tableMessage(read.problems));
  if (read.factors.length > MAX_FACTOR_ROWS) refuse(TOO_MANY_ROWS);
  const alone = { name: "It", kind, factors: read.factors, calibratedOn: null, dueOn: null };
  // What a signal path would refuse later is refused where the table is typed.
  const [problem] = validateSignalPath({ version: 1, impedanceOhm: 50, transducers: [alone] });
  if (problem) refuse(problem.text);
  return read.factors;
}
