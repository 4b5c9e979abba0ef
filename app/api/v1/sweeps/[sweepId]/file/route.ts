import { attachment, defineRoute } from "@/lib/adapters/define-route";
import { problem } from "@/lib/adapters/problem";
import { readOriginalFile } from "@/lib/queries/sweep/read-original-file";

/** The original file of a sweep, byte for byte. */
export const GET = defineRoute<{ sweepId: string }>(async (ctx, _request, { sweepId }) => {
  const file = await readOriginalFile(ctx, sweepId);
  if (!file) return problem("not-found", "Your team has no such sweep.");
  return new Response(Buffer.from(file.bytes), {
    headers: attachment(file.fileName, file.mediaType),
  });
});
