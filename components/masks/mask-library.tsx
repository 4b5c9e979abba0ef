import Link from "next/link";
import { Section } from "@/components/ui/section";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import type { LibraryMask } from "./filter-masks";
import { groupByPort } from "./filter-masks";
import { PORT_LABELS } from "./mask-words";
import { ProvenanceMark } from "./provenance-mark";

const HEADS = ["Mask", "Document", "Distance", "Detectors", "Provenance", "Revision"];

/** The masks to choose from, one table per port. */
export function MaskLibrary({ masks }: { masks: readonly LibraryMask[] }) {
  return groupByPort(masks).map(({ port, masks: group }) => (
    <Section key={port} title={PORT_LABELS[port]}>
      <div
        className="overflow-x-auto border border-rule bg-sheet"
        tabIndex={0}
        role="region"
        aria-label={`Masks, ${PORT_LABELS[port].toLowerCase()}`}
      >
        <table className="w-full text-left">
          <thead className="text-sm text-ink-soft">
            <tr className="border-b border-rule">
              {HEADS.map((head) => (
                <th key={head} className="px-3 py-2 font-medium whitespace-nowrap">
                  {head}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {group.map((mask) => (
              <MaskLine key={mask.id} mask={mask} />
            ))}
          </tbody>
        </table>
      </div>
    </Section>
  ));
}

function MaskLine({ mask }: { mask: LibraryMask }) {
  return (
    <tr className="border-b border-rule last:border-0">
      <td className="px-3 py-2">
        <Link href={`/masks/${mask.id}`} className="font-medium text-deep underline">
          {mask.title}
        </Link>
        <span className="block text-sm text-ink-soft">
          {[
            mask.origin === "shipped" ? "shipped with Neap" : "made by the team",
            ...(mask.archived ? ["archived"] : []),
          ].join(", ")}
        </span>
      </td>
      <td className="px-3 py-2">
        {mask.document || <span className="text-ink-soft">not stated</span>}
        <span className="block text-sm text-ink-soft">
          clause {mask.clause || "not stated"}, edition {mask.edition || "not stated"}
        </span>
      </td>
      <td className="px-3 py-2 font-mono whitespace-nowrap">
        {mask.distanceM === null ? "" : `${mask.distanceM} m`}
      </td>
      <td className="px-3 py-2">{mask.detectors.map((d) => DETECTOR_LABELS[d]).join(", ")}</td>
      <td className="px-3 py-2 text-sm">
        <ProvenanceMark provenance={mask.provenance} />
      </td>
      <td className="px-3 py-2 font-mono">{mask.revision}</td>
    </tr>
  );
}
