import { defineRoute } from "@/lib/adapters/define-route";
import { problem } from "@/lib/adapters/problem";
import { readRecomputation } from "@/lib/queries/mask/read-recomputation";

/** How far the newest revision of a mask is on its way into force. */
export const GET = defineRoute<{ maskId: string }>(async (ctx, _request, { maskId }) => {
  const found = await readRecomputation(ctx, maskId);
  if (!found) return problem("not-found", "Your team has no such mask.");
  return Response.json(found, { headers: { "cache-control": "no-store" } });
});
