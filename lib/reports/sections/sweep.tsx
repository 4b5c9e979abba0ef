import { View } from "@react-pdf/renderer";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency, formatLevel } from "@/lib/core/units/format";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import { Facts, Label, Paragraph, SectionTitle } from "../parts/blocks";
import { Table } from "../parts/table";
import { HOLD_LABELS } from "../report-labels";
import type { SnapshotSweep } from "../report-content";
import { linkFacts, settingFacts, sweepFacts } from "./sweep-facts";
import { ReadingBlock } from "./reading";
import { SignalPath } from "./signal-path";

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
