import { Text, View } from "@react-pdf/renderer";
import { formatFrequency, formatLevel, formatMargin } from "@/lib/core/units/format";
import { Label } from "../parts/blocks";
import { Table } from "../parts/table";
import { BASIS_LABELS } from "../report-labels";
import { shorten } from "../printable";
import type { Deciding } from "../summarize";
import { COLOURS, TYPE } from "../style";

const SHOWN_SUSPECTS = 5;

/** The suspects that the chart marks with buoys. */
export function WorstSuspects({ deciding }: { deciding: Deciding | null }) {
  const held = deciding?.held ?? null;
  const suspects = held?.reading.suspects ?? [];
  const title =
    suspects.length > SHOWN_SUSPECTS
      ? `Five worst of ${suspects.length} suspects`
      : "Worst suspects";
  return (
    <View>
      <Label aheadPt={0}>{title}</Label>
      {suspects.length === 0 || !held ? (
        <Text style={{ ...TYPE.small, color: COLOURS.inkSoft }}>
          {held ? "No peak within reach of the mask stands out." : "No reading, so no suspects."}
        </Text>
      ) : (
        <Table
          columns={[
            { title: "", share: 0.32, kind: "number" },
            { title: "Frequency", share: 1.3, kind: "number", align: "right" },
            { title: "Level", share: 1.5, kind: "number", align: "right" },
            { title: "Margin", share: 1.1, kind: "number", align: "right" },
            { title: "Against", share: 2.3, kind: "small", longest: 18 },
          ]}
          rows={suspects
            .slice(0, SHOWN_SUSPECTS)
            .map((suspect) => [
              String(suspect.number),
              formatFrequency(
                suspect.frequencyHz,
                deciding?.sweep.traces[suspect.traceIndex]?.stepHz ?? undefined,
              ),
              formatLevel(suspect.levelDb, held.reading.unit),
              formatMargin(suspect.marginDb),
              `${shorten(suspect.lineName ?? "no line", 24)}, ${BASIS_LABELS[suspect.basis]}`,
            ])}
        />
      )}
    </View>
  );
}
