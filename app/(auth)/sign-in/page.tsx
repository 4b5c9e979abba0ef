import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { SignInForm } from "@/components/sign-in/sign-in-form";
import { hasAnyTeam } from "@/lib/queries/team/has-any-team";

export const metadata: Metadata = { title: "Sign in" };
export const dynamic = "force-dynamic";

export default async function SignInPage() {
  if (!(await hasAnyTeam())) redirect("/first-run");
  return (
    <>
      <h1 className="mb-6 text-2xl">Sign in</h1>
      <SignInForm />
    </>
  );
}
