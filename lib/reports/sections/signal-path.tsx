import { dueState } from "@/lib/core/bench/due-state";
import { Label, Paragraph, Warning } from "../parts/blocks";
import { Table } from "../parts/table";
import { NOT_STATED, TRANSDUCER_LABELS } from "../report-labels";
import type { SnapshotInstrument, SnapshotSweep } from "../report-content";

/** How the calibration stood on the day that counts. */
function stateText({ dueOn }: SnapshotInstrument, day: string): string {
  const state = dueState(dueOn, day);
  if (state === "undated") return NOT_STATED;
  if (state === "overdue") return "OVERDUE";
  return state === "due-soon" ? "in date, due soon" : "in date";
}

/** The instrument and every transducer with its calibration, those overdue marked. */
export function SignalPath({ sweep, issuedAt }: { sweep: SnapshotSweep; issuedAt: string }) {
  const { transducers, signalPathRevision, calibration } = sweep.bench;
  const day = (sweep.measuredOn ?? issuedAt).slice(0, 10);
  const dayName = sweep.measuredOn === null ? "the date of issue" : "the date of the sweep";
  const rows = [
    ...transducers.map((one) => ({ ...one, kindName: TRANSDUCER_LABELS[one.kind] })),
    ...(calibration ? [{ ...calibration, kindName: "instrument" }] : []),
  ];
  const overdue = rows.filter(({ dueOn }) => dueState(dueOn, day) === "overdue");
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
      ) : null}
      {calibration ? null : (
        <Paragraph soft>The bench named no instrument with a calibration at the import.</Paragraph>
      )}
      {rows.length === 0 ? null : (
        <Table
          columns={[
            { title: "No.", share: 0.4, kind: "number" },
            { title: "Transducer or instrument", share: 3, longest: 34 },
            { title: "Kind", share: 1.5 },
            { title: "Calibrated", share: 1.2, kind: "number" },
            { title: "Due", share: 1.2, kind: "number" },
            { title: "State", share: 1.3 },
          ]}
          rows={rows.map((one, i) => [
            String(i + 1),
            one.name,
            one.kindName,
            one.calibratedOn ?? NOT_STATED,
            one.dueOn ?? NOT_STATED,
            stateText(one, day),
          ])}
        />
      )}
    </>
  );
}
