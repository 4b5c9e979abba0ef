import { View } from "@react-pdf/renderer";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency, formatLevel } from "@/lib/core/units/format";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import { Facts, Label, Paragraph, SectionTitle, Warning } from "../parts/blocks";
import { Table } from "../parts/table";
import { HOLD_LABELS, NOT_STATED, TRANSDUCER_LABELS } from "../report-labels";
import type { SnapshotSweep } from "../report-snapshot";
import { linkFacts, settingFacts, sweepFacts } from "./sweep-facts";
import { ReadingBlock } from "./reading";

type Transducer = SnapshotSweep["bench"]["transducers"][number];

function isOverdue({ dueOn }: Transducer, day: string): boolean {
  return dueOn !== null && dueOn.slice(0, 10) < day;
}

function SignalPath({ sweep, issuedAt }: { sweep: SnapshotSweep; issuedAt: string }) {
  const { transducers, signalPathRevision } = sweep.bench;
  const day = (sweep.measuredOn ?? issuedAt).slice(0, 10);
  const dayName = sweep.measuredOn === null ? "the date of issue" : "the date of the sweep";
  const overdue = transducers.filter((transducer) => isOverdue(transducer, day));
  return (
    <>
      <Label>{`Signal path, revision ${signalPathRevision}, from the field to the instrument`}</Label>
      {sweep.corrected ? (
        <Paragraph soft>
          The instrument had applied the transducer factors itself; the signal path passed the
          levels through.
        </Paragraph>
      ) : null}
      {overdue.length > 0 ? (
        <Warning>{`Calibration overdue on ${dayName}: ${overdue.map(({ name }) => name).join(", ")}.`}</Warning>
      ) : null}
      {transducers.length === 0 ? (
        <Paragraph soft>The signal path holds no transducers: no factor was applied.</Paragraph>
      ) : (
        <Table
          columns={[
            { title: "No.", share: 0.4, kind: "number" },
            { title: "Transducer", share: 3, longest: 34 },
            { title: "Kind", share: 1.5 },
            { title: "Calibrated", share: 1.2, kind: "number" },
            { title: "Due", share: 1.2, kind: "number" },
            { title: "State", share: 1.1 },
          ]}
          rows={transducers.map((transducer, i) => [
            String(i + 1),
            transducer.name,
            TRANSDUCER_LABELS[transducer.kind],
            transducer.calibratedOn ?? NOT_STATED,
            transducer.dueOn ?? NOT_STATED,
            transducer.dueOn === null
              ? NOT_STATED
              : isOverdue(transducer, day)
                ? "OVERDUE"
                : "in date",
          ])}
        />
      )}
    </>
  );
}

function Traces({ sweep }: { sweep: SnapshotSweep }) {
  return (
    <>
      <Label>Traces, levels after the signal path</Label>
      <Table
        columns={[
          { title: "Trace", share: 1.6, longest: 18 },
          { title: "Detector, hold", share: 1.75 },
          { title: "Span", share: 2.35, kind: "number" },
          { title: "Points", share: 0.8, kind: "number", align: "right" },
          { title: "Step", share: 1.1, kind: "number", align: "right" },
          { title: "Highest level", share: 2.9, kind: "number", align: "right" },
        ]}
        rows={sweep.traces.map((trace) => [
          trace.kind === "spots" ? `${trace.name} (spots)` : trace.name,
          `${trace.detector === null ? "detector not stated" : DETECTOR_LABELS[trace.detector]}, ${HOLD_LABELS[trace.hold]}`,
          `${formatFrequency(trace.firstHz)} to ${formatFrequency(trace.lastHz)}`,
          String(trace.points),
          trace.stepHz === null ? "none" : formatFrequency(trace.stepHz),
          trace.maxDb === null || trace.maxAtHz === null
            ? `no level, ${LEVEL_UNIT_LABELS[trace.unit]}`
            : `${formatLevel(trace.maxDb, trace.unit)} at ${formatFrequency(trace.maxAtHz, trace.stepHz ?? undefined)}`,
        ])}
      />
    </>
  );
}

/** Everything that is known of one sweep, and its readings. */
export function SweepBlock({ sweep, issuedAt }: { sweep: SnapshotSweep; issuedAt: string }) {
  return (
    <>
      <SectionTitle>{`Sweep · ${sweep.name}`}</SectionTitle>
      <Facts facts={sweepFacts(sweep)} />
      <Label>Settings</Label>
      <Facts facts={settingFacts(sweep)} />
      <Label>Link settings</Label>
      <Facts facts={linkFacts(sweep.link)} />
      <SignalPath sweep={sweep} issuedAt={issuedAt} />
      <Traces sweep={sweep} />
      {sweep.readings.length === 0 ? (
        <View style={{ marginTop: 8 }}>
          <Paragraph>
            This sweep was not held against a mask: it has no margin and no standing.
          </Paragraph>
        </View>
      ) : null}
      {sweep.readings.map((held, i) => (
        <ReadingBlock key={i} held={held} sweep={sweep} />
      ))}
    </>
  );
}
