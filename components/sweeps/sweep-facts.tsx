import { Facts } from "@/components/ui/facts";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import type { TagField } from "./tag-fields";
import { LINK_FIELDS, MEASUREMENT_FIELDS } from "./tag-fields";
import { showTag } from "./tags";

const NUMERIC = new Set(["frequency", "bit-rate", "time", "number"]);

function factsOf(fields: TagField[], from: MeasurementSettings | LinkSettings) {
  return fields.map((field) => ({
    label: field.label,
    value: showTag(field, from),
    mono: NUMERIC.has(field.kind),
  }));
}

export function MeasurementFacts({ settings }: { settings: MeasurementSettings }) {
  return <Facts items={factsOf(MEASUREMENT_FIELDS, settings)} />;
}

/** The link's settings; how a clock is spread shows only when it is. */
export function LinkFacts({ link }: { link: LinkSettings }) {
  const fields = LINK_FIELDS.filter((f) => link.spread !== null || !f.path.startsWith("spread."));
  return <Facts items={factsOf(fields, link)} />;
}
