"use client";

import { useEffect, useId, useRef, useState } from "react";
import { StandingMark } from "@/components/readings/standing-mark";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { formatDelta, formatMargin } from "@/lib/core/units/format";
import type { ChangedSweep, Impact } from "./revision-impact-words";
import { describeRest, describeStandings } from "./revision-impact-words";

interface RevisionImpactProps {
  impact: Impact;
  save: () => Promise<{ ok: true } | { ok: false; message: string }>;
  onKeep: () => void;
}

function HeldCell({ held }: { held: ChangedSweep["before"] }) {
  if (!held) return <span className="text-ink-soft">not reached</span>;
  return (
    <>
      <StandingMark standing={held.standing} />
      <span className="block font-mono whitespace-nowrap">{formatMargin(held.marginDb)}</span>
    </>
  );
}

function ChangedTable({ changed }: { changed: ChangedSweep[] }) {
  return (
    <div
      className="relative mb-5 max-h-[50vh] overflow-auto border border-rule"
      tabIndex={0}
      role="region"
      aria-label="Sweeps that change"
    >
      <table className="w-full text-left">
        <thead className="text-sm text-ink-soft">
          <tr className="border-b border-rule">
            <th className="px-3 py-2 font-medium">Sweep</th>
            <th className="px-3 py-2 font-medium">Now</th>
            <th className="px-3 py-2 font-medium">Then</th>
            <th className="px-3 py-2 text-right font-medium">Change</th>
          </tr>
        </thead>
        <tbody>
          {changed.map((sweep) => (
            <tr key={sweep.sweepId} className="border-b border-rule align-top last:border-0">
              <td className="min-w-40 px-3 py-2">
                {sweep.name}
                <span className="block text-sm text-ink-soft">
                  {sweep.programName} {sweep.buildName}
                  {sweep.onRecord ? " · on the line of record" : ""}
                </span>
              </td>
              <td className="px-3 py-2">
                <HeldCell held={sweep.before} />
              </td>
              <td className="px-3 py-2">
                <HeldCell held={sweep.after} />
              </td>
              <td className="px-3 py-2 text-right font-mono whitespace-nowrap">
                {sweep.changeDb === null ? "" : formatDelta(sweep.changeDb)}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

/** What a revision would change, shown before it is saved; nothing is stored until somebody says so. */
export function RevisionImpact({ impact, save, onKeep }: RevisionImpactProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  const [pending, setPending] = useState(false);
  const [message, setMessage] = useState<string | null>(null);
  useEffect(() => {
    const shown = dialog.current;
    if (shown && !shown.open) shown.showModal();
  }, []);

  async function confirm() {
    setPending(true);
    setMessage(null);
    try {
      const outcome = await save();
      if (!outcome.ok) setMessage(outcome.message);
    } catch {
      setMessage("Neap could not be reached; nothing was stored. Check the connection.");
    } finally {
      setPending(false);
    }
  }

  return (
    <dialog
      ref={dialog}
      aria-labelledby={titleId}
      onClose={onKeep}
      className="m-auto w-full max-w-3xl border border-rule bg-sheet p-4 text-ink backdrop:bg-black/50 sm:p-6"
    >
      <h2 id={titleId} className="mb-3 text-xl">
        What revision {impact.revision} changes
      </h2>
      <ErrorNote message={message} />
      <p className="mb-3 text-lg">{describeStandings(impact)}</p>
      {describeRest(impact).map((sentence) => (
        <p key={sentence} className="mb-3">
          {sentence}
        </p>
      ))}
      {impact.changed.length > 0 ? <ChangedTable changed={impact.changed} /> : null}
      <p className="mb-5 text-ink-soft">
        Saved, it is in force once every sweep is read under it; until then revision{" "}
        {impact.inForceRevision} counts. Readings and reports made before stay as they are.
      </p>
      <div className="flex flex-wrap justify-end gap-2">
        <Button look="quiet" onClick={() => dialog.current?.close()}>
          Keep editing
        </Button>
        <Button disabled={pending} onClick={() => void confirm()}>
          Save revision {impact.revision}
        </Button>
      </div>
    </dialog>
  );
}
