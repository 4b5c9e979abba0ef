import type { ErrorCode } from "@/lib/commands/result";

const STATUS: Record<ErrorCode | "signed-out" | "broken", number> = {
  denied: 403,
  invalid: 422,
  "not-found": 404,
  conflict: 409,
  "signed-out": 401,
  broken: 500,
};

/** An error as `application/problem+json` (RFC 9457). */
export function problem(
  code: keyof typeof STATUS,
  detail: string,
  fieldErrors: Record<string, string> = {},
): Response {
  const status = STATUS[code];
  return new Response(JSON.stringify({ type: "about:blank", status, code, detail, fieldErrors }), {
    status,
    headers: { "content-type": "application/problem+json", "cache-control": "no-store" },
  });
}
