import type { SignalPath, Transducer } from "@/lib/core/bench/signal-path";
import { validateSignalPath } from "@/lib/core/bench/validate-signal-path";
import { parseFactorTable } from "@/lib/formats/parse-factor-table";
import type { FieldErrors } from "../result";
import { CommandError } from "../result";
import { MAX_FACTOR_ROWS, TOO_MANY_ROWS, type ReviseSignalPathValues } from "./schemas";
import { tableMessage } from "./table-message";

/**
 * The path as it is stored, or one message per field; a table's stand at "transducers.n.factors".
 * No calibration may lie after `today` (ISO). `known` errors are those that are known already.
 */
export function readSignalPath(
  values: ReviseSignalPathValues,
  today: string,
  known: FieldErrors = {},
): SignalPath {
  const fieldErrors: FieldErrors = { ...known };
  const transducers = values.transducers.map((given, i): Transducer => {
    const { table, factors, equipmentId, ...own } = given;
    // A path from before there was equipment has no such key, and must compare as the same path.
    const rest = equipmentId ? { ...own, equipmentId } : own;
    if (table === undefined) return { ...rest, factors: factors ?? [] };
    const read = parseFactorTable(table.text, table.frequencyUnitHz ?? undefined);
    if (read.ok && read.factors.length <= MAX_FACTOR_ROWS)
      return { ...rest, factors: read.factors };
    fieldErrors[`transducers.${i}.factors`] = read.ok ? TOO_MANY_ROWS : tableMessage(read.problems);
    return { ...rest, factors: [] };
  });
  const path: SignalPath = { version: 1, impedanceOhm: values.impedanceOhm, transducers };
  // A table that could not be read keeps its own message, which names the line.
  for (const problem of validateSignalPath(path, today)) fieldErrors[problem.path] ??= problem.text;
  if (Object.keys(fieldErrors).length > 0) {
    throw new CommandError("invalid", "Some fields need another look.", fieldErrors);
  }
  return path;
}
