import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { Overlay } from "@/components/ladders/overlay";
import { Rung } from "@/components/ladders/rung";
import { StepForm } from "@/components/ladders/step-form";
import { Waterfall } from "@/components/ladders/waterfall";
import { ActionButton } from "@/components/ui/action-button";
import { ButtonLink } from "@/components/ui/button";
import { ConfirmButton } from "@/components/ui/confirm-button";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { formatMargin } from "@/lib/core/units/format";
import type { LadderDetail } from "@/lib/queries/ladder/load-ladder-steps";
import { readLadder } from "@/lib/queries/ladder/read-ladder";
import {
  acceptDifference,
  appendStep,
  changeStep,
  fetchLadderBack,
  markStep,
  putLadderAside,
  putStepOnRecord,
  putStepsInOrder,
  takeAcceptanceBack,
  takeStepAway,
} from "../actions";
import { chooseOverlay, overlaySweeps } from "./prepare-overlay";
import { ladderAnswer, rungOf, waterfallsOf } from "./prepare-steps";

export const metadata: Metadata = { title: "Ladder" };

export default async function LadderPage(props: { params: Promise<{ ladderId: string }> }) {
  const { ladderId } = await props.params;
  const ctx = await currentContext();
  const ladder = await readLadder(ctx, ladderId);
  if (!ladder) notFound();
  const mayWrite = isAllowed(ctx, "sweep.write") && ladder.archivedAt === null;
  const answer = ladderAnswer(ladder.steps);
  const overlay = chooseOverlay(ladder);
  const bought = ladder.steps.length > 1 ? waterfallsOf(ladder) : [];
  const order = ladder.steps.map(({ id, position, name, branchOfId }) => ({
    id,
    position,
    name,
    branchOfId,
  }));
  return (
    <>
      <PageHead
        title={ladder.name}
        trail={[
          { href: `/programs/${ladder.programId}`, label: ladder.programName },
          {
            href: `/programs/${ladder.programId}/builds/${ladder.buildId}`,
            label: ladder.buildName,
          },
        ]}
        lead={ladder.notes}
        actions={<LadderActions ladder={ladder} mayWrite={isAllowed(ctx, "sweep.write")} />}
      />
      {ladder.archivedAt ? (
        <p className="mb-4 border-l-4 border-shoal bg-shoal-bed px-3 py-2">
          This ladder is archived.
        </p>
      ) : null}
      {answer ? (
        <div>
          <p className="font-mono text-5xl tracking-tight whitespace-nowrap">
            {formatMargin(answer.changeDb)}
          </p>
          <p className="mt-1 text-ink-soft">{answer.text}</p>
        </div>
      ) : (
        <p className="text-lg">
          {ladder.steps.length < 2
            ? "A ladder tells what a step bought once there are two steps with sweeps."
            : "The product as it stands cannot be compared with step 0: what follows says what each step bought against the one that it starts from, and why a delta is missing."}
        </p>
      )}
      {bought.length > 0 ? (
        <Section
          title="What each step bought"
          lead="Worst margin from step 0 to the product as it stands. Each step is held against the last kept one before it, or against the one that it starts from."
        >
          <Waterfall lines={bought} targetDb={ladder.targetMarginDb} />
        </Section>
      ) : null}
      {overlay ? (
        <Section title="Before and after">
          <Overlay
            sweeps={overlaySweeps(ladder.steps)}
            before={overlay.before}
            after={overlay.after}
            masks={ladder.masks}
          />
        </Section>
      ) : null}
      <Section title="Steps">
        <ol className="ml-4">
          {ladder.steps.map((step) => (
            <Rung
              key={step.id}
              step={rungOf(step)}
              steps={order}
              buildId={ladder.buildId}
              mayWrite={mayWrite}
              fromMemory={ladder.fromMemory}
              actions={{
                edit: changeStep,
                remove: takeStepAway,
                record: putStepOnRecord,
                mark: markStep,
                reorder: putStepsInOrder.bind(null, ladder.id),
                accept: acceptDifference,
                withdraw: takeAcceptanceBack,
              }}
            />
          ))}
        </ol>
      </Section>
      {mayWrite ? (
        <Section title="Add a step">
          <StepForm
            action={appendStep}
            about={{ ladderId: ladder.id }}
            earlier={order}
            label="Add step"
          />
        </Section>
      ) : null}
    </>
  );
}

function LadderActions({ ladder, mayWrite }: { ladder: LadderDetail; mayWrite: boolean }) {
  if (!mayWrite) return null;
  if (ladder.archivedAt)
    return <ActionButton action={fetchLadderBack.bind(null, ladder.id)}>Restore</ActionButton>;
  return (
    <>
      <ButtonLink href={`/ladders/${ladder.id}/edit`}>Edit</ButtonLink>
      <ConfirmButton
        label="Archive"
        title="Archive this ladder?"
        confirmLabel="Archive"
        action={putLadderAside.bind(null, ladder.id)}
      >
        It leaves the build&rsquo;s list. Its sweeps stay where they are, and it can be restored
        from its own page.
      </ConfirmButton>
    </>
  );
}
