import { WrittenNames } from "./written-names";
import type { Coastline } from "./prepare-coastline";

/** Hatched land above the coast; drawn below the water. */
export function Land(props: { coastline: Pick<Coastline, "land" | "shore">; id: string }) {
  const { coastline, id } = props;
  return (
    <g>
      <defs>
        <pattern
          id={`${id}-hatch`}
          width="6"
          height="6"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <line x1="0" y1="0" x2="0" y2="6" stroke="var(--land-edge)" strokeWidth="0.7" />
        </pattern>
      </defs>
      <clipPath id={`${id}-land`}>
        <path d={coastline.land} />
      </clipPath>
      <path d={coastline.land} fill="var(--land)" fillOpacity="0.75" />
      <path d={coastline.land} fill={`url(#${id}-hatch)`} fillOpacity="0.5" />
      <path
        d={coastline.shore}
        clipPath={`url(#${id}-land)`}
        fill="none"
        stroke="var(--land-edge)"
        strokeWidth="14"
        strokeOpacity="0.22"
      />
    </g>
  );
}

/** The mask lines, each in its detector's style with its name written on it. */
export function Coast({ coastline }: { coastline: Coastline }) {
  return (
    <g>
      {coastline.lines.map((line, i) => (
        <path
          key={i}
          d={line.path}
          fill="none"
          stroke="var(--land-edge)"
          strokeWidth="1.75"
          strokeDasharray={line.dash}
          strokeLinejoin="round"
        />
      ))}
      <WrittenNames names={coastline.names} />
    </g>
  );
}
