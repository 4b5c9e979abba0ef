import { randomUUID } from "node:crypto";
import { unstable_rethrow } from "next/navigation";
import type { Context } from "@/lib/auth/context";
import { findCurrentMember } from "@/lib/auth/session";
import { CommandError } from "@/lib/commands/result";
import { problem } from "./problem";

/** Body of a route handler: builds the context, calls one command or query, maps what it throws. */
export function defineRoute<P>(
  answer: (ctx: Context, request: Request, params: P) => Promise<Response>,
): (request: Request, props: { params: Promise<P> }) => Promise<Response> {
  return async (request, { params }) => {
    try {
      const found = await findCurrentMember();
      if (!found) return problem("signed-out", "Sign in first.");
      return await answer(found.ctx, request, await params);
    } catch (error) {
      unstable_rethrow(error);
      if (error instanceof CommandError) {
        return problem(error.code, error.message, error.fieldErrors);
      }
      const id = randomUUID().slice(0, 8);
      console.error(`[${id}]`, error);
      return problem(
        "broken",
        `Something went wrong on our side. Mention ${id} when you report it.`,
      );
    }
  };
}

/** Headers that hand a file over under its own name (RFC 6266), never to be run in the page. */
export function attachment(fileName: string, mediaType: string): Record<string, string> {
  const plain = fileName.replace(/[^\x20-\x7e]|["\\]/g, "_");
  // encodeURIComponent leaves these, and RFC 8187 has the apostrophe as a mark of its own.
  const coded = encodeURIComponent(fileName).replace(
    /['()*]/g,
    (mark) => `%${mark.charCodeAt(0).toString(16).toUpperCase()}`,
  );
  return {
    "content-type": mediaType,
    "content-disposition": `attachment; filename="${plain}"; filename*=UTF-8''${coded}`,
    "x-content-type-options": "nosniff",
    "cache-control": "private, no-store",
  };
}
