import { Text, View } from "@react-pdf/renderer";
import { formatMargin } from "@/lib/core/units/format";
import { Words } from "../parts/words";
import { CoastChart } from "../chart/coast-chart";
import { shorten } from "../printable";
import { DEFERRAL, NOT_STATED } from "../report-labels";
import type { ReportContent } from "../report-content";
import { formatInstant, joinWords } from "../report-text";
import { decidingReading, productSweeps, summarizeLines } from "../summarize";
import { COLOURS, PAPER_SIZES, TYPE } from "../style";
import type { SummaryFit } from "../summary-fit";
import { SummaryDoubts } from "./summary-doubts";
import { StandingRows } from "./standing-rows";
import { LadderRows } from "./ladder-rows";
import { WorstSuspects } from "./worst-suspects";

function measuredOn(snapshot: ReportContent): string {
  const dates = productSweeps(snapshot).map((sweep) => sweep.measuredOn ?? NOT_STATED);
  const known = [...new Set(dates.filter((date) => date !== NOT_STATED))].sort();
  if (known.length === 0) return NOT_STATED;
  const span = known.length === 1 ? known[0] : `${known[0]} to ${known.at(-1)}`;
  const unstated = dates.filter((date) => date === NOT_STATED).length;
  return unstated > 0 ? `${span}, ${unstated} ${NOT_STATED}` : `${span}`;
}

interface SummaryProps {
  snapshot: ReportContent;
  fit: SummaryFit;
}

function Masthead({ snapshot, fit }: SummaryProps) {
  const { program, build } = snapshot;
  const benches = [...new Set(productSweeps(snapshot).map(({ bench }) => bench.name))];
  const facts = [
    ["Program and build", `${shorten(program.name, 48)}, ${shorten(build.name, 60)}`],
    ["Measured", measuredOn(snapshot)],
    ["Bench", benches.length === 0 ? NOT_STATED : shorten(joinWords(benches), 80)],
    ["Target margin", formatMargin(program.targetMarginDb)],
  ] as const;
  return (
    <View>
      <View style={{ flexDirection: "row", justifyContent: "space-between", marginBottom: 3 }}>
        <Text style={TYPE.label}>{`Neap emission report · ${shorten(snapshot.team, 60)}`}</Text>
        <View style={{ flexDirection: "row", gap: 8, alignItems: "flex-end" }}>
          {snapshot.replaces === null ? null : (
            <Text style={{ ...TYPE.small, color: COLOURS.inkSoft }}>
              {`replaces ${shorten(snapshot.replaces, 40)}`}
            </Text>
          )}
          <Text style={TYPE.strongNumber}>{snapshot.number}</Text>
        </View>
      </View>
      <Words
        style={{ ...TYPE.h1, fontSize: snapshot.title.length > 56 ? 17 : 21, marginBottom: 6 }}
        longest={40}
      >
        {snapshot.title}
      </Words>
      <View style={{ flexDirection: "row", marginBottom: 6 }}>
        {facts.map(([label, value], i) => (
          <View
            key={label}
            style={{ flexBasis: 0, flexGrow: i % 2 === 0 ? 3 : 1.7, paddingRight: 12 }}
          >
            <Text style={TYPE.label}>{label}</Text>
            <Words style={TYPE.body} longest={i % 2 === 0 ? 28 : 16}>
              {value}
            </Words>
          </View>
        ))}
      </View>
      {snapshot.summary.trim() === "" ? null : (
        <Words style={{ ...TYPE.body, fontSize: 9.2, marginBottom: 5, maxWidth: 470 }} longest={70}>
          {shorten(snapshot.summary.trim().replaceAll(/\s+/g, " "), fit.summaryLength)}
        </Words>
      )}
    </View>
  );
}

/** The page that a lab or a manager reads in a minute. */
export function SummaryPage({
  snapshot,
  fit,
  isMeasured = false,
}: SummaryProps & { isMeasured?: boolean }) {
  const deciding = decidingReading(snapshot);
  const rows = summarizeLines(snapshot);
  return (
    <View>
      <Masthead snapshot={snapshot} fit={fit} />
      <StandingRows
        rows={rows}
        notHeld={snapshot.notHeld}
        shown={fit.rows}
        sweepCount={productSweeps(snapshot).length}
      />
      {deciding ? (
        <View style={{ marginTop: 8 }}>
          <CoastChart
            deciding={deciding}
            widthPt={PAPER_SIZES[snapshot.paper].widthPt}
            heightPt={fit.chartHeightPt}
            isMeasured={isMeasured}
          />
        </View>
      ) : null}
      <View style={{ flexDirection: "row", gap: 16 }}>
        <View style={{ flexBasis: 0, flexGrow: 1.5 }}>
          <WorstSuspects content={snapshot} deciding={deciding} fit={fit} />
        </View>
        <View style={{ flexBasis: 0, flexGrow: 1 }}>
          <SummaryDoubts content={snapshot} fit={fit} />
        </View>
      </View>
      <LadderRows ladder={snapshot.ladder} fit={fit} />
      <View
        wrap={false}
        style={{
          marginTop: 8,
          borderWidth: 0.8,
          borderColor: COLOURS.deep,
          paddingVertical: 5,
          paddingHorizontal: 8,
        }}
      >
        <Text style={TYPE.strong}>{DEFERRAL}</Text>
        <Text style={TYPE.small}>
          {`This report relates only to the item tested. Issued ${formatInstant(snapshot.issuedAt)} by ${shorten(snapshot.issuedBy, 60)}.`}
        </Text>
      </View>
    </View>
  );
}
