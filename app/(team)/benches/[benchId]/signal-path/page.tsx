import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { pathWithNewest } from "@/components/benches/fill-from-equipment";
import { SignalPathEditor } from "@/components/benches/signal-path-editor";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { readBench } from "@/lib/queries/bench/read-bench";
import { listEquipmentChoices } from "@/lib/queries/equipment/list-equipment-choices";
import { readTypedTable, saveSignalPath } from "../../actions";
import type { SearchParams } from "../../search-params";

export const metadata: Metadata = { title: "Signal path" };

interface SignalPathPageProps {
  params: Promise<{ benchId: string }>;
  searchParams: Promise<SearchParams>;
}

export default async function SignalPathPage(props: SignalPathPageProps) {
  const { benchId } = await props.params;
  const { newest } = await props.searchParams;
  const ctx = await currentContext();
  const bench = await readBench(ctx, benchId);
  const current = bench?.revisions[0];
  if (!bench || !current) notFound();
  const equipment = await listEquipmentChoices(ctx);
  const { path, changes } =
    newest === "1"
      ? pathWithNewest(current.content, equipment)
      : { path: current.content, changes: [] };
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
        <>
          {changes.length > 0 ? (
            <div
              role="status"
              className="mb-4 border border-l-4 border-rule border-l-deep bg-sheet px-3 py-2"
            >
              <p>Filled in from the newest calibrations; nothing is saved yet.</p>
              <ul className="list-disc pl-5">
                {changes.map((change) => (
                  <li key={change}>{change}</li>
                ))}
              </ul>
            </div>
          ) : null}
          <SignalPathEditor
            benchId={bench.id}
            revision={current.revision}
            path={path}
            equipment={equipment}
            save={saveSignalPath}
            readTable={readTypedTable}
          />
        </>
      )}
    </>
  );
}
