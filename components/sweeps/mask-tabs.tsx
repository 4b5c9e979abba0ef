import Link from "next/link";
import { StandingShape } from "@/components/charts/standing-shape";
import type { Standing } from "@/lib/core/reading/reading";
import { formatMargin } from "@/lib/core/units/format";

interface MaskTabsProps {
  sweepId: string;
  items: {
    maskId: string;
    title: string;
    standing: Standing;
    marginDb: number | null;
    notComparable: boolean;
  }[];
  chosen: string;
}

/** The masks that the sweep is held against; one is looked at. */
export function MaskTabs({ sweepId, items, chosen }: MaskTabsProps) {
  return (
    <nav aria-label="Masks" className="mb-4 flex flex-wrap gap-2 print:hidden">
      {items.map((item) => (
        <Link
          key={item.maskId}
          href={`/sweeps/${sweepId}?mask=${item.maskId}`}
          scroll={false}
          aria-current={item.maskId === chosen ? "page" : undefined}
          className="inline-flex items-center gap-2 border border-rule bg-sheet px-3 py-1.5 no-underline hover:border-deep aria-[current=page]:border-deep aria-[current=page]:bg-water-1"
        >
          {item.marginDb === null ? null : <StandingShape standing={item.standing} />}
          <span>{item.title}</span>
          <span className="font-mono text-ink-soft">
            {item.notComparable
              ? "not comparable"
              : item.marginDb === null
                ? "not swept"
                : formatMargin(item.marginDb)}
          </span>
        </Link>
      ))}
    </nav>
  );
}
