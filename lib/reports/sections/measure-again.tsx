import { View } from "@react-pdf/renderer";
import type { RemeasurePoint } from "@/lib/core/reading/reading";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency, formatLevel } from "@/lib/core/units/format";
import { Paragraph, SectionTitle, SubTitle, Warning } from "../parts/blocks";
import { Table } from "../parts/table";
import type { ReportContent, SnapshotCombined, SnapshotSweep } from "../report-content";
import { NOT_STATED } from "../report-labels";
import { countOf, stateValue } from "../report-text";
import { nameWithPosition, sweepOfPart } from "../summarize";

const polarizationOf = (sweep: SnapshotSweep) =>
  sweep.settings.port === "radiated" ? (sweep.settings.polarization ?? NOT_STATED) : "–";

function rowOf(point: RemeasurePoint, sweep: SnapshotSweep | undefined, unit: string) {
  const { detector, rbwHz, lineName, frequencyHz } = point;
  const stepHz = sweep?.traces[point.traceIndex]?.stepHz ?? undefined;
  return [
    formatFrequency(frequencyHz, stepHz),
    DETECTOR_LABELS[detector],
    rbwHz === null ? NOT_STATED : formatFrequency(rbwHz),
    lineName,
    sweep ? polarizationOf(sweep) : NOT_STATED,
    stateValue(sweep?.settings.heightM ?? null, "m"),
    stateValue(sweep?.settings.azimuthDeg ?? null, "°"),
    unit,
  ];
}

function List({ content, combined }: { content: ReportContent; combined: SnapshotCombined }) {
  const { reading, mask, maskRevision } = combined;
  const { remeasure, remeasureOmitted } = reading;
  const parts = [...new Set(remeasure.map(({ partIndex }) => partIndex))].sort((a, b) => a - b);
  return (
    <>
      <SubTitle aheadPt={110}>{`${mask.title} · revision ${maskRevision}`}</SubTitle>
      {parts.map((part) => {
        const sweep = sweepOfPart(content, combined, part);
        const own = remeasure.filter(({ partIndex }) => partIndex === part);
        const distance = sweep ? stateValue(sweep.settings.distanceM, "m") : NOT_STATED;
        return (
          <View key={part} style={{ marginTop: 4 }}>
            <Paragraph soft>
              {sweep
                ? `${countOf(own.length, "point")} of ${nameWithPosition(sweep)} · bench ${sweep.bench.name}, distance ${distance}`
                : countOf(own.length, "point")}
            </Paragraph>
            <Table
              columns={[
                { title: "Frequency", share: 1.35, kind: "number", align: "right" },
                { title: "Detector", share: 1.05, kind: "small" },
                { title: "RBW", share: 1.15, kind: "number" },
                { title: "Line", share: 1.1, kind: "small", longest: 16 },
                { title: "Polarization", share: 1.1, kind: "small" },
                { title: "Height", share: 0.8, kind: "small" },
                { title: "Azimuth", share: 0.8, kind: "small" },
                { title: "Bound / limit", share: 1.95, kind: "number", align: "right" },
              ]}
              rows={own.map((point) =>
                rowOf(
                  point,
                  sweep,
                  `${point.boundDb.toFixed(1)} / ${formatLevel(point.limitDb, reading.unit)}`,
                ),
              )}
            />
          </View>
        );
      })}
      {remeasureOmitted > 0 ? (
        <Warning>
          {`${countOf(remeasureOmitted, "further point")} left out, each with more room than those listed: a scan with the line’s own detector is quicker than spots.`}
        </Warning>
      ) : null}
    </>
  );
}

/** Whether anything is to be measured again before it can be decided. */
export function hasMeasureAgain({ combined }: Pick<ReportContent, "combined">): boolean {
  return combined.some(({ reading }) => reading.remeasure.length > 0);
}

/** What to take to the bench: every point that only a line's own detector can decide. */
export function MeasureAgain({ content }: { content: ReportContent }) {
  return (
    <>
      <SectionTitle>Measure again</SectionTitle>
      <Paragraph>
        An upper bound lies over the mask at these points: a looser detector reads above the line.
        Measure each with the detector and bandwidth of the line, in the position of the sweep, and
        import the readings as spots.
      </Paragraph>
      {content.combined
        .filter(({ reading }) => reading.remeasure.length > 0)
        .map((combined) => (
          <List key={combined.maskRevisionId} content={content} combined={combined} />
        ))}
    </>
  );
}
