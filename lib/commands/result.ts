/** The closed set of reasons a command can refuse; unknown errors are thrown, not listed. */
export const ERROR_CODES = ["denied", "invalid", "not-found", "conflict"] as const;
export type ErrorCode = (typeof ERROR_CODES)[number];

export type FieldErrors = Record<string, string>;

export type Result<T> =
  { ok: true; data: T } | { ok: false; code: ErrorCode; message: string; fieldErrors: FieldErrors };

/** Thrown inside a command; ends its transaction and becomes a Result at the edge. */
export class CommandError extends Error {
  constructor(
    readonly code: ErrorCode,
    message: string,
    readonly fieldErrors: FieldErrors = {},
  ) {
    super(message);
    this.name = "CommandError";
  }
}
