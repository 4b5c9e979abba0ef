/** What a server action of a program's forms answers. */
export type Outcome<T = unknown> =
  { ok: true; data: T } | { ok: false; message: string; fieldErrors: Record<string, string> };
