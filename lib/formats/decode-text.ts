import { Refusal } from "./refusal";

export interface DecodedText {
  text: string;
  encoding: string;
  warnings: string[];
}

const MAX_BYTES = 64 * 1024 * 1024;
/** Control characters that no text export holds; NUL, tab, line ends and page feeds do occur. */
const CONTROL = /[\u0001-\u0008\u000e-\u001f\u007f]/;
const LOOK_BYTES = 4096;

/** UTF-16 shows by its byte order mark, or by a NUL in nearly every second byte. */
function utf16Kind(bytes: Uint8Array): "utf-16le" | "utf-16be" | null {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return "utf-16le";
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return "utf-16be";
  const pairs = Math.floor(Math.min(bytes.length, LOOK_BYTES) / 2);
  let evenNuls = 0;
  let oddNuls = 0;
  for (let i = 0; i < pairs; i += 1) {
    if (bytes[2 * i] === 0) evenNuls += 1;
    if (bytes[2 * i + 1] === 0) oddNuls += 1;
  }
  if (pairs < 4) return null;
  if (oddNuls > 0.9 * pairs && evenNuls < 0.1 * pairs) return "utf-16le";
  if (evenNuls > 0.9 * pairs && oddNuls < 0.1 * pairs) return "utf-16be";
  return null;
}

function decodeBytes(bytes: Uint8Array): { text: string; encoding: string } {
  const wide = utf16Kind(bytes);
  if (wide !== null) {
    const text = new TextDecoder(wide).decode(bytes);
    return { text, encoding: wide === "utf-16le" ? "UTF-16 LE" : "UTF-16 BE" };
  }
  try {
    const text = new TextDecoder("utf-8", { fatal: true }).decode(bytes);
    return { text, encoding: text.length === bytes.length ? "ASCII" : "UTF-8" };
  } catch {
    return { text: new TextDecoder("windows-1252").decode(bytes), encoding: "Windows-1252" };
  }
}

/** An instrument's block prefix: "#", a digit n, then n digits of length, glued to the text. */
function withoutBlockPrefix(text: string): string {
  const digits = Number(/^#([1-9])\d/.exec(text)?.[1] ?? 0);
  const prefix = digits > 0 && /^\d+$/.test(text.slice(2, 2 + digits)) ? 2 + digits : 0;
  const declared = Number(text.slice(2, prefix));
  return prefix > 0 && declared > 0 && declared <= text.length + 2 ? text.slice(prefix) : text;
}

/** Bytes of a text export as text; refuses what is no text. */
export function decodeText(bytes: Uint8Array): DecodedText {
  if (bytes.length > MAX_BYTES)
    throw new Refusal(
      `The file is ${Math.ceil(bytes.length / 2 ** 20)} MB; up to 64 MB are read. Export fewer traces or points.`,
    );
  const { text: decoded, encoding } = decodeBytes(bytes);
  const warnings: string[] = [];
  let text = decoded;
  if (text.includes("\0")) {
    const plain = text.replaceAll("\0", "");
    warnings.push(`${text.length - plain.length} NUL characters were taken out.`);
    text = plain;
  }
  text = text.replace(/\u001a\s*$/, "");
  const control = CONTROL.exec(text);
  if (control !== null) {
    const line = text.slice(0, control.index).split(/\r\n|\r|\n/).length;
    throw new Refusal(
      `This is no text file: line ${line} holds a control character. Export the trace as text or CSV.`,
      line,
    );
  }
  if (text.trim() === "") throw new Refusal("The file is empty. Export the trace again.");
  return { text: withoutBlockPrefix(text), encoding, warnings };
}
