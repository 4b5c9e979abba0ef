import Link from "next/link";
import { UnconfirmedMark } from "@/components/masks/unconfirmed-mark";
import { DoubtList } from "@/components/readings/doubt-list";
import { LineTable } from "@/components/readings/line-table";
import type { Mask } from "@/lib/core/mask/mask";
import type { Reading } from "@/lib/core/reading/reading";

interface BuildReadingProps {
  /** The build's own page, without a slash at its end. */
  href: string;
  combined: {
    maskId: string;
    mask: Mask;
    reading: Omit<Reading, "suspects">;
    sweeps: { id: string; name: string }[];
    notHeld: { sweepId: string; name: string; reason: string }[];
  };
}

/** The line of record under one mask: which sweep decided each line, what is open, what weakens it. */
export function BuildReading({ href, combined }: BuildReadingProps) {
  const { maskId, mask, reading, sweeps, notHeld } = combined;
  const spots = reading.remeasure.length + reading.remeasureOmitted;
  return (
    <div className="mb-8 last:mb-0">
      <h3 className="mb-2 text-base">
        <Link href={`/masks/${maskId}`} className="text-deep underline">
          {mask.title}
        </Link>{" "}
        <UnconfirmedMark provenance={mask.provenance} />
      </h3>
      <LineTable reading={reading} sweeps={sweeps} />
      <p className="mt-2 flex flex-wrap gap-x-6 gap-y-1 text-sm text-ink-soft">
        <span>{sweeps.length === 1 ? "One sweep" : `${sweeps.length} sweeps, taken together`}</span>
        {spots > 0 ? (
          <Link href={`${href}/remeasure?mask=${maskId}`} className="text-deep underline">
            {spots === 1 ? "1 spot" : `${spots} spots`} to measure again
          </Link>
        ) : null}
      </p>
      {notHeld.map(({ sweepId, name, reason }) => (
        <p key={sweepId} className="mt-2 border-l-4 border-shoal bg-shoal-bed px-3 py-2 text-sm">
          Left out:{" "}
          <Link href={`/sweeps/${sweepId}?mask=${maskId}`} className="text-deep underline">
            {name}
          </Link>
          . {reason}
        </p>
      ))}
      {reading.doubts.length > 0 ? (
        <details className="mt-2">
          <summary className="cursor-pointer text-deep underline">
            {reading.doubts.length === 1 ? "1 doubt" : `${reading.doubts.length} doubts`}
          </summary>
          <div className="mt-3">
            <DoubtList doubts={reading.doubts} />
          </div>
        </details>
      ) : null}
    </div>
  );
}
