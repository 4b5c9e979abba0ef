import type { ReactNode } from "react";
import { TeamNavigation } from "@/components/team/team-navigation";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";

export default async function TeamPagesLayout({ children }: { children: ReactNode }) {
  const ctx = await currentContext();
  const items = [
    ...(isAllowed(ctx, "people.read") ? [{ href: "/team", label: "People" }] : []),
    ...(isAllowed(ctx, "audit.read") ? [{ href: "/team/audit", label: "Audit trail" }] : []),
  ];
  return (
    <>
      {items.length > 0 ? <TeamNavigation items={items} /> : null}
      {children}
    </>
  );
}
