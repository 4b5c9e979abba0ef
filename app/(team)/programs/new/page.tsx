import type { Metadata } from "next";
import { ProgramForm } from "@/components/programs/program-form";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { addProgram } from "../actions";

export const metadata: Metadata = { title: "New program" };

export default async function NewProgramPage() {
  const ctx = await currentContext();
  return (
    <>
      <h1 className="mb-6 text-3xl">New program</h1>
      {isAllowed(ctx, "program.write") ? (
        <ProgramForm action={addProgram} />
      ) : (
        <p>Your role in this team may read programs, not create them.</p>
      )}
    </>
  );
}
