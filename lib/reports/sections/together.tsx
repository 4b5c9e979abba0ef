import { Text, View } from "@react-pdf/renderer";
import { formatFrequency, formatLevel, formatMargin } from "@/lib/core/units/format";
import { Label, Paragraph, SectionTitle, SubTitle, Warning } from "../parts/blocks";
import { DoubtGroups } from "../parts/doubt-groups";
import { StandingLabel } from "../parts/standing-label";
import { Table } from "../parts/table";
import { Words } from "../parts/words";
import { BASIS_LABELS } from "../report-labels";
import type { ReportContent, SnapshotCombined } from "../report-content";
import { countOf, formatCoverage, formatRange } from "../report-text";
import { markOfMask } from "../mask-mark";
import { COLOURS, TYPE } from "../style";
import { linesOfMask, nameWithPosition, sweepOfPart } from "../summarize";

interface MaskProps {
  content: ReportContent;
  combined: SnapshotCombined;
}

function Lines({ content, combined }: MaskProps) {
  return (
    <Table
      columns={[
        { title: "Line", share: 1.3, longest: 16 },
        { title: "Standing", share: 1.45 },
        { title: "Margin", share: 1.1, kind: "number", align: "right" },
        { title: "Frequency", share: 1.35, kind: "number", align: "right" },
        { title: "Level", share: 1.5, kind: "number", align: "right" },
        { title: "Limit", share: 1.5, kind: "number", align: "right" },
        { title: "Swept", share: 0.8, kind: "number", align: "right" },
        { title: "Basis and deciding sweep", share: 2.4, longest: 22 },
      ]}
      rows={linesOfMask(content, combined).map((line) => [
        line.lineName,
        <StandingLabel key="standing" standing={line.standing} />,
        formatMargin(line.worst?.point.marginDb ?? null),
        line.worst ? formatFrequency(line.worst.point.frequencyHz, line.worst.stepHz) : "–",
        line.worst ? formatLevel(line.worst.point.levelDb, line.unit) : "–",
        line.worst ? formatLevel(line.worst.point.limitDb, line.unit) : "–",
        formatCoverage(line.coverage),
        <View key="source">
          <Text style={TYPE.small}>{line.worst ? BASIS_LABELS[line.worst.basis] : "–"}</Text>
          {line.worst ? (
            <Words style={{ ...TYPE.small, color: COLOURS.inkSoft }} longest={20}>
              {line.worst.decidedBy}
            </Words>
          ) : null}
        </View>,
      ])}
    />
  );
}

/** The stretches of each line between two frequencies where the limit changes. */
function Bands({ combined: { reading } }: MaskProps) {
  const rows = reading.lines.flatMap((line) =>
    line.bands.length < 2
      ? []
      : line.bands.map((band, i) => [
          i === 0 ? line.name : "",
          formatRange(band),
          formatMargin(band.worst?.marginDb ?? null),
          band.worst ? formatFrequency(band.worst.frequencyHz) : "–",
          BASIS_LABELS[band.basis],
          formatCoverage(band.coverage),
        ]),
  );
  if (rows.length === 0) return null;
  return (
    <>
      <Label>Bands</Label>
      <Table
        columns={[
          { title: "Line", share: 1.6, longest: 18 },
          { title: "Band", share: 2.8, kind: "number" },
          { title: "Worst margin", share: 1.4, kind: "number", align: "right" },
          { title: "Frequency", share: 1.5, kind: "number", align: "right" },
          { title: "Basis", share: 1.4, kind: "small" },
          { title: "Swept", share: 0.9, kind: "number", align: "right" },
        ]}
        rows={rows}
      />
    </>
  );
}

function MaskTogether({ content, combined }: MaskProps) {
  const { mask, maskRevision, confirmation, reading, sweepIds } = combined;
  const mark = markOfMask(mask.provenance, confirmation);
  const nameOf = (partIndex: number) => {
    const sweep = sweepOfPart(content, combined, partIndex);
    return sweep ? nameWithPosition(sweep) : "";
  };
  const explained = reading.lines.filter((line) => line.explanation !== null);
  const open = reading.remeasure.length + reading.remeasureOmitted;
  return (
    <>
      <SubTitle aheadPt={96}>{`${mask.title} · revision ${maskRevision}`}</SubTitle>
      {mark === null ? null : confirmation ? (
        <Paragraph>{`This mask: ${mark}.`}</Paragraph>
      ) : (
        <Warning>{`This mask: ${mark}.`}</Warning>
      )}
      <Paragraph soft>
        {`From ${countOf(sweepIds.length, "sweep")}: ${sweepIds.map((_, i) => nameOf(i)).join("; ")}.`}
      </Paragraph>
      <Lines content={content} combined={combined} />
      {explained.map((line) => (
        <Words key={line.lineIndex} style={{ ...TYPE.small, marginTop: 2 }} longest={80}>
          {`${line.name}: ${line.explanation}`}
        </Words>
      ))}
      {open > 0 ? (
        <Text style={{ ...TYPE.small, marginTop: 2 }}>
          {`${countOf(open, "point")} to be measured again: see the list "Measure again".`}
        </Text>
      ) : null}
      <Bands content={content} combined={combined} />
      <DoubtGroups doubts={reading.doubts} nameOfPart={nameOf} />
    </>
  );
}

/** Every mask line over all product sweeps, and the masks that none of them reaches. */
export function Together({ content }: { content: ReportContent }) {
  return (
    <>
      <SectionTitle>Standing of the sweeps together</SectionTitle>
      <Paragraph soft>
        Where sweeps of one position overlap, the tighter detector decides and silences the looser
        one’s upper bound. A line counts as swept only where every polarization that was swept
        covers it.
      </Paragraph>
      {content.combined.length === 0 ? (
        <Paragraph>No product sweep of this report was held against a mask.</Paragraph>
      ) : null}
      {content.combined.map((combined) => (
        <MaskTogether key={combined.maskRevisionId} content={content} combined={combined} />
      ))}
      {content.notHeld.length > 0 ? <SubTitle>Not held against</SubTitle> : null}
      {content.notHeld.map(({ title, maskRevision, provenance, confirmation, reasons }) => {
        const mark = markOfMask(provenance, confirmation);
        const own = `${title} (revision ${maskRevision}${mark === null ? "" : `, ${mark}`})`;
        return <Warning key={own}>{`${own}. ${reasons.join(" ")}`}</Warning>;
      })}
    </>
  );
}
