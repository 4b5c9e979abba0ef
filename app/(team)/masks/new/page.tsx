import type { Metadata } from "next";
import { MaskEditor } from "@/components/masks/mask-editor";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { addMask } from "../actions";

export const metadata: Metadata = { title: "New mask" };

export default async function NewMaskPage() {
  const ctx = await currentContext();
  return (
    <>
      <PageHead
        title="New mask"
        trail={[{ href: "/masks", label: "Masks" }]}
        lead="Limit lines made of segments. Where segments meet the lower limit applies; between them there is none."
      />
      {isAllowed(ctx, "mask.write") ? (
        <MaskEditor save={addMask} />
      ) : (
        <p>Your role in this team may read masks, not change them.</p>
      )}
    </>
  );
}
