import { Text, View } from "@react-pdf/renderer";
import type {
  DetectorChange,
  MarginChange,
  SuspectChange,
  SuspectChanges,
  SweepDelta,
} from "@/lib/core/delta/delta";
import type { Standing } from "@/lib/core/reading/reading";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency, formatMargin } from "@/lib/core/units/format";
import { acceptedText } from "../delta-words";
import { DoubtLine, Label, Paragraph, Warning } from "../parts/blocks";
import { StandingMark } from "../parts/marks";
import { Measured } from "../parts/standing-label";
import { Table } from "../parts/table";
import { countOf } from "../report-text";
import { TYPE } from "../style";

function Stood({ marginDb, standing }: { marginDb: number | null; standing: Standing }) {
  return (
    <View style={{ flexDirection: "row", alignItems: "center", gap: 4 }}>
      <StandingMark standing={standing} sizePt={7.5} />
      <Text style={TYPE.number}>{formatMargin(marginDb)}</Text>
    </View>
  );
}

function Margins({ margins }: { margins: readonly MarginChange[] }) {
  if (margins.length === 0) return <Paragraph soft>No mask line holds for both sweeps.</Paragraph>;
  return (
    <Table
      columns={[
        { title: "Mask", share: 2.4, longest: 30 },
        { title: "Line", share: 1.4, longest: 18 },
        { title: "Before", share: 1.25, align: "right" },
        { title: "After", share: 1.25, align: "right" },
        { title: "Change of margin", share: 1.6, align: "right" },
      ]}
      rows={margins.map((margin) => [
        margin.maskTitle,
        margin.lineName,
        <Stood key="b" marginDb={margin.beforeDb} standing={margin.beforeStanding} />,
        <Stood key="a" marginDb={margin.afterDb} standing={margin.afterStanding} />,
        <Measured key="c" change={margin} />,
      ])}
    />
  );
}

function Levels({ levels }: { levels: readonly DetectorChange[] }) {
  if (levels.length === 0) return null;
  return (
    <Table
      columns={[
        { title: "Change of levels, detector", share: 2.2 },
        { title: "Highest level", share: 1.6, align: "right" },
        { title: "Floor", share: 1.6, align: "right" },
        { title: "Band power", share: 1.6, align: "right" },
        { title: "", share: 1.3, kind: "small" },
      ]}
      rows={levels.map(({ detector, peak, floor, bandPower, bandPowerIsPower }) => [
        `${DETECTOR_LABELS[detector]} traces`,
        <Measured key="p" change={peak} />,
        <Measured key="f" change={floor} />,
        <Measured key="b" change={bandPower} />,
        bandPowerIsPower ? "power" : "comparative sum",
      ])}
    />
  );
}

/** Of each kind; a lab reads the highest, and the ladder's own page lists them all. */
const MOST_SUSPECTS = 4;

const levelText = (db: number | null) => (db === null ? "not swept" : db.toFixed(1));

function suspectRow(state: string, { detector, frequencyHz, ...change }: SuspectChange) {
  return [
    state,
    formatFrequency(frequencyHz),
    DETECTOR_LABELS[detector],
    levelText(change.beforeDb),
    levelText(change.afterDb),
    <Measured key="change" change={change} />,
  ];
}

/** The few for which `sizeOf` is largest. */
function foremost(
  changes: readonly SuspectChange[],
  sizeOf: (change: SuspectChange) => number | null,
): SuspectChange[] {
  const size = (change: SuspectChange) => sizeOf(change) ?? Number.NEGATIVE_INFINITY;
  return [...changes].sort((a, b) => size(b) - size(a)).slice(0, MOST_SUSPECTS);
}

/**
 * The highest suspects that came and went and those that moved most, each with its change in one
 * window on both sides.
 */
function SuspectTable({ suspects: { fresh, gone, followed } }: { suspects: SuspectChanges }) {
  const listed = [
    ...foremost(fresh, (one) => one.afterDb).map((one) => suspectRow("new", one)),
    ...foremost(gone, (one) => one.beforeDb).map((one) => suspectRow("gone", one)),
    ...foremost(followed, (one) => Math.abs(one.changeDb ?? 0)).map((one) =>
      suspectRow("on both sides", one),
    ),
  ];
  if (listed.length === 0) return null;
  const more = fresh.length + gone.length + followed.length - listed.length;
  const title = `Suspects: ${fresh.length} new, ${gone.length} gone, ${followed.length} on both sides`;
  return (
    <>
      <Label>{title}</Label>
      <Table
        columns={[
          { title: "Suspect", share: 1.2 },
          { title: "Frequency", share: 1.4, kind: "number", align: "right" },
          { title: "Detector", share: 1.2 },
          { title: "Level before", share: 1.1, kind: "number", align: "right" },
          { title: "Level after", share: 1.1, kind: "number", align: "right" },
          { title: "Change of level", share: 1.7, align: "right" },
        ]}
        rows={listed}
      />
      {more > 0 ? (
        <Text style={TYPE.small}>
          {`${countOf(more, "further suspect")} not listed: of each kind the highest, or those that moved most.`}
        </Text>
      ) : null}
    </>
  );
}

/** One delta in full: what forbids it or was accepted, what changed, and what weakens it. */
export function Delta({ title, delta }: { title: string; delta: SweepDelta }) {
  const { changes, mismatches, accepted, doubts } = delta;
  return (
    <>
      <Label>{title}</Label>
      <Paragraph soft>{`${delta.afterName}, before: ${delta.beforeName}`}</Paragraph>
      {mismatches.map(({ field, text }) => (
        <Warning key={field}>
          {`${changes ? "Accepted although it differs" : "Not comparable"}: ${text}`}
        </Warning>
      ))}
      {accepted ? <Paragraph>{acceptedText(accepted)}</Paragraph> : null}
      {changes ? (
        <>
          <Paragraph>{changes.sentence}</Paragraph>
          <Paragraph soft>{changes.repeatability}</Paragraph>
          <Margins margins={changes.margins} />
          {changes.margins.map(({ note, maskTitle, lineName }, i) =>
            note === null ? null : (
              <DoubtLine key={i}>{`${maskTitle}, ${lineName}: ${note}`}</DoubtLine>
            ),
          )}
          <View style={{ marginTop: 4 }}>
            <Levels levels={changes.levels} />
          </View>
          <SuspectTable suspects={changes.suspects} />
        </>
      ) : null}
      {doubts.map((doubt) => (
        <DoubtLine key={doubt}>{doubt}</DoubtLine>
      ))}
    </>
  );
}
