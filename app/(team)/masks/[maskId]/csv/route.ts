import { attachment, defineRoute } from "@/lib/adapters/define-route";
import { problem } from "@/lib/adapters/problem";
import { maskToCsv } from "@/lib/formats/mask-csv";
import { readMask } from "@/lib/queries/mask/read-mask";
import { revisionAsked } from "../../search-params";

/** One revision of a mask as CSV; the one in force unless `?revision=` names another. */
export const GET = defineRoute<{ maskId: string }>(async (ctx, request, { maskId }) => {
  const mask = await readMask(ctx, maskId);
  if (!mask) return problem("not-found", "Your team has no such mask.");
  const shown = revisionAsked(request, mask);
  if (!shown) return problem("not-found", "No such revision.");
  // Spreadsheets take the µ of a unit for two letters unless a byte order mark says UTF-8.
  return new Response(`\uFEFF${maskToCsv(shown.content)}`, {
    headers: attachment(`${mask.key}-revision-${shown.revision}.csv`, "text/csv; charset=utf-8"),
  });
});
