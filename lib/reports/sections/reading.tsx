import { Text, View } from "@react-pdf/renderer";
import type { LineReading } from "@/lib/core/reading/reading";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency, formatLevel, formatMargin } from "@/lib/core/units/format";
import { DoubtLine, Label, Paragraph, SubTitle, Warning } from "../parts/blocks";
import { StandingLabel } from "../parts/standing-label";
import { Table } from "../parts/table";
import { Words } from "../parts/words";
import { BASIS_LABELS } from "../report-labels";
import type { SnapshotReading, SnapshotSweep } from "../report-snapshot";
import { countOf, formatCoverage, formatRange, stateValue } from "../report-text";
import { TYPE } from "../style";

interface HeldProps {
  held: SnapshotReading;
  sweep: SnapshotSweep;
}

function stepHzOf(sweep: SnapshotSweep, traceIndex: number | undefined): number | undefined {
  return (traceIndex === undefined ? null : sweep.traces[traceIndex]?.stepHz) ?? undefined;
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
          ? formatFrequency(line.worst.frequencyHz, stepHzOf(sweep, line.worst.traceIndex))
          : "–",
        line.worst ? formatLevel(line.worst.levelDb, reading.unit) : "–",
        line.worst ? formatLevel(line.worst.limitDb, reading.unit) : "–",
        BASIS_LABELS[line.basis],
        formatCoverage(line.coverage.fraction),
      ])}
    />
  );
}

function Suspects({ held: { reading }, sweep }: HeldProps) {
  return (
    <>
      <Label>{`Suspects (${reading.suspects.length}), the lowest margin first`}</Label>
      {reading.suspects.length === 0 ? (
        <Paragraph soft>No peak within reach of the mask stands out.</Paragraph>
      ) : (
        <Table
          columns={[
            { title: "No.", share: 0.45, kind: "number", align: "right" },
            { title: "Frequency", share: 1.35, kind: "number", align: "right" },
            { title: "Level", share: 1.35, kind: "number", align: "right" },
            { title: "Limit", share: 1.35, kind: "number", align: "right" },
            { title: "Margin", share: 1.05, kind: "number", align: "right" },
            { title: "Prominence", share: 1.15, kind: "number", align: "right" },
            { title: "Line", share: 2.75, kind: "small", longest: 24 },
            { title: "Basis", share: 1.2, kind: "small" },
          ]}
          rows={reading.suspects.map((suspect) => [
            String(suspect.number),
            formatFrequency(suspect.frequencyHz, stepHzOf(sweep, suspect.traceIndex)),
            formatLevel(suspect.levelDb, reading.unit),
            suspect.limitDb === null ? "no limit" : formatLevel(suspect.limitDb, reading.unit),
            formatMargin(suspect.marginDb),
            `${suspect.prominenceDb.toFixed(1)} dB`,
            suspect.lineName ?? "no line",
            BASIS_LABELS[suspect.basis],
          ])}
        />
      )}
    </>
  );
}

function Remeasure({ held: { reading } }: HeldProps) {
  if (reading.remeasure.length === 0) return null;
  return (
    <>
      <Label>{`To be measured again with the line’s own detector (${reading.remeasure.length})`}</Label>
      <Table
        columns={[
          { title: "Frequency", share: 1.5, kind: "number", align: "right" },
          { title: "Detector", share: 1.4 },
          { title: "Bandwidth", share: 1.3, kind: "number" },
          { title: "Line", share: 1.6, longest: 20 },
          { title: "Upper bound", share: 1.6, kind: "number", align: "right" },
          { title: "Limit", share: 1.6, kind: "number", align: "right" },
        ]}
        rows={reading.remeasure.map((point) => [
          formatFrequency(point.frequencyHz),
          DETECTOR_LABELS[point.detector],
          point.rbwHz === null ? "not stated" : formatFrequency(point.rbwHz),
          point.lineName,
          formatLevel(point.boundDb, reading.unit),
          formatLevel(point.limitDb, reading.unit),
        ])}
      />
    </>
  );
}

/** The whole reading of a sweep against one mask revision. */
export function ReadingBlock({ held, sweep }: HeldProps) {
  const { reading, mask, maskRevision } = held;
  const explained = reading.lines.filter((line) => line.explanation !== null);
  const gaps = reading.lines.map(gapText).filter((text) => text !== null);
  return (
    <>
      <SubTitle aheadPt={80}>{`Against ${mask.title}, revision ${maskRevision}`}</SubTitle>
      {reading.notComparable === null ? null : <Warning>{reading.notComparable}</Warning>}
      {reading.lines.length > 0 ? <Lines held={held} sweep={sweep} /> : null}
      <View style={{ marginTop: 4 }}>
        <Text style={TYPE.small}>
          {`Guard ${stateValue(reading.guardDb, "dB")} · reading rules version ${reading.engineVersion}`}
        </Text>
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
        <Label aheadPt={24}>{`Doubts (${reading.doubts.length})`}</Label>
      ) : null}
      {reading.notComparable === null && reading.doubts.length === 0 ? (
        <Paragraph soft>No doubt was found in what the sweep states.</Paragraph>
      ) : null}
      {reading.doubts.map((doubt, i) => (
        <DoubtLine key={i}>{doubt.text}</DoubtLine>
      ))}
      <Remeasure held={held} sweep={sweep} />
      {reading.notComparable === null ? <Suspects held={held} sweep={sweep} /> : null}
    </>
  );
}
