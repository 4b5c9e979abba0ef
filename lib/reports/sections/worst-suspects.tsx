import { Text, View } from "@react-pdf/renderer";
import { formatFrequency, formatLevel, formatMargin } from "@/lib/core/units/format";
import { Label } from "../parts/blocks";
import { Table } from "../parts/table";
import { shorten, shortenMiddle } from "../printable";
import { BASIS_LABELS } from "../report-labels";
import type { ReportContent } from "../report-content";
import { COLOURS, TYPE } from "../style";
import type { Deciding } from "../summarize";
import { nameWithPosition, sweepOfPart } from "../summarize";
import type { SummaryFit } from "../summary-fit";
import { worstSuspects } from "../worst-of-combined";

interface WorstSuspectsProps {
  content: ReportContent;
  deciding: Deciding | null;
  fit: SummaryFit;
}

/** The suspects that the chart marks with buoys, and those of the other sweeps among the worst. */
export function WorstSuspects({ content, deciding, fit }: WorstSuspectsProps) {
  const combined = deciding?.combined ?? null;
  const all = combined?.reading.suspects ?? [];
  const shown = deciding ? worstSuspects(deciding) : [];
  const title =
    all.length > shown.length ? `Five worst of ${all.length} suspects` : "Worst suspects";
  return (
    <View>
      <Label aheadPt={0}>{title}</Label>
      {!combined || shown.length === 0 ? (
        <Text style={{ ...TYPE.small, color: COLOURS.inkSoft }}>
          {combined
            ? "No peak within reach of the mask stands out."
            : "No reading, so no suspects."}
        </Text>
      ) : (
        <Table
          columns={[
            { title: "", share: 0.32, kind: "number" },
            { title: "Frequency", share: 1.3, kind: "number", align: "right" },
            { title: "Level", share: 1.5, kind: "number", align: "right" },
            { title: "Margin", share: 1.1, kind: "number", align: "right" },
            { title: "Against", share: 2.5, kind: "small", longest: 18 },
          ]}
          rows={shown.map((suspect) => {
            const sweep = sweepOfPart(content, combined, suspect.partIndex);
            const ambient = combined.ambient.find(({ number }) => number === suspect.number);
            return [
              String(suspect.number),
              formatFrequency(
                suspect.frequencyHz,
                sweep?.traces[suspect.traceIndex]?.stepHz ?? undefined,
              ),
              formatLevel(suspect.levelDb, combined.reading.unit),
              formatMargin(suspect.marginDb),
              <View key="against">
                <Text style={TYPE.small}>
                  {`${shorten(suspect.lineName ?? "no line", 24)}, ${BASIS_LABELS[suspect.basis]}`}
                </Text>
                {fit.suspectSweeps && combined.sweepIds.length > 1 && sweep ? (
                  <Text style={{ ...TYPE.small, fontSize: 6.6, color: COLOURS.inkSoft }}>
                    {shortenMiddle(nameWithPosition(sweep), 30)}
                  </Text>
                ) : null}
                {ambient?.isLikelyAmbient ? (
                  <Text style={{ ...TYPE.small, fontWeight: 600, color: COLOURS.shoal }}>
                    likely ambient
                  </Text>
                ) : null}
              </View>,
            ];
          })}
        />
      )}
    </View>
  );
}
