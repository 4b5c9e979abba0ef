/** A name that no earlier run on the same data has used. */
export function uniqueName(word: string): string {
  return `${word} ${Date.now().toString(36).slice(-6)}`;
}
