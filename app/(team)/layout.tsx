import Link from "next/link";
import type { ReactNode } from "react";
import { Deferral } from "@/components/shell/deferral";
import { QueryProvider } from "@/components/shell/query-provider";
import { MainNavigation } from "@/components/shell/main-navigation";
import { SignOutButton } from "@/components/shell/sign-out-button";
import { isAllowed } from "@/lib/auth/context";
import { currentMember } from "@/lib/auth/session";

export const dynamic = "force-dynamic";

export default async function TeamLayout({ children }: { children: ReactNode }) {
  const { member, ctx } = await currentMember();
  const items = [
    { href: "/", label: "Overview" },
    { href: "/programs", label: "Programs" },
    { href: "/suspects", label: "Suspects" },
    { href: "/reports", label: "Reports" },
    { href: "/masks", label: "Masks" },
    { href: "/benches", label: "Benches" },
    ...(isAllowed(ctx, "people.read") ? [{ href: "/team", label: "Team" }] : []),
  ];
  return (
    <div className="mx-auto flex min-h-screen max-w-6xl flex-col px-4 sm:px-8">
      <a
        href="#content"
        className="sr-only focus:not-sr-only focus:absolute focus:m-2 focus:bg-sheet focus:p-2"
      >
        Skip to the content
      </a>
      <header className="flex flex-wrap items-baseline gap-x-8 gap-y-2 border-b border-rule py-4">
        <span className="font-title text-2xl text-deep">Neap</span>
        <MainNavigation items={items} />
        <span className="ml-auto text-sm text-ink-soft">
          <Link href="/account" className="text-deep underline">
            {member.name}
          </Link>{" "}
          ({member.role}) · {member.teamName}
        </span>
        <SignOutButton />
      </header>
      <main id="content" className="grow py-8">
        <QueryProvider>{children}</QueryProvider>
      </main>
      <Deferral />
      <div className="h-6" />
    </div>
  );
}
