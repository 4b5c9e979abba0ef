import { STEP_STATE_LABELS } from "@/lib/core/delta/ladder-order";
import { STANDING_LABELS } from "@/lib/core/reading/reading";
import { formatFrequency, formatMargin } from "@/lib/core/units/format";
import { Paragraph, SectionTitle, SubTitle } from "../parts/blocks";
import type { ReportContent, SnapshotStep } from "../report-content";
import { joinWords } from "../report-text";
import { Delta } from "./delta";

/** What the step is held against, whether it stayed, and whether it is on record. */
function placeSentence({ state, base, isBranch, isOnLine, onRecord }: SnapshotStep): string {
  const held = base
    ? `Held against step ${base.position} · ${base.name}${isBranch ? ", from which it branches" : ""}.`
    : "The start of the ladder.";
  const line = state === "kept" && !isOnLine ? ", left out of the product by a later branch" : "";
  const kept = base ? ` State: ${STEP_STATE_LABELS[state]}${line}.` : "";
  const record =
    onRecord === null ? "" : onRecord ? " Its sweeps are on record." : " Not on record: a try.";
  return `${held}${kept}${record}`;
}

function standingSentence({ worst }: SnapshotStep): string | null {
  if (!worst) return null;
  const memory = worst.provenance === "from memory" ? ", from memory, not confirmed" : "";
  return `Stands ${STANDING_LABELS[worst.standing]} with ${formatMargin(worst.marginDb)} at ${formatFrequency(worst.marginAtHz)} under ${worst.maskTitle}${memory}, ${worst.lineName}.`;
}

function Step({ step }: { step: SnapshotStep }) {
  const { againstPrevious, againstStart, base, unpaired } = step;
  const isStart = base?.position === 0;
  const standing = standingSentence(step);
  return (
    <>
      <SubTitle aheadPt={116}>
        {`Step ${step.position} · ${step.name}${step.state === "dropped" ? " (dropped)" : ""}`}
      </SubTitle>
      {step.description === "" ? null : <Paragraph>{step.description}</Paragraph>}
      <Paragraph soft>{placeSentence(step)}</Paragraph>
      {standing === null ? null : <Paragraph>{standing}</Paragraph>}
      <Paragraph soft>
        {step.sweeps.length === 0 ? "No sweep in this step." : `Sweeps: ${step.sweeps.join(", ")}.`}
      </Paragraph>
      {base && againstPrevious.length === 0 ? (
        <Paragraph>{`No sweep of step ${base.position} can be set against it.`}</Paragraph>
      ) : null}
      {base && againstPrevious.length > 0 && unpaired.length > 0 ? (
        <Paragraph>{`Without a counterpart in step ${base.position}: ${joinWords(unpaired)}.`}</Paragraph>
      ) : null}
      {againstPrevious.map((delta, i) => (
        <Delta key={i} title={`Against step ${base?.position ?? 0}`} delta={delta} />
      ))}
      {isStart
        ? null
        : againstStart.map((delta, i) => <Delta key={i} title="Against step 0" delta={delta} />)}
    </>
  );
}

/** What each step changed, in full. */
export function Ladder({ ladder }: { ladder: ReportContent["ladder"] }) {
  if (!ladder) return null;
  return (
    <>
      <SectionTitle>{`Ladder · ${ladder.name}`}</SectionTitle>
      <Paragraph soft>
        Every change is after minus before. A positive change of margin is more room under the mask;
        a negative change of level is a lower level. ± is half of the 95 % interval from repeated
        sweeps; without repeats nothing is known of it.
      </Paragraph>
      {ladder.steps.map((step) => (
        <Step key={step.position} step={step} />
      ))}
    </>
  );
}
