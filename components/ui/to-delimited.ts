/** Rows as text for the clipboard or a file; what would break a row is quoted. */
export function toDelimited(rows: (string | number | null)[][], by: string): string {
  const quote = (value: string | number | null) => {
    const text = value === null ? "" : String(value);
    // A spreadsheet would run a text that starts like a formula.
    const safe = typeof value === "string" && /^[=+\-@\t\r]/.test(text) ? `'${text}` : text;
    return /["\r\n]/.test(safe) || safe.includes(by) ? `"${safe.replaceAll('"', '""')}"` : safe;
  };
  return rows.map((row) => row.map(quote).join(by)).join("\r\n");
}
