import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { MaskChart } from "@/components/charts/mask-chart";
import { CopyMaskButton, MaskArchiveButton } from "@/components/masks/mask-actions";
import { MaskLines } from "@/components/masks/mask-lines";
import { MaskRevisionList } from "@/components/masks/mask-revision-list";
import { PORT_LABELS } from "@/components/masks/mask-words";
import { ProvenanceMark } from "@/components/masks/provenance-mark";
import { RecomputationProgress } from "@/components/masks/recomputation-progress";
import { ButtonLink } from "@/components/ui/button";
import { Facts } from "@/components/ui/facts";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import { readMask } from "@/lib/queries/mask/read-mask";
import { readRecomputation } from "@/lib/queries/mask/read-recomputation";
import { bringMaskBack, duplicateMask, putInForceAgain, putMaskAway } from "../actions";
import type { SearchParams } from "../search-params";
import { readRevisionParam } from "../search-params";

export const metadata: Metadata = { title: "Mask" };

interface MaskPageProps {
  params: Promise<{ maskId: string }>;
  searchParams: Promise<SearchParams>;
}

export default async function MaskPage(props: MaskPageProps) {
  const { maskId } = await props.params;
  const asked = readRevisionParam((await props.searchParams)["revision"]);
  const ctx = await currentContext();
  const found = await readMask(ctx, maskId);
  const recomputation = await readRecomputation(ctx, maskId);
  if (!found) notFound();
  const { current, pending } = found;
  const shown = asked === null ? current : found.revisions.find((r) => r.revision === asked);
  if (!shown) notFound();
  const mask = shown.content;
  const mayWrite = isAllowed(ctx, "mask.write");
  const archived = found.archivedAt !== null;
  const mayConfirm = mayWrite && !archived && pending === null && shown === current;
  return (
    <>
      <PageHead
        title={mask.title}
        trail={[{ href: "/masks", label: "Masks" }]}
        lead={[
          ...(archived ? ["This mask is archived."] : []),
          ...(shown === current
            ? []
            : [
                `Revision ${shown.revision}, ${shown.inForceAt === null ? "which is still being put in force" : "an earlier one"}; revision ${current.revision} is the one in force.`,
              ]),
          found.origin === "shipped"
            ? "Shipped with Neap and never edited; copy it to change it."
            : "Made by the team.",
        ].join(" ")}
        actions={
          <>
            {mayWrite && found.origin === "team" && !archived ? (
              <ButtonLink href={`/masks/${found.id}/edit`}>Edit</ButtonLink>
            ) : null}
            {mayConfirm ? (
              <ButtonLink
                href={`/masks/${found.id}/confirm`}
                look={mask.provenance === "from memory" ? "primary" : "quiet"}
              >
                {current.confirmation ? "Confirm again" : "Confirm"}
              </ButtonLink>
            ) : null}
            {mayWrite ? <CopyMaskButton maskId={found.id} copy={duplicateMask} /> : null}
            {(["json", "csv"] as const).map((format) => (
              <a
                key={format}
                href={`/masks/${found.id}/${format}?revision=${shown.revision}`}
                download
                className="order-first inline-flex min-h-10 items-center px-2 text-deep underline"
              >
                Download {format.toUpperCase()}
              </a>
            ))}
            {mayWrite ? (
              <MaskArchiveButton
                mask={{ id: found.id, title: mask.title, archived }}
                archive={putMaskAway}
                restore={bringMaskBack}
              />
            ) : null}
          </>
        }
      />
      {recomputation ? (
        <RecomputationProgress
          maskId={found.id}
          initial={recomputation}
          inForceRevision={current.revision}
          tryAgain={mayWrite ? putInForceAgain : undefined}
        />
      ) : null}
      {mask.provenance === "from memory" ? (
        <p className="mb-6 border-l-4 border-l-shoal bg-shoal-bed px-3 py-2 text-shoal">
          These limits were written down from memory, and nobody of the team has confirmed them.
          Every reading under this mask says so until somebody compares it with their own copy of
          the document.
        </p>
      ) : null}
      <MaskChart mask={mask} />
      <div className="mt-6">
        <Facts
          items={[
            { label: "Port", value: PORT_LABELS[mask.port] },
            { label: "Unit", value: LEVEL_UNIT_LABELS[mask.unit] },
            {
              label: "Distance",
              value: mask.distanceM === null ? null : `${mask.distanceM} m`,
              mono: true,
            },
            { label: "Document", value: mask.document || null },
            { label: "Clause", value: mask.clause || null },
            { label: "Edition", value: mask.edition || null },
            {
              label: "Provenance",
              value: (
                <ProvenanceMark provenance={mask.provenance} confirmation={shown.confirmation} />
              ),
            },
            ...(shown.confirmation
              ? [{ label: "Compared with", value: shown.confirmation.copy }]
              : []),
            { label: "Note", value: mask.note || null },
          ]}
        />
      </div>
      <Section
        title="Lines"
        lead="Where segments meet or overlap the lower limit applies; between them there is no limit."
      >
        <MaskLines mask={mask} />
      </Section>
      <Section
        title="Revisions"
        lead="A reading names the revision it was made with; none is ever changed."
      >
        <MaskRevisionList
          revisions={found.revisions.map(({ content, ...revision }) => ({
            ...revision,
            title: content.title,
          }))}
          current={current.revision}
          shown={shown.revision}
          href={(revision) => `/masks/${found.id}?revision=${revision}`}
        />
      </Section>
    </>
  );
}
