import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { CheckForm } from "@/components/bench-checks/check-form";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listBenchChecks } from "@/lib/queries/bench-check/list-bench-checks";
import { previewCheckFile, storeCheck } from "../actions";

export const metadata: Metadata = { title: "Record a bench check" };

export default async function NewBenchCheckPage(props: { params: Promise<{ benchId: string }> }) {
  const { benchId } = await props.params;
  const ctx = await currentContext();
  const found = await listBenchChecks(ctx, benchId);
  if (!found) notFound();
  const { bench, checks, today } = found;
  const references = checks.filter((check) => check.isReference && !check.archived);
  const sources = [...new Map(references.map((c) => [c.source.toLowerCase(), c.source])).values()];
  return (
    <>
      <PageHead
        title="Record a bench check"
        trail={[
          { href: "/benches", label: "Benches" },
          { href: `/benches/${bench.id}`, label: bench.name },
          { href: `/benches/${bench.id}/checks`, label: "Bench checks" },
        ]}
        lead="A sweep of a known source, held against the reference sweep of the same source."
      />
      {bench.archived ? (
        <p>This bench is archived: restore it before checking it.</p>
      ) : isAllowed(ctx, "bench.write") ? (
        <CheckForm
          benchId={bench.id}
          sources={sources}
          today={today}
          preview={previewCheckFile}
          record={storeCheck}
        />
      ) : (
        <p>Your role in this team may read bench checks, not record them.</p>
      )}
    </>
  );
}
