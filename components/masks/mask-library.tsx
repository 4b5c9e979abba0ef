import Link from "next/link";
import { keepUnits } from "@/components/ui/keep-units";
import { Section } from "@/components/ui/section";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import type { LibraryMask } from "./filter-masks";
import { groupByPort } from "./filter-masks";
import { editionWords, PORT_LABELS, sourceWords } from "./mask-words";
import { ProvenanceMark } from "./provenance-mark";

/** On a phone only the mask and its provenance; their widths are shared by the tables of all ports. */
const HEADS = [
  { head: "Mask", look: "lg:w-[27%]" },
  { head: "Document", look: "max-sm:hidden lg:w-[18.5%]" },
  { head: "Edition", look: "max-lg:hidden lg:w-[9%]" },
  { head: "Distance", look: "text-right max-lg:hidden lg:w-[7%]" },
  { head: "Detectors", look: "max-sm:hidden lg:w-[16%]" },
  { head: "Provenance", look: "lg:w-[16%]" },
  { head: "Revision", look: "text-right max-lg:hidden lg:w-[6.5%]" },
];
const CELL = "px-2 py-1.5 first:pl-3 last:pr-3";

/** The masks to choose from, one table per port. */
export function MaskLibrary({ masks }: { masks: readonly LibraryMask[] }) {
  return groupByPort(masks).map(({ port, masks: group }) => (
    <Section
      key={port}
      title={PORT_LABELS[port]}
      actions={
        <span className="text-sm text-ink-soft">
          {group.length === 1 ? "1 mask" : `${group.length} masks`}
        </span>
      }
    >
      <div
        className="overflow-x-auto border border-rule bg-sheet"
        tabIndex={0}
        role="region"
        aria-label={`Masks, ${PORT_LABELS[port].toLowerCase()}`}
      >
        <table className="w-full text-left lg:table-fixed">
          <thead className="text-sm text-ink-soft">
            <tr className="border-b border-rule">
              {HEADS.map(({ head, look }) => (
                <th key={head} className={`${CELL} font-medium whitespace-nowrap ${look}`}>
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
  const standing = [
    ...(mask.origin === "team" ? ["made by the team"] : []),
    ...(mask.archived ? ["archived"] : []),
    ...(mask.pendingRevision === null
      ? []
      : [`revision ${mask.pendingRevision} is being put in force`]),
  ].join(", ");
  return (
    <tr className="border-b border-rule align-baseline last:border-0">
      <td className={CELL}>
        <Link href={`/masks/${mask.id}`} className="font-medium text-deep underline">
          {keepUnits(mask.title)}
        </Link>
        {standing ? <span className="ml-2 text-sm text-ink-soft">{standing}</span> : null}
      </td>
      <td className={`${CELL} text-sm max-sm:hidden`}>{sourceWords(mask)}</td>
      <td className={`${CELL} text-sm max-lg:hidden`}>{editionWords(mask)}</td>
      <td className={`${CELL} text-right font-mono text-sm whitespace-nowrap max-lg:hidden`}>
        {mask.distanceM === null ? "" : `${mask.distanceM} m`}
      </td>
      <td className={`${CELL} text-sm max-sm:hidden`}>
        {mask.detectors.map((d) => DETECTOR_LABELS[d]).join(", ")}
      </td>
      <td className={`${CELL} text-sm`}>
        <ProvenanceMark provenance={mask.provenance} confirmation={mask.confirmation} />
      </td>
      <td className={`${CELL} text-right font-mono text-sm max-lg:hidden`}>{mask.revision}</td>
    </tr>
  );
}
