import type { Mask } from "@/lib/core/mask/mask";
import type { MaskCsvAnswers } from "@/lib/formats/read-mask-csv";
import { maskFromCsv } from "@/lib/formats/read-mask-csv";
import { checkMaskInput, refuseMask } from "./read-mask-input";

const atLine = (line: number | null, text: string) =>
  line === null ? text : `Line ${line}: ${text}`;

/** A mask from CSV that can be stored, or every problem under its line or the answer it waits for. */
export function readCsvInput(text: string, answers?: MaskCsvAnswers): Mask {
  const read = maskFromCsv(text, answers);
  if (!read.ok)
    refuseMask(
      read.problems.map(({ line, field, text: what }) => ({
        path: line === null ? field : `line.${line}`,
        text: atLine(line, what),
      })),
    );
  const checked = checkMaskInput(read.mask);
  if (checked.ok) return checked.mask;
  refuseMask(
    checked.problems.map(({ path, text: what }) => {
      const line = read.lineOf(path);
      return { path: line === null ? path : `line.${line}`, text: atLine(line, what) };
    }),
  );
}
