import type { Provenance } from "@/lib/core/mask/mask";
import { DETECTOR_LABELS, type Detector, type Port, PORTS } from "@/lib/core/sweep/settings";
import type { Confirmation } from "./mask-words";

export interface LibraryMask {
  id: string;
  key: string;
  title: string;
  port: Port;
  document: string;
  clause: string;
  edition: string;
  provenance: Provenance;
  distanceM: number | null;
  detectors: Detector[];
  revision: number;
  origin: "shipped" | "team";
  archived: boolean;
  /** Of the revision in force. */
  confirmation: Confirmation | null;
  /** A newer revision that is still being put in force. */
  pendingRevision: number | null;
}

export interface MaskFilter {
  port: Port | null;
  text: string;
  provenance: Provenance | null;
  archived: boolean;
}

/** Masks that have every word of the filter somewhere in what the list shows of them. */
export function filterMasks<T extends LibraryMask>(masks: readonly T[], filter: MaskFilter): T[] {
  const words = filter.text.toLowerCase().split(/\s+/).filter(Boolean);
  return masks.filter((mask) => {
    if (mask.archived && !filter.archived) return false;
    if (filter.port !== null && mask.port !== filter.port) return false;
    if (filter.provenance !== null && mask.provenance !== filter.provenance) return false;
    const said = [
      mask.title,
      mask.key,
      mask.document,
      mask.clause,
      mask.edition,
      ...mask.detectors.map((detector) => DETECTOR_LABELS[detector]),
    ]
      .join(" ")
      .toLowerCase();
    return words.every((word) => said.includes(word));
  });
}

/** By port, in the ports' own order, leaving out those without a mask. */
export function groupByPort<T extends LibraryMask>(
  masks: readonly T[],
): { port: Port; masks: T[] }[] {
  return PORTS.map((port) => ({ port, masks: masks.filter((mask) => mask.port === port) })).filter(
    (group) => group.masks.length > 0,
  );
}
