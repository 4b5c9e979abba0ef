import { BASIS_LABELS } from "@/components/readings/basis-labels";
import type { ShownSuspect } from "@/components/suspects/filter-suspects";
import { FollowCell } from "@/components/suspects/follow-cell";
import type { Act } from "@/components/suspects/outcome";
import type { DataColumn } from "@/components/ui/data-table";
import { formatFrequency, formatLevel, formatMargin } from "@/lib/core/units/format";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";

type Column = DataColumn<ShownSuspect>;

const rounded = (value: number | null) => (value === null ? null : Number(value.toFixed(2)));

/** A level without its unit, which stands in the head. */
const levelColumn = (
  id: string,
  header: string,
  unit: LevelUnit,
  valueOf: (suspect: ShownSuspect) => number | null,
): Column => ({
  id,
  header: `${header}, ${LEVEL_UNIT_LABELS[unit]}`,
  align: "right",
  mono: true,
  value: (suspect) => rounded(valueOf(suspect)),
  cell: (suspect) => {
    const value = valueOf(suspect);
    return value === null ? "" : formatLevel(value, unit).split(" ")[0];
  },
});

/** A few words that stay on one line, so that a row is one line high. */
const textColumn = (
  id: string,
  header: string,
  valueOf: (suspect: ShownSuspect) => string | null,
): Column => ({
  id,
  header,
  value: valueOf,
  cell: (suspect) => <span className="whitespace-nowrap">{valueOf(suspect)}</span>,
});

/** What every table of suspects shows; numbers are those of the chart's buoys. */
export function readingColumns(unit: LevelUnit, stepHz: number | null): Column[] {
  return [
    { id: "number", header: "No.", mono: true, align: "right", value: (s) => s.number },
    {
      id: "frequency",
      header: "Frequency",
      exportHeader: "Frequency, Hz",
      mono: true,
      align: "right",
      value: (s) => s.frequencyHz,
      cell: (s) => formatFrequency(s.frequencyHz, stepHz ?? undefined),
    },
    levelColumn("level", "Level", unit, (s) => s.levelDb),
    levelColumn("limit", "Limit", unit, (s) => s.limitDb),
    {
      id: "margin",
      header: "Margin",
      exportHeader: "Margin, dB",
      align: "right",
      mono: true,
      value: (s) => rounded(s.marginDb),
      cell: (s) => (
        <span className={(s.marginDb ?? 0) < 0 ? "text-aground" : ""}>
          {formatMargin(s.marginDb)}
        </span>
      ),
    },
    textColumn("line", "Mask line", (s) => s.lineName),
    textColumn("basis", "Basis", (s) => BASIS_LABELS[s.basis]),
  ];
}

/** What the ambient sweeps of the day say beside each suspect. */
export function ambientColumns(unit: LevelUnit): Column[] {
  const mark = (s: ShownSuspect) =>
    s.ambient === null ? "not compared" : s.ambient.isLikelyAmbient ? "likely" : "";
  return [
    levelColumn("ambient", "Ambient", unit, (s) => s.ambient?.ambientDb ?? null),
    {
      id: "likely-ambient",
      header: "Ambient?",
      value: mark,
      cell: (s) => (
        <span
          className={`whitespace-nowrap ${s.ambient?.isLikelyAmbient ? "text-shoal" : "text-ink-soft"}`}
        >
          {mark(s)}
        </span>
      ),
    },
    levelColumn(
      "without-ambient",
      "Without ambient (estimate)",
      unit,
      (s) => s.ambient?.withoutAmbientDb ?? null,
    ),
  ];
}

/** Which followed suspect each row is; with `follow` those that are none can be followed. */
export function followColumn(follow: ((number: number) => ReturnType<Act>) | undefined): Column {
  return {
    id: "followed",
    header: "Followed",
    value: ({ followed }) =>
      followed === null
        ? null
        : followed.isSame
          ? `${followed.followedNumber}, ${followed.state}`
          : `beside ${followed.followedNumber}`,
    cell: (s) => (
      <FollowCell
        number={s.number}
        mark={s.followed}
        follow={follow ? () => follow(s.number) : undefined}
      />
    ),
  };
}
