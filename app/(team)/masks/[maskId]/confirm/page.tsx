import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { ConfirmMaskForm } from "@/components/masks/confirm-mask-form";
import { CopyMaskButton } from "@/components/masks/mask-actions";
import { PORT_LABELS, sourceWords } from "@/components/masks/mask-words";
import { ProvenanceMark } from "@/components/masks/provenance-mark";
import { Facts } from "@/components/ui/facts";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import { readMask } from "@/lib/queries/mask/read-mask";
import { confirmLimits, duplicateMask } from "../../actions";

export const metadata: Metadata = { title: "Confirm mask" };

export default async function ConfirmMaskPage(props: { params: Promise<{ maskId: string }> }) {
  const { maskId } = await props.params;
  const ctx = await currentContext();
  const found = await readMask(ctx, maskId);
  if (!found) notFound();
  const { content: mask, revision, confirmation } = found.current;
  return (
    <>
      <PageHead
        title="Confirm mask"
        trail={[
          { href: "/masks", label: "Masks" },
          { href: `/masks/${found.id}`, label: mask.title },
        ]}
        lead="Lay your own copy of the document beside this page and tick off what agrees."
      />
      {!isAllowed(ctx, "mask.write") ? (
        <p>Your role in this team may read masks, not confirm them.</p>
      ) : found.archivedAt !== null ? (
        <p>This mask is archived: restore it before confirming it.</p>
      ) : found.pending ? (
        <p>
          Revision {found.pending.revision} is still being put in force. Confirm it once that is
          done.
        </p>
      ) : (
        <>
          <div className="mb-6">
            <Facts
              items={[
                { label: "Mask", value: mask.title },
                { label: "Document", value: sourceWords(mask) },
                { label: "Port", value: PORT_LABELS[mask.port] },
                { label: "Unit", value: LEVEL_UNIT_LABELS[mask.unit] },
                {
                  label: "Distance",
                  value: mask.distanceM === null ? null : `${mask.distanceM} m`,
                  mono: true,
                },
                {
                  label: "Provenance",
                  value: (
                    <ProvenanceMark provenance={mask.provenance} confirmation={confirmation} />
                  ),
                },
              ]}
            />
          </div>
          <div className="mb-6 flex max-w-3xl flex-wrap items-center gap-x-4 gap-y-2 border border-rule bg-sheet px-3 py-2">
            <p className="min-w-60 flex-1">
              Does anything differ from your copy?{" "}
              {found.origin === "shipped"
                ? "Then do not confirm it: copy the mask, and put the copy right."
                : "Then do not confirm it: edit the mask, or copy it and put the copy right."}
            </p>
            <CopyMaskButton maskId={found.id} copy={duplicateMask} />
          </div>
          <ConfirmMaskForm
            maskId={found.id}
            revision={revision}
            mask={mask}
            confirm={confirmLimits}
          />
        </>
      )}
    </>
  );
}
