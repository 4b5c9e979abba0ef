import { Text, View } from "@react-pdf/renderer";
import type { MeasuredChange } from "@/lib/core/delta/delta";
import { STANDING_LABELS, type Standing } from "@/lib/core/reading/reading";
import { formatDelta } from "@/lib/core/units/format";
import { repeatText, uncertaintyText } from "../delta-words";
import { COLOURS, STANDING_COLOURS, TYPE } from "../style";
import { ChangeArrow, StandingMark } from "./marks";

/** Mark and word of a standing. */
export function StandingLabel({ standing }: { standing: Standing }) {
  return (
    <View style={{ flexDirection: "row", alignItems: "center", gap: 4 }}>
      <StandingMark standing={standing} />
      <Text style={{ ...TYPE.strong, color: STANDING_COLOURS[standing] }}>
        {STANDING_LABELS[standing]}
      </Text>
    </View>
  );
}

/** A change with its ±, and whether the repeats explain it. */
export function Measured({ change }: { change: MeasuredChange }) {
  const uncertainty = uncertaintyText(change);
  const repeat = repeatText(change);
  return (
    <View style={{ alignItems: "flex-end" }}>
      <View style={{ flexDirection: "row", alignItems: "center", gap: 3 }}>
        <ChangeArrow changeDb={change.changeDb} />
        <Text style={TYPE.number}>
          {`${formatDelta(change.changeDb)}${uncertainty === "" ? "" : ` ${uncertainty}`}`}
        </Text>
      </View>
      {repeat === "" ? null : <Text style={{ ...TYPE.small, color: COLOURS.shoal }}>{repeat}</Text>}
    </View>
  );
}
