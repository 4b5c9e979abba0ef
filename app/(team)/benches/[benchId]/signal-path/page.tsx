import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { SignalPathEditor } from "@/components/benches/signal-path-editor";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { readBench } from "@/lib/queries/bench/read-bench";
import { readTypedTable, saveSignalPath } from "../../actions";

export const metadata: Metadata = { title: "Signal path" };

export default async function SignalPathPage(props: { params: Promise<{ benchId: string }> }) {
  const { benchId } = await props.params;
  const ctx = await currentContext();
  const bench = await readBench(ctx, benchId);
  const current = bench?.revisions[0];
  if (!bench || !current) notFound();
  return (
    <>
      <PageHead
        title="Signal path"
        trail={[
          { href: "/benches", label: "Benches" },
          { href: `/benches/${bench.id}`, label: bench.name },
        ]}
        lead="What lies between the field and the instrument, in this order."
      />
      {!isAllowed(ctx, "bench.write") ? (
        <p>Your role in this team may read benches, not change them.</p>
      ) : bench.archivedAt !== null ? (
        <p>This bench is archived: restore it before changing it.</p>
      ) : (
        <SignalPathEditor
          benchId={bench.id}
          revision={current.revision}
          path={current.content}
          save={saveSignalPath}
          readTable={readTypedTable}
        />
      )}
    </>
  );
}
