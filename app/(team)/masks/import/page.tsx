import type { Metadata } from "next";
import { ImportMaskForm } from "@/components/masks/import-mask-form";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { takeMaskFile } from "../actions";

export const metadata: Metadata = { title: "Import a mask" };

export default async function ImportMaskPage() {
  const ctx = await currentContext();
  return (
    <>
      <PageHead
        title="Import a mask"
        trail={[{ href: "/masks", label: "Masks" }]}
        lead="A mask file as Neap writes it, JSON or CSV, or a table with a row per segment. It becomes a mask of the team's own and keeps its provenance."
      />
      {isAllowed(ctx, "mask.write") ? (
        <ImportMaskForm action={takeMaskFile} />
      ) : (
        <p>Your role in this team may read masks, not change them.</p>
      )}
    </>
  );
}
