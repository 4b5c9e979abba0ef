import type { PlacedName } from "./place-names";

/** Names written along their lines, on a soft ground so that hatching does not disturb them. */
export function WrittenNames({ names }: { names: readonly PlacedName[] }) {
  return names.map((name, i) => (
    <text
      key={i}
      transform={`translate(${name.x.toFixed(1)} ${name.y.toFixed(1)}) rotate(${name.angleDeg.toFixed(1)})`}
      dy="0.33em"
      textAnchor="middle"
      fontSize="11"
      fontWeight="500"
      fill="var(--ink)"
      stroke="var(--sheet)"
      strokeWidth="3"
      strokeOpacity="0.75"
      strokeLinejoin="round"
      paintOrder="stroke"
    >
      {name.name}
    </text>
  ));
}
