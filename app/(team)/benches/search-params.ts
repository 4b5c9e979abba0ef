export type SearchParams = Record<string, string | string[] | undefined>;

/** The revision that `?revision=3` asks for; null for the current one. */
export function readRevisionParam(params: SearchParams): number | null {
  const text = params["revision"];
  return typeof text === "string" && /^[1-9]\d{0,8}$/.test(text) ? Number(text) : null;
}

/** `?archived=1` shows what was put away as well. */
export function showsArchived(params: SearchParams): boolean {
  return params["archived"] === "1";
}
