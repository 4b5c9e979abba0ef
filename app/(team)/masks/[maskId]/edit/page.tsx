import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { CopyMaskButton } from "@/components/masks/mask-actions";
import { MaskEditor } from "@/components/masks/mask-editor";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { readMask } from "@/lib/queries/mask/read-mask";
import { duplicateMask, foreseeRevision, saveMask } from "../../actions";

export const metadata: Metadata = { title: "Edit mask" };

export default async function EditMaskPage(props: { params: Promise<{ maskId: string }> }) {
  const { maskId } = await props.params;
  const ctx = await currentContext();
  const found = await readMask(ctx, maskId);
  // The newest, in force or not: what is saved next is based on it.
  const current = found?.revisions[0];
  if (!found || !current) notFound();
  return (
    <>
      <PageHead
        title="Edit mask"
        trail={[
          { href: "/masks", label: "Masks" },
          { href: `/masks/${found.id}`, label: current.content.title },
        ]}
      />
      {!isAllowed(ctx, "mask.write") ? (
        <p>Your role in this team may read masks, not change them.</p>
      ) : found.origin === "shipped" ? (
        <>
          <p className="mb-4">
            Masks shipped with Neap are never edited. Copy it first, and edit the copy.
          </p>
          <CopyMaskButton maskId={found.id} copy={duplicateMask} />
        </>
      ) : found.archivedAt !== null ? (
        <p>This mask is archived: restore it before changing it.</p>
      ) : (
        <MaskEditor
          save={saveMask}
          foresee={foreseeRevision}
          edited={{ maskId: found.id, revision: current.revision, mask: current.content }}
        />
      )}
    </>
  );
}
