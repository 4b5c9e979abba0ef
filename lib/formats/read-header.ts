import { headerKeyOf, type HeaderKey } from "./header-keys";
import { splitRow, trimCells, WHITESPACE } from "./split-row";
import { withoutComment } from "./text-lines";

export interface HeaderEntry {
  /** The name as written, with a unit in brackets if it has one. */
  name: string;
  /** What follows it on the line, the value first. */
  values: string[];
  line: number;
}

export type HeaderFacts = Map<HeaderKey, HeaderEntry[]>;

/** Parts of a header that speak of markers, limits and the like, not of the sweep. */
const OTHER_SECTION =
  /marker|limit|mask|correction|transducer|gate|trigger|\bgps\b|gnss|channel power/i;

/** Longer lines are data of some kind, no settings. */
const MAX_LINE = 4000;

function cellsOf(text: string, delimiter: string): string[] {
  const own = delimiter === WHITESPACE ? [text] : splitRow(text, delimiter);
  if (own.length > 1) return own;
  for (const other of ["\t", ";", ","]) {
    const cells = splitRow(text, other);
    if (cells.length > 1) return cells;
  }
  return own;
}

/** "RBW 120 kHz" or "FREQ UNIT Hz": the longest run of leading words that names a setting. */
function splitWords(text: string): HeaderEntry["values"] | null {
  const words = text.split(/\s+/);
  for (let size = Math.min(4, words.length - 1); size >= 1; size -= 1) {
    const name = words.slice(0, size).join(" ");
    if (headerKeyOf(name) !== null) return [name, words.slice(size).join(" ")];
  }
  return null;
}

function entriesOf(cells: string[], line: number): HeaderEntry[] {
  return cells.flatMap((cell, i) => {
    const rest = cells.slice(i + 1);
    if (headerKeyOf(cell) !== null && rest.some((value) => value !== ""))
      return [{ name: cell, values: rest, line }];
    const pair = /^[(\s]*(?:.*\()?([^:=()]{1,40}(?:\([^)]*\))?)\s*[:=]\s*(.*?)\)?$/.exec(cell);
    if (pair && headerKeyOf(pair[1] ?? "") !== null) {
      const value = pair[2] ?? "";
      return [{ name: pair[1] ?? "", values: value === "" ? rest : [value, ...rest], line }];
    }
    const words = splitWords(cell);
    return words ? [{ name: words[0] ?? "", values: [words[1] ?? "", ...rest], line }] : [];
  });
}

/** Settings that the lines around a table state, by whatever separators they are written with. */
export function readHeader(
  lines: { line: number; text: string }[],
  delimiter: string,
): HeaderFacts {
  const facts: HeaderFacts = new Map();
  let isOther = false;
  for (const { line, text } of lines) {
    if (text.length > MAX_LINE) continue;
    const section = /^\s*(?:\[([^\]]+)\]|#\s*(?:begin|end)\s+(.*))\s*$/i.exec(
      trimCells(text.split(/[,;\t]/)).join(" "),
    );
    if (section) {
      isOther = OTHER_SECTION.test(section[1] ?? section[2] ?? "");
      continue;
    }
    const plain = withoutComment(text);
    if (isOther || plain === "") continue;
    for (const entry of entriesOf(cellsOf(plain, delimiter), line)) {
      const key = headerKeyOf(entry.name);
      if (key !== null) facts.set(key, [...(facts.get(key) ?? []), entry]);
    }
  }
  return facts;
}
