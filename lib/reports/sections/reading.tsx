import { Text, View } from "@react-pdf/renderer";
import type { LineReading } from "@/lib/core/reading/reading";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency, formatLevel, formatMargin } from "@/lib/core/units/format";
import { Paragraph, SubTitle, Warning } from "../parts/blocks";
import { DoubtGroups } from "../parts/doubt-groups";
import { StandingLabel } from "../parts/standing-label";
import { Table } from "../parts/table";
import { Words } from "../parts/words";
import { BASIS_LABELS } from "../report-labels";
import { markOfMask } from "../mask-mark";
import type { SnapshotReading, SnapshotSweep } from "../report-content";
import { countOf, formatCoverage, formatRange, stateValue } from "../report-text";
import { TYPE } from "../style";
import { Suspects } from "./suspects";

interface HeldProps {
  held: SnapshotReading;
  sweep: SnapshotSweep;
}

const SHOWN_GAPS = 12;

function gapText({ name, coverage }: LineReading): string | null {
  if (coverage.gaps.length === 0) return null;
  const shown = coverage.gaps.slice(0, SHOWN_GAPS).map(formatRange).join(", ");
  const more = coverage.gaps.length - SHOWN_GAPS;
  const rest = more > 0 ? ` and ${countOf(more, "more gap")}` : "";
  return `${name}, ${formatCoverage(coverage.fraction)} covered. Not swept: ${shown}${rest}.`;
}

function Lines({ held: { reading }, sweep }: HeldProps) {
  return (
    <Table
      columns={[
        { title: "Line", share: 1.6, longest: 18 },
        { title: "Standing", share: 1.45 },
        { title: "Margin", share: 1.15, kind: "number", align: "right" },
        { title: "Frequency", share: 1.4, kind: "number", align: "right" },
        { title: "Level", share: 1.6, kind: "number", align: "right" },
        { title: "Limit", share: 1.6, kind: "number", align: "right" },
        { title: "Basis", share: 1.25, kind: "small" },
        { title: "Coverage", share: 1, kind: "number", align: "right" },
      ]}
      rows={reading.lines.map((line) => [
        <View key="line">
          <Words style={TYPE.strong} longest={16}>
            {line.name}
          </Words>
          {line.name.toLowerCase() === DETECTOR_LABELS[line.detector].toLowerCase() ? null : (
            <Text style={TYPE.small}>{DETECTOR_LABELS[line.detector]}</Text>
          )}
        </View>,
        <StandingLabel key="standing" standing={line.standing} />,
        formatMargin(line.worst?.marginDb ?? null),
        line.worst
          ? formatFrequency(
              line.worst.frequencyHz,
              sweep.traces[line.worst.traceIndex]?.stepHz ?? undefined,
            )
          : "–",
        line.worst ? formatLevel(line.worst.levelDb, reading.unit) : "–",
        line.worst ? formatLevel(line.worst.limitDb, reading.unit) : "–",
        BASIS_LABELS[line.basis],
        formatCoverage(line.coverage.fraction),
      ])}
    />
  );
}

/** The whole reading of a sweep against one mask revision. */
export function ReadingBlock({ held, sweep }: HeldProps) {
  const { reading, mask, maskRevision, confirmation } = held;
  const mark = markOfMask(mask.provenance, confirmation);
  const explained = reading.lines.filter((line) => line.explanation !== null);
  const open = reading.remeasure.length + reading.remeasureOmitted;
  const gaps = reading.lines.map(gapText).filter((text) => text !== null);
  return (
    <>
      <SubTitle aheadPt={80}>{`Against ${mask.title}, revision ${maskRevision}`}</SubTitle>
      {mark === null ? null : <Paragraph soft>{`This mask: ${mark}.`}</Paragraph>}
      {reading.notComparable === null ? null : <Warning>{reading.notComparable}</Warning>}
      {reading.lines.length > 0 ? <Lines held={held} sweep={sweep} /> : null}
      <View style={{ marginTop: 4 }}>
        <Text style={TYPE.small}>
          {`Guard ${stateValue(reading.guardDb, "dB")} · reading rules version ${reading.engineVersion}`}
        </Text>
        {open > 0 ? (
          <Text style={TYPE.small}>
            {`Held alone, an upper bound of this sweep lies over the line at ${countOf(open, "point")}; what the other sweeps leave open of it stands under "Measure again".`}
          </Text>
        ) : null}
        {explained.map((line) => (
          <Text key={line.lineIndex} style={TYPE.small}>{`${line.name}: ${line.explanation}`}</Text>
        ))}
        {gaps.map((text) => (
          <Text key={text} style={TYPE.small}>
            {text}
          </Text>
        ))}
      </View>
      {reading.notComparable === null || reading.doubts.length > 0 ? (
        <DoubtGroups doubts={reading.doubts} />
      ) : null}
      {reading.notComparable === null ? <Suspects held={held} sweep={sweep} /> : null}
    </>
  );
}
