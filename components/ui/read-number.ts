/** A number as people type it, with a decimal point or comma; NaN when it is none. */
export function readNumber(text: FormDataEntryValue | null): number {
  const typed = String(text ?? "")
    .trim()
    .replace("−", "-")
    .replace(",", ".");
  return typed === "" ? Number.NaN : Number(typed);
}
