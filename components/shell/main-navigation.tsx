"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";

export function MainNavigation({ items }: { items: { href: string; label: string }[] }) {
  const path = usePathname();
  const isHere = (href: string) => (href === "/" ? path === "/" : path.startsWith(href));
  return (
    <nav aria-label="Main" className="flex flex-wrap gap-x-5">
      {items.map(({ href, label }) => (
        <Link
          key={href}
          href={href}
          aria-current={isHere(href) ? "page" : undefined}
          className="py-1 text-ink-soft aria-[current=page]:border-b-2 aria-[current=page]:border-deep aria-[current=page]:text-ink"
        >
          {label}
        </Link>
      ))}
    </nav>
  );
}
