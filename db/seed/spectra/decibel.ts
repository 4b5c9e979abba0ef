/** Power ratio of a level in dB. */
export function fromDb(db: number): number {
  return 10 ** (db / 10);
}
