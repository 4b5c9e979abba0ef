/** What a server action of a suspect answers. */
export type Outcome =
  | { ok: true; data: { suspectId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

/** A server action behind one button. */
export type Act = () => Promise<{ ok: true } | { ok: false; message: string }>;
