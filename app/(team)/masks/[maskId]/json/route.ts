import { attachment, defineRoute } from "@/lib/adapters/define-route";
import { problem } from "@/lib/adapters/problem";
import { maskToJson } from "@/lib/core/mask/mask-json";
import { readMask } from "@/lib/queries/mask/read-mask";
import { revisionAsked } from "../../search-params";

/** One revision of a mask as a mask file; the one in force unless `?revision=` names another. */
export const GET = defineRoute<{ maskId: string }>(async (ctx, request, { maskId }) => {
  const mask = await readMask(ctx, maskId);
  if (!mask) return problem("not-found", "Your team has no such mask.");
  const shown = revisionAsked(request, mask);
  if (!shown) return problem("not-found", "No such revision.");
  return new Response(maskToJson(shown.content), {
    headers: attachment(`${mask.key}-revision-${shown.revision}.json`, "application/json"),
  });
});
