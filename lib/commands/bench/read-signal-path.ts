import type { SignalPath, Transducer } from "@/lib/core/bench/signal-path";
import { validateSignalPath } from "@/lib/core/bench/validate-signal-path";
import { parseFactorTable } from "@/lib/formats/parse-factor-table";
import type { FieldErrors } from "../result";
import { CommandError } from "../result";
import { MAX_FACTOR_ROWS, TOO_MANY_ROWS, type ReviseSignalPathValues } from "./schemas";
import { tableMessage } from "./table-message";

/** The path as it is stored, or one message per field; a table's stand at "transducers.n.factors". */
export function readSignalPath(values: ReviseSignalPathValues): SignalPath {
  const fieldErrors: FieldErrors = {};
  const transducers = values.transducers.map(({ table, factors, ...rest }, i): Transducer => {
    if (table === undefined) return { ...rest, factors: factors ?? [] };
    const read = parseFactorTable(table.text, table.frequencyUnitHz ?? undefined);
    if (read.ok && read.factors.length <= MAX_FACTOR_ROWS)
      return { ...rest, factors: read.factors };
    fieldErrors[`transducers.${i}.factors`] = read.ok ? TOO_MANY_ROWS : tableMessage(read.problems);
    return { ...rest, factors: [] };
  });
  const path: SignalPath = { version: 1, impedanceOhm: values.impedanceOhm, transducers };
  // A table that could not be read keeps its own message, which names the line.
  for (const problem of validateSignalPath(path)) fieldErrors[problem.path] ??= problem.text;
  if (Object.keys(fieldErrors).length > 0) {
    throw new CommandError("invalid", "Some fields need another look.", fieldErrors);
  }
  return path;
}
