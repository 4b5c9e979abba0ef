import type { ReactNode } from "react";
import { Page, Text, View } from "@react-pdf/renderer";
import { Words } from "./words";
import type { ReportContent } from "../report-content";
import type { ReportState } from "../report-snapshot";
import { DEFERRAL, NOT_STATED } from "../report-labels";
import { formatInstant } from "../report-text";
import { COLOURS, PAGE_MARGIN_PT, PAPER_SIZES, TYPE } from "../style";

interface Framed {
  snapshot: Pick<ReportContent, "number" | "paper" | "issuedAt" | "issuedBy">;
  state: ReportState;
}

function on(by: string | null, at: string | null): string {
  return `by ${by ?? NOT_STATED} on ${at === null ? NOT_STATED : formatInstant(at)}`;
}

function bandText({ snapshot, state }: Framed): string {
  switch (state.state) {
    case "issued":
      return `Issued ${on(snapshot.issuedBy, snapshot.issuedAt)} · not yet approved`;
    case "approved":
      return `Approved ${on(state.approvedBy, state.approvedAt)} · issued ${on(snapshot.issuedBy, snapshot.issuedAt)}`;
    case "withdrawn":
      return `WITHDRAWN ${on(state.withdrawnBy, state.withdrawnAt)}. Reason: ${state.withdrawnReason ?? NOT_STATED}`;
  }
}

function StateBand(props: Framed) {
  const { state } = props.state;
  const loud = state === "withdrawn";
  return (
    <View
      fixed
      style={{
        backgroundColor: loud
          ? COLOURS.ink
          : state === "approved"
            ? COLOURS.water2
            : COLOURS.water1,
        borderLeftWidth: 3,
        borderLeftColor: loud ? COLOURS.ink : COLOURS.deep,
        paddingVertical: loud ? 6 : 3.5,
        paddingHorizontal: 8,
        marginBottom: 10,
      }}
    >
      <Words
        style={{
          ...TYPE.strong,
          fontSize: loud ? 9.6 : 8,
          color: loud ? COLOURS.sheet : COLOURS.ink,
        }}
        longest={70}
      >
        {bandText(props)}
      </Words>
    </View>
  );
}

const FOOTER_HEIGHT_PT = 30;

/**
 * Each text is placed by itself and from the top: what is nested or placed from the bottom moves or
 * vanishes when React-pdf lays a page out again for its number.
 */
function Footer({ snapshot, state }: Framed) {
  const { heightPt } = PAPER_SIZES[snapshot.paper];
  const top = heightPt - 24 - FOOTER_HEIGHT_PT;
  const small = { ...TYPE.number, fontSize: 6.4, color: COLOURS.inkSoft, marginTop: 0 };
  const place = { position: "absolute" as const };
  const left = { ...place, left: PAGE_MARGIN_PT };
  const right = { ...place, right: PAGE_MARGIN_PT, width: 140, textAlign: "right" as const };
  return (
    <>
      <View
        fixed
        style={{
          position: "absolute",
          top,
          left: PAGE_MARGIN_PT,
          right: PAGE_MARGIN_PT,
          height: 1,
          borderTopWidth: 0.8,
          borderTopColor: COLOURS.rule,
        }}
      />
      <Text fixed style={{ ...TYPE.small, fontWeight: 500, ...left, top: top + 5 }}>
        {DEFERRAL}
      </Text>
      <Text
        fixed
        style={{ ...TYPE.number, fontSize: 7.4, marginTop: 0, ...right, top: top + 5.5 }}
        render={({ pageNumber, totalPages }) => `page ${pageNumber} of ${totalPages}`}
      />
      <Text fixed style={{ ...small, ...left, top: top + 18 }}>
        {`content SHA-256 ${state.sha256}`}
      </Text>
      <Text fixed style={{ ...small, color: COLOURS.ink, ...right, top: top + 18 }}>
        {snapshot.number}
      </Text>
    </>
  );
}

/** A run of pages: state on top, number, hash, page and deferral at the foot of each. */
export function PageFrame({ children, ...framed }: Framed & { children: ReactNode }) {
  return (
    <Page
      size={PAPER_SIZES[framed.snapshot.paper].size}
      style={{
        ...TYPE.body,
        color: COLOURS.ink,
        backgroundColor: COLOURS.sheet,
        paddingTop: 30,
        paddingBottom: 62,
        paddingHorizontal: PAGE_MARGIN_PT,
      }}
    >
      <StateBand {...framed} />
      {children}
      <Footer {...framed} />
    </Page>
  );
}
