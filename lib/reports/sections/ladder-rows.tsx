import { Text, View } from "@react-pdf/renderer";
import type { SweepDelta } from "@/lib/core/delta/delta";
import { cameAndWent, deltaSentences, leastChange } from "../delta-words";
import { Label } from "../parts/blocks";
import { Measured } from "../parts/standing-label";
import { Table } from "../parts/table";
import { Words } from "../parts/words";
import { shorten } from "../printable";
import type { ReportContent, SnapshotStep } from "../report-content";
import { countOf } from "../report-text";
import type { SummaryFit } from "../summary-fit";
import { COLOURS, TYPE } from "../style";

function shortSentence(delta: SweepDelta, longest: number): string {
  const moved = cameAndWent(delta);
  const sentence = deltaSentences(delta, longest);
  return moved === null ? sentence : `${sentence} ${moved}.`;
}

function stepSentence({ base, againstPrevious }: SnapshotStep, longest: number): string {
  if (!base) return "The starting point.";
  if (againstPrevious.length === 0) return `No sweep of step ${base.position} matches.`;
  const sentences = [...new Set(againstPrevious.map((delta) => shortSentence(delta, longest)))];
  const more = sentences.length - 2;
  const shown = sentences.slice(0, 2).join(" ");
  return more > 0 ? `${shown} ${countOf(more, "more delta")} in the ladder table.` : shown;
}

/** Where a step stands in the ladder: taken out again, or held against another than the one before. */
function placeOf({ state, base, isBranch, isOnLine, position }: SnapshotStep): string {
  const parts = [
    state === "dropped" ? "dropped" : null,
    state === "kept" && !isOnLine ? "left out by a branch" : null,
    base && (isBranch || base.position !== position - 1) ? `against step ${base.position}` : null,
  ];
  return parts.filter((part) => part !== null).join(", ");
}

interface LadderRowsProps {
  ladder: ReportContent["ladder"];
  fit: SummaryFit;
}

/** What each step bought against the one that it is held against, one row per step. */
export function LadderRows({ ladder, fit }: LadderRowsProps) {
  if (!ladder) return null;
  const hidden = Math.max(0, ladder.steps.length - fit.steps);
  return (
    <View>
      <Label aheadPt={0}>{`What the ladder bought · ${shorten(ladder.name, 60)}`}</Label>
      {hidden > 0 ? (
        <Text style={{ ...TYPE.small, color: COLOURS.inkSoft }}>
          {`The last ${fit.steps === 1 ? "step" : `${fit.steps} steps`}; ${countOf(hidden, "earlier step")} in the ladder table.`}
        </Text>
      ) : null}
      <Table
        columns={[
          { title: "Step", share: 1.5, longest: 22 },
          { title: "Against the step it builds on", share: 3.6, kind: "small", longest: 50 },
          { title: "Least change of margin", share: 1.35, align: "right" },
        ]}
        rows={ladder.steps.slice(hidden).map((step) => {
          const change = leastChange(step.againstPrevious);
          const place = placeOf(step);
          return [
            <View key="name">
              <Words
                style={TYPE.strong}
                longest={22}
              >{`${step.position} · ${shorten(step.name, 60)}`}</Words>
              {place === "" ? null : (
                <Text style={{ ...TYPE.small, color: COLOURS.inkSoft }}>{place}</Text>
              )}
            </View>,
            stepSentence(step, fit.sentenceLength),
            change === null ? "" : <Measured key="change" change={change} />,
          ];
        })}
      />
    </View>
  );
}
