import { attachment, defineRoute } from "@/lib/adapters/define-route";
import { problem } from "@/lib/adapters/problem";
import { readReportPdf } from "@/lib/queries/report/read-report-pdf";

/** The PDF of an issued report as it stands now. */
export const GET = defineRoute<{ reportId: string }>(async (ctx, _request, { reportId }) => {
  const pdf = await readReportPdf(ctx, reportId);
  if (!pdf) return problem("not-found", "Your team has no such report, or it is not issued.");
  return new Response(Buffer.from(pdf.bytes), {
    headers: attachment(pdf.fileName, "application/pdf"),
  });
});
