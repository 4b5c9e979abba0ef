import { Path, Polygon, Svg } from "@react-pdf/renderer";
import type { Standing } from "@/lib/core/reading/reading";
import { COLOURS, STANDING_COLOURS } from "../style";

interface StandingMarkProps {
  standing: Standing;
  sizePt?: number;
}

const RING = "M5 1.2 A3.8 3.8 0 1 1 5 8.8 A3.8 3.8 0 1 1 5 1.2 Z";
const HALF = "M5 1.2 A3.8 3.8 0 0 0 5 8.8 Z";

/** Open ring, half-filled ring, solid diamond or dashed ring: a standing is never colour alone. */
export function StandingMark({ standing, sizePt = 9 }: StandingMarkProps) {
  const colour = STANDING_COLOURS[standing];
  return (
    <Svg viewBox="0 0 10 10" style={{ width: sizePt, height: sizePt }}>
      {standing === "over" ? (
        <Polygon points="5,0.4 9.6,5 5,9.6 0.4,5" fill={colour} />
      ) : (
        <Path
          d={RING}
          fill="none"
          stroke={colour}
          strokeWidth={1.4}
          {...(standing === "undecided" ? { strokeDasharray: "1.7 1.4" } : {})}
        />
      )}
      {standing === "inside-guard" ? <Path d={HALF} fill={colour} /> : null}
    </Svg>
  );
}

/** Arrow of a change in dB; empty for no change, so that columns stay aligned. */
export function ChangeArrow({ changeDb }: { changeDb: number | null }) {
  const up = changeDb !== null && changeDb > 0;
  return (
    <Svg viewBox="0 0 8 8" style={{ width: 5.6, height: 5.6 }}>
      {changeDb === null || changeDb === 0 ? null : (
        <Polygon points={up ? "4,1 7.4,7 0.6,7" : "4,7 7.4,1 0.6,1"} fill={COLOURS.inkSoft} />
      )}
    </Svg>
  );
}

/** Triangle that stands before a warning. */
export function ShoalMark() {
  return (
    <Svg viewBox="0 0 10 10" style={{ width: 7.5, height: 7.5, marginTop: 1.4 }}>
      <Path
        d="M5 1 L9.3 9 L0.7 9 Z M5 4 L5 6.4 M5 7.3 L5 7.9"
        fill="none"
        stroke={COLOURS.shoal}
        strokeWidth={1}
      />
    </Svg>
  );
}
