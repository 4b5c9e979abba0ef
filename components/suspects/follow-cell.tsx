"use client";

import Link from "next/link";
import { useState } from "react";
import type { SuspectFollowMark } from "./filter-suspects";
import type { Act } from "./outcome";
import { StateTag } from "./state-tag";

interface FollowCellProps {
  number: number;
  mark: SuspectFollowMark | null;
  /** Left out when the reader may not follow. */
  follow?: Act | undefined;
}

/** Which followed suspect a row is, or the act of following it. */
export function FollowCell({ number, mark, follow }: FollowCellProps) {
  const [pending, setPending] = useState(false);
  const [message, setMessage] = useState<string | null>(null);
  if (mark)
    return (
      <span className="inline-flex items-center gap-2 whitespace-nowrap">
        <Link href={`/suspects/${mark.suspectId}`} className="text-deep underline">
          {mark.isSame ? `followed as ${mark.followedNumber}` : `beside ${mark.followedNumber}`}
        </Link>
        {mark.isSame ? <StateTag state={mark.state} /> : null}
      </span>
    );
  if (!follow) return <span className="text-ink-soft">not followed</span>;

  async function run(act: Act) {
    setPending(true);
    setMessage(null);
    try {
      const outcome = await act();
      if (!outcome.ok) setMessage(outcome.message);
    } catch {
      setMessage("Neap could not be reached; nothing was stored. Check the connection.");
    } finally {
      setPending(false);
    }
  }

  return (
    <span className="inline-flex flex-wrap items-center gap-x-2">
      <button
        type="button"
        aria-label={`Follow suspect ${number}`}
        disabled={pending}
        onClick={() => void run(follow)}
        className="cursor-pointer text-deep underline disabled:cursor-wait disabled:opacity-60 print:hidden"
      >
        Follow
      </button>
      <span role="alert" className="text-sm text-aground">
        {message}
      </span>
    </span>
  );
}
