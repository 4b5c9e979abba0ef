import type { Metadata } from "next";
import Link from "next/link";
import { filterMasks } from "@/components/masks/filter-masks";
import { MaskFilterForm } from "@/components/masks/mask-filter-form";
import { MaskLibrary } from "@/components/masks/mask-library";
import { ButtonLink } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listMasks } from "@/lib/queries/mask/list-masks";
import type { SearchParams } from "./search-params";
import { masksHref, readMaskFilter } from "./search-params";

export const metadata: Metadata = { title: "Masks" };

export default async function MasksPage(props: { searchParams: Promise<SearchParams> }) {
  const filter = readMaskFilter(await props.searchParams);
  const ctx = await currentContext();
  const mayWrite = isAllowed(ctx, "mask.write");
  const all = await listMasks(ctx);
  const open = all.filter((mask) => !mask.archived);
  const archived = all.length - open.length;
  const unsure = open.filter((mask) => mask.provenance === "from memory").length;
  const isFiltered = masksHref({ ...filter, archived: false }) !== "/masks";
  const clearedHref = masksHref({
    text: "",
    port: null,
    provenance: null,
    archived: filter.archived,
  });
  const shown = filterMasks(all, filter);
  return (
    <>
      <PageHead
        title="Masks"
        lead="What must we fit under?"
        actions={
          mayWrite ? (
            <>
              <ButtonLink href="/masks/import">Import a file</ButtonLink>
              <ButtonLink look="primary" href="/masks/new">
                New mask
              </ButtonLink>
            </>
          ) : undefined
        }
      />
      {open.length > 0 ? (
        <div className="mb-6">
          <p>
            <span className="font-mono text-4xl">{open.length}</span>{" "}
            <span className="text-lg">
              {open.length === 1 ? "mask to choose from." : "masks to choose from."}
            </span>
          </p>
          {unsure > 0 ? (
            <p className="mt-1 text-shoal">
              {unsure === 1
                ? "1 is from memory: confirm it against your own copy before you lean on it."
                : `${unsure} are from memory: confirm them against your own copy before you lean on them.`}
            </p>
          ) : null}
        </div>
      ) : null}
      {all.length > 0 ? <MaskFilterForm key={masksHref(filter)} filter={filter} /> : null}
      {isFiltered && shown.length > 0 ? (
        <p role="status" className="-mb-4">
          {shown.length} of {filter.archived ? all.length : open.length} match.{" "}
          <Link href={clearedHref} className="text-deep underline">
            Clear the filters
          </Link>
        </p>
      ) : null}
      {shown.length > 0 ? (
        <MaskLibrary masks={shown} />
      ) : (
        <EmptyState>
          {all.length === 0 ? (
            `No masks yet. ${
              mayWrite
                ? "Type the first one as a table, or import a mask file."
                : "An engineer of your team makes them."
            }`
          ) : (
            <>
              {isFiltered ? "No mask matches. " : "Every mask is archived."}
              {isFiltered ? (
                <Link href={clearedHref} className="text-deep underline">
                  Clear the filters
                </Link>
              ) : null}
            </>
          )}
        </EmptyState>
      )}
      {archived > 0 ? (
        <p className="mt-6 text-sm">
          <Link
            href={masksHref({ ...filter, archived: !filter.archived })}
            className="text-deep underline"
          >
            {filter.archived ? "Hide archived masks" : `Show archived masks (${archived})`}
          </Link>
        </p>
      ) : null}
    </>
  );
}
