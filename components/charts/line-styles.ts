/** Styles that tell several lines of one kind apart without leaning on colour alone. */
const LINE_STYLES = [
  { stroke: "var(--deep)", dash: undefined },
  { stroke: "var(--ink)", dash: "7 3" },
  { stroke: "var(--ink-soft)", dash: "2 3" },
  { stroke: "var(--deep)", dash: "10 3 2 3" },
  { stroke: "var(--ink)", dash: "4 2" },
  { stroke: "var(--ink-soft)", dash: undefined },
];

export interface LineStyle {
  stroke: string;
  dash: string | undefined;
}

export function lineStyle(index: number): LineStyle {
  return LINE_STYLES[index % LINE_STYLES.length] ?? { stroke: "var(--ink)", dash: undefined };
}
