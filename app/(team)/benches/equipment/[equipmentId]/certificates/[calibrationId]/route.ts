import { attachment, defineRoute } from "@/lib/adapters/define-route";
import { problem } from "@/lib/adapters/problem";
import { readCertificate } from "@/lib/queries/equipment/read-certificate";

/** The certificate of a calibration, byte for byte. */
export const GET = defineRoute<{ equipmentId: string; calibrationId: string }>(
  async (ctx, _request, { equipmentId, calibrationId }) => {
    const file = await readCertificate(ctx, equipmentId, calibrationId);
    if (!file) return problem("not-found", "Your team has no such certificate.");
    return new Response(Buffer.from(file.bytes), {
      headers: attachment(file.fileName, file.mediaType),
    });
  },
);
