import { Text, View } from "@react-pdf/renderer";
import { Words } from "../parts/words";
import type { SweepDelta } from "@/lib/core/delta/delta";
import { Label } from "../parts/blocks";
import { Change } from "../parts/standing-label";
import { Table } from "../parts/table";
import { shorten } from "../printable";
import type { ReportSnapshot, SnapshotStep } from "../report-snapshot";
import { countOf } from "../report-text";
import type { SummaryFit } from "../summary-fit";
import { COLOURS, TYPE } from "../style";

/** The smallest change of margin over lines and sweeps: what the step bought at the least. */
function leastChangeDb(deltas: readonly SweepDelta[]): number | null {
  const changes = deltas
    .flatMap((delta) => delta.changes?.margins ?? [])
    .flatMap(({ changeDb }) => (changeDb === null ? [] : [changeDb]));
  return changes.length === 0 ? null : Math.min(...changes);
}

/** Sentence of one delta; a mismatch is always said, even one that somebody accepted. */
function deltaSentence({ mismatches, changes }: SweepDelta): string {
  const reasons = mismatches.map(({ text }) => text).join(" ");
  if (!changes) return `Not comparable: ${reasons}`;
  return reasons === "" ? changes.sentence : `${changes.sentence} Accepted although ${reasons}`;
}

function stepSentence({ position, againstPrevious }: SnapshotStep, longest: number): string {
  if (position === 0) return "The starting point.";
  if (againstPrevious.length === 0) return "No sweep of the step before can be set against it.";
  const sentences = [...new Set(againstPrevious.map(deltaSentence))];
  const more = sentences.length - 2;
  const shown = sentences.slice(0, 2).map((sentence) => shorten(sentence, longest));
  return more > 0
    ? `${shown.join(" ")} ${countOf(more, "more delta")} in the ladder table.`
    : shown.join(" ");
}

interface LadderRowsProps {
  ladder: ReportSnapshot["ladder"];
  fit: SummaryFit;
}

/** What each step bought against the one before, one row per step. */
export function LadderRows({ ladder, fit }: LadderRowsProps) {
  if (!ladder) return null;
  const hidden = Math.max(0, ladder.steps.length - fit.steps);
  return (
    <View>
      <Label aheadPt={0}>{`What the ladder bought · ${shorten(ladder.name, 60)}`}</Label>
      {hidden > 0 ? (
        <Text style={{ ...TYPE.small, color: COLOURS.inkSoft }}>
          {`The last ${fit.steps} steps; ${countOf(hidden, "earlier step")} in the ladder table.`}
        </Text>
      ) : null}
      <Table
        columns={[
          { title: "Step", share: 1.5, longest: 22 },
          { title: "Against the step before", share: 3.6, kind: "small", longest: 50 },
          { title: "Least change of margin", share: 1.25, align: "right" },
        ]}
        rows={ladder.steps
          .slice(hidden)
          .map((step) => [
            <Words
              key="name"
              style={TYPE.strong}
              longest={22}
            >{`${step.position} · ${shorten(step.name, 60)}`}</Words>,
            stepSentence(step, fit.sentenceLength),
            leastChangeDb(step.againstPrevious) === null ? (
              ""
            ) : (
              <Change key="change" changeDb={leastChangeDb(step.againstPrevious)} />
            ),
          ])}
      />
    </View>
  );
}
