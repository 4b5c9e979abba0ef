import Link from "next/link";
import { DOUBT_LABELS } from "@/components/readings/doubt-labels";
import type { DoubtCode } from "@/lib/core/reading/reading";

interface DoubtFilterProps {
  /** Address of the page without a filter. */
  href: string;
  counts: { code: DoubtCode; sweeps: number }[];
  chosen: DoubtCode | null;
  total: number;
}

const CHOICE =
  "inline-flex min-h-9 items-center gap-2 border border-rule bg-sheet px-3 py-1 no-underline hover:border-deep aria-[current=true]:border-deep aria-[current=true]:bg-water-1";

/** Which doubt the sweeps of a list have; it asks by the address, so that it can be linked to. */
export function DoubtFilter({ href, counts, chosen, total }: DoubtFilterProps) {
  if (counts.length === 0 && chosen === null) return null;
  return (
    <nav
      aria-label="Sweeps with doubt"
      className="mb-4 flex flex-wrap items-baseline gap-2 print:hidden"
    >
      <span className="mr-1 text-ink-soft">With doubt:</span>
      <Link
        href={href}
        scroll={false}
        aria-current={chosen === null ? "true" : undefined}
        className={CHOICE}
      >
        Any or none <span className="font-mono text-ink-soft">{total}</span>
      </Link>
      {counts.map(({ code, sweeps }) => (
        <Link
          key={code}
          href={`${href}?doubt=${code}`}
          scroll={false}
          aria-current={code === chosen ? "true" : undefined}
          className={CHOICE}
        >
          {DOUBT_LABELS[code]} <span className="font-mono text-ink-soft">{sweeps}</span>
        </Link>
      ))}
    </nav>
  );
}
