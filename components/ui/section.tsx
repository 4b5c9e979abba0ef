import type { ReactNode } from "react";
import { useId } from "react";

interface SectionProps {
  title: string;
  lead?: ReactNode;
  actions?: ReactNode;
  children: ReactNode;
}

/** A titled part of a page. */
export function Section({ title, lead, actions, children }: SectionProps) {
  const id = useId();
  return (
    <section aria-labelledby={id} className="mt-10">
      <div className="mb-3 flex flex-wrap items-baseline gap-x-6 gap-y-2">
        <h2 id={id} className="text-xl">
          {title}
        </h2>
        {actions ? (
          <div className="ml-auto flex flex-wrap gap-2 print:hidden">{actions}</div>
        ) : null}
      </div>
      {lead ? <p className="-mt-2 mb-3 text-ink-soft">{lead}</p> : null}
      {children}
    </section>
  );
}
