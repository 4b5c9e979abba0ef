import { attachment, defineRoute } from "@/lib/adapters/define-route";
import { problem } from "@/lib/adapters/problem";
import { maskToJson } from "@/lib/core/mask/mask-json";
import { readMask } from "@/lib/queries/mask/read-mask";
import { readRevisionParam } from "../../search-params";

/** One revision of a mask as a mask file; the current one unless `?revision=` names another. */
export const GET = defineRoute<{ maskId: string }>(async (ctx, request, { maskId }) => {
  const asked = new URL(request.url).searchParams.get("revision");
  const wanted = readRevisionParam(asked);
  if (asked !== null && wanted === null) return problem("not-found", "No such revision.");
  const mask = await readMask(ctx, maskId);
  const shown =
    wanted === null ? mask?.revisions[0] : mask?.revisions.find((r) => r.revision === wanted);
  if (!mask || !shown) return problem("not-found", "Your team has no such mask.");
  return new Response(maskToJson(shown.content), {
    headers: attachment(`${mask.key}-revision-${shown.revision}.json`, "application/json"),
  });
});
