import { Text, View } from "@react-pdf/renderer";
import type { SweepDelta } from "@/lib/core/delta/delta";
import { formatDelta, formatMargin } from "@/lib/core/units/format";
import {
  DoubtLine,
  Facts,
  Label,
  Paragraph,
  SectionTitle,
  SubTitle,
  Warning,
} from "../parts/blocks";
import { StandingMark } from "../parts/marks";
import { Change } from "../parts/standing-label";
import { Table } from "../parts/table";
import type { ReportSnapshot, SnapshotStep } from "../report-snapshot";
import type { MarginChange } from "@/lib/core/delta/delta";
import type { Standing } from "@/lib/core/reading/reading";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
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
        { title: "Before", share: 1.3, align: "right" },
        { title: "After", share: 1.3, align: "right" },
        { title: "Change of margin", share: 1.3, align: "right" },
      ]}
      rows={margins.map((margin) => [
        margin.maskTitle,
        margin.lineName,
        <Stood key="b" marginDb={margin.beforeDb} standing={margin.beforeStanding} />,
        <Stood key="a" marginDb={margin.afterDb} standing={margin.afterStanding} />,
        <Change key="c" changeDb={margin.changeDb} />,
      ])}
    />
  );
}

function Delta({ title, delta }: { title: string; delta: SweepDelta }) {
  const { changes, mismatches, doubts } = delta;
  return (
    <>
      <Label>{title}</Label>
      <Paragraph soft>{`${delta.afterName}, before: ${delta.beforeName}`}</Paragraph>
      {mismatches.map(({ field, text }) => (
        <Warning key={field}>
          {`${changes ? "Accepted although it differs" : "Not comparable"}: ${text}`}
        </Warning>
      ))}
      {changes ? (
        <>
          <Paragraph>{changes.sentence}</Paragraph>
          <Facts
            facts={[
              { label: "Taken from", value: `${DETECTOR_LABELS[changes.detector]} traces` },
              { label: "Highest level", value: formatDelta(changes.peakDb), kind: "number" },
              { label: "Floor", value: formatDelta(changes.floorDb), kind: "number" },
              {
                label: changes.bandPowerIsPower ? "Band power" : "Band power, comparative sum",
                value: formatDelta(changes.bandPowerDb),
                kind: "number",
              },
            ]}
          />
          <Margins margins={changes.margins} />
          {changes.margins.map(({ note, maskTitle, lineName }, i) =>
            note === null ? null : (
              <DoubtLine key={i}>{`${maskTitle}, ${lineName}: ${note}`}</DoubtLine>
            ),
          )}
        </>
      ) : null}
      {doubts.map((doubt) => (
        <DoubtLine key={doubt}>{doubt}</DoubtLine>
      ))}
    </>
  );
}

function Step({ step }: { step: SnapshotStep }) {
  const { againstPrevious, againstStart } = step;
  const same = JSON.stringify(againstPrevious) === JSON.stringify(againstStart);
  const previous =
    same && step.position === 1 ? "Against step 0" : `Against step ${step.position - 1}`;
  return (
    <>
      <SubTitle aheadPt={116}>{`Step ${step.position} · ${step.name}`}</SubTitle>
      {step.description === "" ? null : <Paragraph>{step.description}</Paragraph>}
      <Paragraph soft>
        {step.sweeps.length === 0 ? "No sweep in this step." : `Sweeps: ${step.sweeps.join(", ")}.`}
      </Paragraph>
      {step.position > 0 && againstPrevious.length === 0 ? (
        <Paragraph>No sweep of the step before can be set against it.</Paragraph>
      ) : null}
      {againstPrevious.map((delta, i) => (
        <Delta key={i} title={previous} delta={delta} />
      ))}
      {same && step.position === 1
        ? null
        : againstStart.map((delta, i) => <Delta key={i} title="Against step 0" delta={delta} />)}
    </>
  );
}

/** What each step changed, in full. */
export function Ladder({ ladder }: { ladder: ReportSnapshot["ladder"] }) {
  if (!ladder) return null;
  return (
    <>
      <SectionTitle>{`Ladder · ${ladder.name}`}</SectionTitle>
      <Paragraph soft>
        Every change is after minus before. A positive change of margin is more room under the mask;
        a negative change of level is a lower level. No repeatability is stated for these deltas.
      </Paragraph>
      {ladder.steps.map((step) => (
        <Step key={step.position} step={step} />
      ))}
    </>
  );
}
