import Link from "next/link";
import type { ReactNode } from "react";
import { keepUnits } from "./keep-units";

interface PageHeadProps {
  title: string;
  /** Where this page lies: from the outermost to the parent. */
  trail?: { href: string; label: string }[];
  lead?: ReactNode;
  actions?: ReactNode;
}

/** Trail, title, one line of lead and the page's actions on the right. */
export function PageHead({ title, trail = [], lead, actions }: PageHeadProps) {
  return (
    <header className="mb-6">
      {trail.length > 0 ? (
        <nav aria-label="Where this lies" className="mb-1 text-sm">
          {trail.map(({ href, label }) => (
            <span key={href}>
              <Link href={href} className="text-deep underline">
                {keepUnits(label)}
              </Link>
              <span aria-hidden className="px-1.5 text-ink-soft">
                /
              </span>
            </span>
          ))}
        </nav>
      ) : null}
      <div className="flex flex-wrap items-start gap-x-6 gap-y-3">
        <div className="min-w-0 flex-[1_1_20rem]">
          <h1 className="text-3xl break-words">{keepUnits(title)}</h1>
          {lead ? <p className="mt-1 text-ink-soft">{lead}</p> : null}
        </div>
        {actions ? <div className="flex flex-wrap gap-2 print:hidden">{actions}</div> : null}
      </div>
    </header>
  );
}
