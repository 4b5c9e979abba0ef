import Link from "next/link";

export const EQUIPMENT_VIEWS = ["all", "due", "instruments", "transducers", "archived"] as const;
export type EquipmentView = (typeof EQUIPMENT_VIEWS)[number];

const LABELS: Record<EquipmentView, string> = {
  all: "All",
  due: "Due",
  instruments: "Instruments",
  transducers: "Transducers",
  archived: "Archived",
};

interface Filtered {
  kind: string;
  archived: boolean;
  state: string;
}

/** What a view shows; "due" is what is overdue or falls due soon. */
export function filterEquipment<T extends Filtered>(all: readonly T[], view: EquipmentView): T[] {
  return all.filter((piece) => {
    if (piece.archived !== (view === "archived")) return false;
    if (view === "due") return piece.state === "overdue" || piece.state === "due-soon";
    if (view === "instruments") return piece.kind === "instrument";
    if (view === "transducers") return piece.kind !== "instrument";
    return true;
  });
}

interface EquipmentFilterProps {
  all: readonly Filtered[];
  view: EquipmentView;
}

/** Views of the list with their counts; which one is shown stands in the address. */
export function EquipmentFilter({ all, view }: EquipmentFilterProps) {
  return (
    <nav aria-label="What is shown" className="mb-3 flex flex-wrap gap-2">
      {EQUIPMENT_VIEWS.map((each) => (
        <Link
          key={each}
          href={each === "all" ? "/benches/equipment" : `/benches/equipment?show=${each}`}
          aria-current={each === view ? "true" : undefined}
          className="inline-flex min-h-9 items-center gap-2 border border-rule bg-sheet px-3 py-1 no-underline hover:border-deep aria-[current=true]:border-deep aria-[current=true]:bg-water-1"
        >
          {LABELS[each]} <span className="font-mono">{filterEquipment(all, each).length}</span>
        </Link>
      ))}
    </nav>
  );
}
