import { Text, View } from "@react-pdf/renderer";
import { STANDING_LABELS, type Standing } from "@/lib/core/reading/reading";
import { formatDelta } from "@/lib/core/units/format";
import { STANDING_COLOURS, TYPE } from "../style";
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

/** Arrow and signed dB of a change. */
export function Change({ changeDb }: { changeDb: number | null }) {
  return (
    <View style={{ flexDirection: "row", alignItems: "center", gap: 3 }}>
      <ChangeArrow changeDb={changeDb} />
      <Text style={TYPE.number}>{formatDelta(changeDb)}</Text>
    </View>
  );
}
