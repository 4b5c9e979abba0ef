import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { FirstRunForm } from "@/components/sign-in/first-run-form";
import { hasAnyTeam } from "@/lib/queries/team/has-any-team";
import { makeFirstTeam } from "./actions";

export const metadata: Metadata = { title: "First run" };
export const dynamic = "force-dynamic";

export default async function FirstRunPage() {
  if (await hasAnyTeam()) redirect("/sign-in");
  return (
    <>
      <h1 className="mb-2 text-2xl">Set up your team</h1>
      <p className="mb-6 text-ink-soft">
        This Neap is new. You become the admin of its first team.
      </p>
      <FirstRunForm action={makeFirstTeam} />
    </>
  );
}
