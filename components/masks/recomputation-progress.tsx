"use client";

import { useQuery, useQueryClient } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useEffect, useState } from "react";
import { ActionButton } from "@/components/ui/action-button";

interface Recomputation {
  revision: number;
  isInForce: boolean;
  total: number;
  done: number;
  problem: string | null;
}

interface RecomputationProgressProps {
  maskId: string;
  /** As the page was drawn. */
  initial: Recomputation;
  /** What counts until the newest revision is in force. */
  inForceRevision: number;
  /** Sends the job once more; left out for those who may not. */
  tryAgain?: (input: unknown) => Promise<{ ok: true } | { ok: false; message: string }>;
}

const POLL_MS = 1500;
const POLL_AFTER_PROBLEM_MS = 5000;

async function fetchRecomputation(maskId: string): Promise<Recomputation> {
  const answer = await fetch(`/api/v1/masks/${maskId}/recomputation`);
  if (!answer.ok) throw new Error(`The progress could not be read (${answer.status}).`);
  return (await answer.json()) as Recomputation;
}

/** How far a mask's new revision is on its way into force; the page is read anew once it is. */
export function RecomputationProgress(props: RecomputationProgressProps) {
  const { maskId, initial, inForceRevision, tryAgain } = props;
  const router = useRouter();
  const client = useQueryClient();
  const [wasPending] = useState(!initial.isInForce);
  const queryKey = ["recomputation", maskId, initial.revision];
  const { data, isError } = useQuery({
    queryKey,
    queryFn: () => fetchRecomputation(maskId),
    initialData: initial,
    enabled: !initial.isInForce,
    refetchInterval: ({ state }) => {
      if (state.data?.isInForce) return false;
      return state.data?.problem ? POLL_AFTER_PROBLEM_MS : POLL_MS;
    },
  });
  // In force, or a later revision came in between: what the page shows is of yesterday.
  const isOutdated = data.isInForce !== initial.isInForce || data.revision !== initial.revision;
  useEffect(() => {
    if (isOutdated) router.refresh();
  }, [isOutdated, router]);

  async function run() {
    const outcome = await (tryAgain?.({ maskId }) ??
      Promise.resolve({ ok: false as const, message: "" }));
    if (outcome.ok) await client.invalidateQueries({ queryKey });
    return outcome;
  }

  const name = `Revision ${data.revision}`;
  const isShown = wasPending || !data.isInForce;
  return (
    <div className={isShown ? "mb-6 border-l-4 border-l-deep bg-sheet px-3 py-2" : undefined}>
      {/* Without the count, which would be read out every time that it moves. */}
      <p role="status" className={isShown ? "font-medium" : "sr-only"}>
        {!isShown ? "" : data.isInForce ? `${name} is in force.` : `${name} is being put in force.`}
      </p>
      {isShown && !data.isInForce ? (
        <>
          <p>
            <span className="font-mono">{data.done}</span> of{" "}
            <span className="font-mono">{data.total}</span> {data.total === 1 ? "sweep" : "sweeps"}{" "}
            read. Until all are, revision {inForceRevision} counts everywhere.
          </p>
          <progress
            className="my-1 block h-2 w-full max-w-md accent-deep"
            aria-label={`Sweeps read under revision ${data.revision}`}
            max={Math.max(1, data.total)}
            value={data.done}
          />
          {isError ? <p className="text-aground">The progress cannot be read just now.</p> : null}
        </>
      ) : null}
      <div role="alert" className="empty:contents">
        {isShown && data.problem ? (
          <p className="text-aground">{data.problem} It is tried again a few times by itself.</p>
        ) : null}
      </div>
      {isShown && !data.isInForce && data.problem && tryAgain ? (
        <ActionButton action={run}>Try again</ActionButton>
      ) : null}
    </div>
  );
}
