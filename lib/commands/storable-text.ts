import { z } from "zod";

/**
 * PostgreSQL takes neither the null character nor half a surrogate pair; both reach a form by
 * pasting from a damaged file and would otherwise end as an unknown error.
 */
export function isStorableText(text: string): boolean {
  return !text.includes("\u0000") && !/\p{Cs}/u.test(text);
}

export const NOT_STORABLE = "This holds a character that cannot be stored; type it again.";

/** Text of a form. */
export const storable = z.string().refine(isStorableText, NOT_STORABLE);
