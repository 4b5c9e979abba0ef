import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { DeltaBars } from "@/components/charts/delta-bars";
import { Overlay } from "@/components/ladders/overlay";
import { Rung } from "@/components/ladders/rung";
import { StepForm } from "@/components/ladders/step-form";
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
  appendStep,
  changeStep,
  fetchLadderBack,
  putLadderAside,
  putStepOnRecord,
  takeStepAway,
} from "../actions";
import { chooseOverlay, overlaySweeps } from "./prepare-overlay";
import { boughtPerLine, ladderAnswer } from "./prepare-steps";

export const metadata: Metadata = { title: "Ladder" };

export default async function LadderPage(props: { params: Promise<{ ladderId: string }> }) {
  const { ladderId } = await props.params;
  const ctx = await currentContext();
  const ladder = await readLadder(ctx, ladderId);
  if (!ladder) notFound();
  const mayWrite = isAllowed(ctx, "sweep.write") && ladder.archivedAt === null;
  const answer = ladderAnswer(ladder.steps);
  const overlay = chooseOverlay(ladder);
  const bought = ladder.steps.length > 1 ? boughtPerLine(ladder.steps) : [];
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
            : "No delta can be given yet: the steps below say why."}
        </p>
      )}
      {bought.length > 0 ? (
        <Section
          title="What each step bought"
          lead="Change of the worst margin of each mask line against the step before."
        >
          <div className="grid gap-x-12 gap-y-6 lg:grid-cols-2">
            {bought.map((line) => (
              <div key={line.key}>
                <h3 className="mb-2 text-base">{line.title}</h3>
                <DeltaBars items={line.items} />
              </div>
            ))}
          </div>
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
          {ladder.steps.map((step, i) => (
            <Rung
              key={step.id}
              step={step}
              buildId={ladder.buildId}
              isLast={i === ladder.steps.length - 1}
              mayWrite={mayWrite}
              actions={{ edit: changeStep, remove: takeStepAway, record: putStepOnRecord }}
            />
          ))}
        </ol>
      </Section>
      {mayWrite ? (
        <Section title="Add a step">
          <StepForm action={appendStep} about={{ ladderId: ladder.id }} label="Add step" />
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
