import { attachment, defineRoute } from "@/lib/adapters/define-route";
import { problem } from "@/lib/adapters/problem";
import { readCheckFile } from "@/lib/queries/bench-check/read-check-file";

/** The original file of a bench check, byte for byte. */
export const GET = defineRoute<{ checkId: string }>(async (ctx, _request, { checkId }) => {
  const file = await readCheckFile(ctx, checkId);
  if (!file) return problem("not-found", "Your team has no such bench check.");
  return new Response(Buffer.from(file.bytes), {
    headers: attachment(file.fileName, file.mediaType),
  });
});
