import { Document } from "@react-pdf/renderer";
import { PageFrame } from "./parts/page-frame";
import type { ReportContent } from "./report-content";
import type { ReportState } from "./report-snapshot";
import type { SummaryFit } from "./summary-fit";
import { DecisionRule } from "./sections/decision-rule";
import { Ladder } from "./sections/ladder";
import { Masks } from "./sections/masks";
import { hasMeasureAgain, MeasureAgain } from "./sections/measure-again";
import { ItemAndPeople, Records } from "./sections/records";
import { SummaryPage } from "./sections/summary-page";
import { SweepBlock } from "./sections/sweep";
import { Together } from "./sections/together";

interface ReportDocumentProps {
  snapshot: ReportContent;
  state: ReportState;
  fit: SummaryFit;
}

/** The summary alone with an empty chart, to see whether it stays on one page. */
export function SummaryDocument({ snapshot, state, fit }: ReportDocumentProps) {
  return (
    <Document>
      <PageFrame snapshot={snapshot} state={state}>
        <SummaryPage snapshot={snapshot} fit={fit} isMeasured />
      </PageFrame>
    </Document>
  );
}

/** The whole report: a summary page, then the record it rests on. */
export function ReportDocument({ snapshot, state, fit }: ReportDocumentProps) {
  const issuedAt = new Date(snapshot.issuedAt);
  return (
    <Document
      title={`${snapshot.number} · ${snapshot.title}`}
      author={snapshot.team}
      subject={`${snapshot.program.name}, ${snapshot.build.name}`}
      keywords={state.sha256}
      creator="Neap"
      producer="Neap"
      language="en"
      creationDate={issuedAt}
      modificationDate={issuedAt}
    >
      <PageFrame snapshot={snapshot} state={state}>
        <SummaryPage snapshot={snapshot} fit={fit} />
      </PageFrame>
      <PageFrame snapshot={snapshot} state={state}>
        <ItemAndPeople snapshot={snapshot} state={state} />
        <DecisionRule snapshot={snapshot} />
        <Masks snapshot={snapshot} />
      </PageFrame>
      <PageFrame snapshot={snapshot} state={state}>
        <Together content={snapshot} />
      </PageFrame>
      {hasMeasureAgain(snapshot) ? (
        <PageFrame snapshot={snapshot} state={state}>
          <MeasureAgain content={snapshot} />
        </PageFrame>
      ) : null}
      {/* A run of pages for each sweep: laying out a run costs the square of its length. */}
      {snapshot.sweeps.map((sweep) => (
        <PageFrame key={sweep.sweepId} snapshot={snapshot} state={state}>
          <SweepBlock sweep={sweep} issuedAt={snapshot.issuedAt} />
        </PageFrame>
      ))}
      <PageFrame snapshot={snapshot} state={state}>
        <Ladder ladder={snapshot.ladder} />
        <Records snapshot={snapshot} />
      </PageFrame>
    </Document>
  );
}
