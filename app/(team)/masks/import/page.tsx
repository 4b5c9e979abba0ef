import type { Metadata } from "next";
import Link from "next/link";
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
        <p className="-mt-3 mb-5 text-ink-soft">
          A table with a column per detector is pasted into{" "}
          <Link href="/masks/new" className="text-deep underline">
            a new mask
          </Link>{" "}
          instead.
        </p>
      ) : null}
      {isAllowed(ctx, "mask.write") ? (
        <ImportMaskForm action={takeMaskFile} />
      ) : (
        <p>Your role in this team may read masks, not change them.</p>
      )}
    </>
  );
}
