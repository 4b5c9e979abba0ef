import { Text, View } from "@react-pdf/renderer";
import { Words } from "../parts/words";
import { formatFrequency, formatLevel, formatMargin } from "@/lib/core/units/format";
import { Label } from "../parts/blocks";
import { StandingLabel } from "../parts/standing-label";
import { shorten, shortenMiddle } from "../printable";
import { BASIS_LABELS } from "../report-labels";
import type { SnapshotNotHeld } from "../report-content";
import { countOf, formatCoverage, joinWords } from "../report-text";
import type { LineSummary } from "../summarize";
import { COLOURS, STANDING_COLOURS, TYPE } from "../style";

/** Where the margin comes from, and what else has to be known to understand the standing. */
function explain(row: LineSummary): string {
  const parts: string[] = [];
  if (row.worst) {
    const { basis, decidedBy } = row.worst;
    const verb = row.standing === "undecided" ? "level of" : "decided by";
    parts.push(`${BASIS_LABELS[basis]}, ${verb} ${shortenMiddle(decidedBy, 52)}`);
  }
  if (row.coverage < 1 && !row.explanation?.includes("%"))
    parts.push(`${formatCoverage(row.coverage)} swept`);
  if (row.explanation !== null) parts.push(row.explanation);
  return parts.join(" · ");
}

function Row({ row }: { row: LineSummary }) {
  const { worst } = row;
  return (
    <View
      wrap={false}
      style={{
        flexDirection: "row",
        borderTopWidth: 0.4,
        borderTopColor: COLOURS.rule,
        paddingVertical: 2.2,
      }}
    >
      <View style={{ width: 72 }}>
        <StandingLabel standing={row.standing} />
      </View>
      <View style={{ flexBasis: 0, flexGrow: 1, paddingRight: 6 }}>
        <Words
          style={TYPE.strong}
          longest={40}
        >{`${shorten(row.maskTitle, 60)} (revision ${row.maskRevision}) · ${shorten(row.lineName, 40)}`}</Words>
        {row.mark === null ? null : (
          <Words
            style={{ ...TYPE.small, color: row.isConfirmed ? COLOURS.inkSoft : COLOURS.shoal }}
            longest={50}
          >
            {shorten(row.mark, 130)}
          </Words>
        )}
        <Words style={{ ...TYPE.small, color: COLOURS.inkSoft }} longest={50}>
          {explain(row)}
        </Words>
      </View>
      <View style={{ width: 146, alignItems: "flex-end" }}>
        <Text style={{ ...TYPE.strongNumber, fontSize: 11, color: STANDING_COLOURS[row.standing] }}>
          {formatMargin(worst?.point.marginDb ?? null)}
        </Text>
        {worst ? (
          <Text style={{ ...TYPE.number, fontSize: 7, color: COLOURS.inkSoft }}>
            {`${formatFrequency(worst.point.frequencyHz, worst.stepHz)} · ${formatLevel(worst.point.levelDb, row.unit)}`}
          </Text>
        ) : null}
      </View>
    </View>
  );
}

interface StandingRowsProps {
  rows: readonly LineSummary[];
  notHeld: readonly SnapshotNotHeld[];
  shown: number;
  sweepCount: number;
}

/** Standing and lowest margin of each mask line over the product sweeps of the report. */
export function StandingRows({ rows, notHeld, shown, sweepCount }: StandingRowsProps) {
  const more = rows.length - shown;
  return (
    <View>
      <Label
        aheadPt={0}
      >{`Standing and worst margin over ${countOf(sweepCount, "product sweep")}`}</Label>
      {rows.length === 0 ? (
        <Text style={TYPE.body}>
          No product sweep of this report was held against a mask: there is no margin to state.
        </Text>
      ) : null}
      {rows.slice(0, shown).map((row, i) => (
        <Row key={i} row={row} />
      ))}
      {more > 0 ? (
        <Text style={{ ...TYPE.small, color: COLOURS.inkSoft }}>
          {`${countOf(more, "further mask line")} on the following pages.`}
        </Text>
      ) : null}
      {notHeld.length > 0 ? (
        <Words style={{ ...TYPE.small, color: COLOURS.shoal, marginTop: 2 }} longest={60}>
          {`Not held against: ${shorten(joinWords(notHeld.map(({ title }) => title)), 200)}. No margin is known there.`}
        </Words>
      ) : null}
    </View>
  );
}
