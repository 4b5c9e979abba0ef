import { createHash } from "node:crypto";
import { defineRoute } from "@/lib/adapters/define-route";
import { problem } from "@/lib/adapters/problem";
import { parseInput } from "@/lib/commands/run";
import { readTraceView } from "@/lib/queries/sweep/read-trace-view";
import { traceViewSchema } from "@/lib/queries/sweep/schemas";

interface Params {
  sweepId: string;
  position: string;
}

/** A part of a trace, decimated without losing a maximum. A sweep never changes, so this neither. */
export const GET = defineRoute<Params>(async (ctx, request, { sweepId, position }) => {
  const query = Object.fromEntries(new URL(request.url).searchParams);
  const view = parseInput(traceViewSchema, { ...query, position });
  const found = await readTraceView(ctx, sweepId, view.position, view);
  if (!found) return problem("not-found", "Your team has no such trace.");
  const body = JSON.stringify(found);
  const etag = `"${createHash("sha256").update(body).digest("base64url").slice(0, 22)}"`;
  const headers = { etag, "cache-control": "private, max-age=31536000, immutable", vary: "cookie" };
  if (request.headers.get("if-none-match") === etag) {
    return new Response(null, { status: 304, headers });
  }
  return new Response(body, { headers: { ...headers, "content-type": "application/json" } });
});
