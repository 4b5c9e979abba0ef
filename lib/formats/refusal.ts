/** A file that cannot be read, said in a plain sentence. Caught in `read-sweep-file.ts`. */
export class Refusal extends Error {
  constructor(
    readonly reason: string,
    readonly line: number | null = null,
  ) {
    super(reason);
  }
}

/** Text of a file as it may stand in a message: one line, not endless. */
export function quote(text: string): string {
  const plain = text.replace(/\s+/g, " ").trim();
  return `"${plain.length > 40 ? `${plain.slice(0, 39)}…` : plain}"`;
}
