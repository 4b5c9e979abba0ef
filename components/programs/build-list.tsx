import Link from "next/link";
import { UnconfirmedMark } from "@/components/masks/unconfirmed-mark";
import { StandingMark } from "@/components/readings/standing-mark";
import type { Standing } from "@/lib/core/reading/reading";
import { formatMargin } from "@/lib/core/units/format";

interface BuildListProps {
  programId: string;
  masks: { id: string; title: string; provenance: string }[];
  builds: {
    id: string;
    name: string;
    builtOn: string | null;
    standings: {
      maskId: string;
      sweepId: string;
      standing: Standing;
      marginDb: number | null;
    }[];
  }[];
}

/** Builds, the newest first, with the worst margin of each under each mask. */
export function BuildList({ programId, masks, builds }: BuildListProps) {
  return (
    <div
      className="overflow-x-auto border border-rule bg-sheet"
      tabIndex={0}
      role="region"
      aria-label="Builds"
    >
      <table className="w-full text-left">
        <thead className="text-sm text-ink-soft">
          <tr className="border-b border-rule align-bottom">
            <th className="px-4 py-2 font-medium">Build</th>
            <th className="px-4 py-2 font-medium">Built on</th>
            {masks.map((mask) => (
              <th key={mask.id} className="max-w-56 px-4 py-2 font-medium">
                {mask.title}
                <span className="block">
                  <UnconfirmedMark provenance={mask.provenance} />
                </span>
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {[...builds].reverse().map((build) => (
            <tr key={build.id} className="border-b border-rule last:border-0">
              <td className="px-4 py-3 font-medium whitespace-nowrap">
                <Link
                  href={`/programs/${programId}/builds/${build.id}`}
                  className="text-deep underline"
                >
                  {build.name}
                </Link>
              </td>
              <td className="px-4 py-3 font-mono whitespace-nowrap">
                {build.builtOn ?? "not stated"}
              </td>
              {masks.map((mask) => {
                const found = build.standings.find((s) => s.maskId === mask.id);
                return (
                  <td key={mask.id} className="px-4 py-3">
                    {found ? (
                      <span className="inline-flex flex-wrap items-baseline gap-x-3">
                        <Link
                          href={`/sweeps/${found.sweepId}?mask=${mask.id}`}
                          className="font-mono whitespace-nowrap text-deep underline"
                        >
                          {formatMargin(found.marginDb)}
                        </Link>
                        <StandingMark standing={found.standing} />
                      </span>
                    ) : (
                      <span className="text-ink-soft">not swept</span>
                    )}
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
