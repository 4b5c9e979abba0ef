import { Field } from "@/components/ui/field";
import { formatMargin } from "@/lib/core/units/format";
import type { ShownSuspect, SuspectTableFilter } from "./filter-suspects";

interface SuspectTableFilterProps {
  filter: SuspectTableFilter;
  onFilter: (filter: SuspectTableFilter) => void;
  all: readonly ShownSuspect[];
  shown: readonly ShownSuspect[];
}

/** What of a table of suspects is shown; what is hidden is always counted beside it. */
export function SuspectTableFilterBar(props: SuspectTableFilterProps) {
  const { filter, onFilter, all, shown } = props;
  const ambient = all.filter((suspect) => suspect.ambient?.isLikelyAmbient);
  const lowest = ambient.reduce<number | null>(
    (least, { marginDb }) =>
      marginDb === null ? least : least === null ? marginDb : Math.min(least, marginDb),
    null,
  );
  return (
    <div className="mb-1 flex flex-wrap items-start gap-x-6 print:hidden">
      <div className="w-72">
        <Field
          label="Find"
          type="search"
          value={filter.text}
          placeholder="88 MHz, or 30 to 80 MHz"
          onChange={(event) => onFilter({ ...filter, text: event.target.value })}
        />
      </div>
      {ambient.length > 0 ? (
        <label className="flex min-h-10 items-center gap-1.5 sm:mt-7">
          <input
            type="checkbox"
            checked={filter.hidesAmbient}
            onChange={(event) => onFilter({ ...filter, hidesAmbient: event.target.checked })}
          />
          Hide likely ambient
        </label>
      ) : null}
      <p role="status" className="min-h-6 text-sm text-ink-soft sm:mt-9">
        {shown.length < all.length ? `${shown.length} of ${all.length} shown. ` : ""}
        {filter.hidesAmbient && ambient.length > 0
          ? `Hidden as likely ambient: ${ambient.length}, the lowest at ${formatMargin(lowest)}.`
          : ""}
      </p>
    </div>
  );
}
