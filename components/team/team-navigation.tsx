"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";

/** The pages of the team's administration, side by side. */
export function TeamNavigation({ items }: { items: { href: string; label: string }[] }) {
  const path = usePathname();
  return (
    <nav aria-label="Team pages" className="mb-6 flex gap-x-5 border-b border-rule print:hidden">
      {items.map(({ href, label }) => (
        <Link
          key={href}
          href={href}
          aria-current={path === href ? "page" : undefined}
          className="-mb-px py-1 text-ink-soft aria-[current=page]:border-b-2 aria-[current=page]:border-deep aria-[current=page]:text-ink"
        >
          {label}
        </Link>
      ))}
    </nav>
  );
}
