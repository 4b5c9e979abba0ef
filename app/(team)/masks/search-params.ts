import type { MaskFilter } from "@/components/masks/filter-masks";
import { PROVENANCES } from "@/lib/core/mask/mask";
import { PORTS } from "@/lib/core/sweep/settings";

export type SearchParams = Record<string, string | string[] | undefined>;

function one(params: SearchParams, name: string): string {
  const value = params[name];
  return typeof value === "string" ? value : "";
}

/** The library's filter as it stands in the address; what is not understood filters nothing. */
export function readMaskFilter(params: SearchParams): MaskFilter {
  return {
    port: PORTS.find((port) => port === one(params, "port")) ?? null,
    text: one(params, "text").trim().slice(0, 200),
    provenance: PROVENANCES.find((p) => p === one(params, "provenance")) ?? null,
    archived: one(params, "archived") === "1",
  };
}

/** The library's address with a filter. */
export function masksHref(filter: MaskFilter): string {
  const params = new URLSearchParams();
  if (filter.text) params.set("text", filter.text);
  if (filter.port) params.set("port", filter.port);
  if (filter.provenance) params.set("provenance", filter.provenance);
  if (filter.archived) params.set("archived", "1");
  const query = params.toString();
  return query ? `/masks?${query}` : "/masks";
}

/** The revision that `?revision=3` asks for; null for the current one. */
export function readRevisionParam(text: string | string[] | null | undefined): number | null {
  return typeof text === "string" && /^[1-9]\d{0,8}$/.test(text) ? Number(text) : null;
}

/** The revision of a mask that a request's `?revision=` names, or the one in force. */
export function revisionAsked<R extends { revision: number }>(
  request: Request,
  mask: { current: R; revisions: R[] },
): R | undefined {
  const asked = new URL(request.url).searchParams.get("revision");
  if (asked === null) return mask.current;
  const wanted = readRevisionParam(asked);
  return mask.revisions.find(({ revision }) => revision === wanted);
}
