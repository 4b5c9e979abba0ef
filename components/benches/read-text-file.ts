const MAX_BYTES = 1_000_000;

/** UTF-16 by its mark, else UTF-8, else the old Western code page that instruments still write. */
function decode(bytes: Uint8Array): string {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return new TextDecoder("utf-16le").decode(bytes);
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return new TextDecoder("utf-16be").decode(bytes);
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(bytes);
  } catch {
    return new TextDecoder("windows-1252").decode(bytes);
  }
}

/** Text of a file that a person chose, or why it is not taken; nothing leaves the browser. */
export async function readTextFile(
  file: Pick<File, "name" | "size" | "arrayBuffer">,
): Promise<{ ok: true; text: string } | { ok: false; message: string }> {
  if (file.size > MAX_BYTES)
    return { ok: false, message: `${file.name} is larger than 1 MB and was not read.` };
  const text = decode(new Uint8Array(await file.arrayBuffer()));
  if (text.includes("\u0000"))
    return { ok: false, message: `${file.name} is no text file; save the table as CSV.` };
  if (text.trim() === "") return { ok: false, message: `${file.name} is empty.` };
  return { ok: true, text };
}
