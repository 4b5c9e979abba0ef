import { Text, View } from "@react-pdf/renderer";
import { Label } from "../parts/blocks";
import { ShoalMark } from "../parts/marks";
import { Words } from "../parts/words";
import type { DoubtSummary } from "../doubt-summary";
import { summarizeDoubts } from "../doubt-summary";
import { shorten } from "../printable";
import type { ReportContent } from "../report-content";
import { joinWords } from "../report-text";
import { COLOURS, TYPE } from "../style";
import type { SummaryFit } from "../summary-fit";

const named = ({ name, size }: DoubtSummary) => (size === null ? name : `${name} ${size}`);

interface SummaryDoubtsProps {
  content: ReportContent;
  fit: SummaryFit;
}

/** What weakens the readings by name and number, and what could not be checked. */
export function SummaryDoubts({ content, fit }: SummaryDoubtsProps) {
  const { weakening, unchecked } = summarizeDoubts(content);
  const shown = weakening.slice(0, fit.doubts);
  const rest = weakening.slice(fit.doubts);
  const count = weakening.length + unchecked.length;
  return (
    <View>
      <Label aheadPt={0}>{`Doubts (${count})`}</Label>
      {count === 0 ? (
        <Text style={TYPE.small}>No doubt was found in what the sweeps state.</Text>
      ) : null}
      {shown.map((doubt) => (
        <View key={doubt.code} style={{ flexDirection: "row", gap: 4, marginBottom: 2 }}>
          <ShoalMark />
          <View style={{ flexBasis: 0, flexGrow: 1 }}>
            <Text style={{ ...TYPE.small, fontWeight: 600 }}>{named(doubt)}</Text>
            {fit.doubtLength === 0 ? null : (
              <Words style={{ ...TYPE.small, fontSize: 7 }} longest={28}>
                {shorten(doubt.text, fit.doubtLength)}
              </Words>
            )}
          </View>
        </View>
      ))}
      {rest.length > 0 ? (
        <Words style={TYPE.small} longest={28}>
          {`${shown.length > 0 ? "Also: " : ""}${joinWords(rest.map(named))}.`}
        </Words>
      ) : null}
      {unchecked.length > 0 ? (
        <Words style={{ ...TYPE.small, color: COLOURS.inkSoft, marginTop: 1 }} longest={28}>
          {`${unchecked.length} could not be checked: ${joinWords(unchecked.map(({ name }) => name))}.`}
        </Words>
      ) : null}
    </View>
  );
}
