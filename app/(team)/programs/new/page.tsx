import type { Metadata } from "next";
import { ProgramForm } from "@/components/programs/program-form";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { addProgram } from "../actions";

export const metadata: Metadata = { title: "New program" };

export default async function NewProgramPage() {
  const ctx = await currentContext();
  return (
    <>
      <PageHead
        title="New program"
        trail={[{ href: "/programs", label: "Programs" }]}
        lead="Its masks and milestones come next, under Edit."
      />
      {isAllowed(ctx, "program.write") ? (
        <ProgramForm action={addProgram} />
      ) : (
        <p>Your role in this team may read programs, not create them.</p>
      )}
    </>
  );
}
