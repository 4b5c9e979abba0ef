import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { EditLadderForm } from "@/components/ladders/edit-ladder-form";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { readLadder } from "@/lib/queries/ladder/read-ladder";
import { changeLadder } from "../../actions";

export const metadata: Metadata = { title: "Edit ladder" };

export default async function EditLadderPage(props: { params: Promise<{ ladderId: string }> }) {
  const { ladderId } = await props.params;
  const ctx = await currentContext();
  const ladder = await readLadder(ctx, ladderId);
  if (!ladder) notFound();
  return (
    <>
      <PageHead
        title={`Edit ${ladder.name}`}
        trail={[{ href: `/ladders/${ladder.id}`, label: ladder.name }]}
      />
      {isAllowed(ctx, "sweep.write") ? (
        <EditLadderForm ladder={ladder} action={changeLadder} />
      ) : (
        <p>Your role in this team may read ladders, not change them.</p>
      )}
    </>
  );
}
