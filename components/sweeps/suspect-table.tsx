"use client";

import { useMemo } from "react";
import type { ShownSuspect, SuspectTableFilter } from "@/components/suspects/filter-suspects";
import type { Act } from "@/components/suspects/outcome";
import { SuspectTableFilterBar } from "@/components/suspects/suspect-table-filter";
import { ActionButton } from "@/components/ui/action-button";
import { DataTable } from "@/components/ui/data-table";
import { EmptyState } from "@/components/ui/empty-state";
import { Section } from "@/components/ui/section";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { ambientColumns, followColumn, readingColumns } from "./suspect-columns";

interface SuspectTableProps {
  /** Every suspect of the reading, and those that the filter leaves. */
  all: ShownSuspect[];
  shown: ShownSuspect[];
  filter: SuspectTableFilter;
  onFilter: (filter: SuspectTableFilter) => void;
  stepHz: number | null;
  unit: LevelUnit;
  exportName: string;
  highlighted: number | null;
  onHighlight: (number: number | null) => void;
  /** The ambient of the day was held beside the reading. */
  hasAmbient: boolean;
  /** It is known which suspects the program follows. */
  hasFollowed: boolean;
  /** Left out when the reader may not follow suspects. */
  follow?: ((number: number) => ReturnType<Act>) | undefined;
  followNear?: Act | undefined;
}

/** Peaks worth following, the lowest margin first. */
export function SuspectTable(props: SuspectTableProps) {
  const { all, shown, stepHz, unit, exportName, highlighted, onHighlight } = props;
  const { hasAmbient, hasFollowed, follow, followNear } = props;
  const columns = useMemo(
    () => [
      ...readingColumns(unit, stepHz),
      ...(hasAmbient ? ambientColumns(unit) : []),
      ...(hasFollowed || follow ? [followColumn(follow)] : []),
    ],
    [unit, stepHz, hasAmbient, hasFollowed, follow],
  );
  return (
    <Section
      title="Suspects"
      lead="Peaks that stand 6 dB or more out of their surroundings, at most 20 dB under the mask."
      actions={
        followNear && all.length > 0 ? (
          <ActionButton action={followNear}>Follow all over or inside guard</ActionButton>
        ) : undefined
      }
    >
      {all.length === 0 ? (
        <EmptyState>No peak stands out within 20 dB of this mask.</EmptyState>
      ) : (
        <>
          <SuspectTableFilterBar
            {...{ all, shown }}
            filter={props.filter}
            onFilter={props.onFilter}
          />
          {shown.length === 0 ? (
            <EmptyState>No suspect matches.</EmptyState>
          ) : (
            <div className="max-h-[36rem] overflow-y-auto">
              <DataTable
                label="Suspects"
                columns={columns}
                rows={shown}
                rowKey={(suspect) => String(suspect.number)}
                exportName={exportName}
                highlighted={highlighted === null ? null : String(highlighted)}
                onHighlight={(key) => onHighlight(key === null ? null : Number(key))}
              />
            </div>
          )}
          {hasAmbient ? (
            <p className="mt-2 text-sm text-ink-soft">
              Likely ambient: the ambient lies within 3 dB of the suspect. Without ambient is 10
              log₁₀(10^(T/10) − 10^(A/10)), an estimate for noise-like signals that changes no
              margin; it stays empty where the ambient is as high as the suspect.
            </p>
          ) : null}
        </>
      )}
    </Section>
  );
}
