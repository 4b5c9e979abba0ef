"use client";

import { useState } from "react";
import { ROLES } from "@/lib/auth/permissions";
import type { Role } from "@/lib/auth/permissions";
import { Button } from "@/components/ui/button";
import { ConfirmButton } from "@/components/ui/confirm-button";
import { CONTROL } from "@/components/ui/control-style";
import { ErrorNote } from "@/components/ui/error-note";

type Outcome = { ok: true } | { ok: false; message: string };

export interface MemberActions {
  changeRole: (userId: string, role: string) => Promise<Outcome>;
  deactivate: (userId: string) => Promise<Outcome>;
  reactivate: (userId: string) => Promise<Outcome>;
}

interface MemberRowProps {
  member: { userId: string; name: string; email: string; role: Role; deactivatedOn: string | null };
  isSelf: boolean;
  actions: MemberActions;
}

/** One member; a chosen role counts only when it is stored, so a slip of the wheel does nothing. */
export function MemberRow({ member, isSelf, actions }: MemberRowProps) {
  const { userId, name } = member;
  const [chosen, setChosen] = useState<string | null>(null);
  const [pending, setPending] = useState(false);
  const [refusal, setRefusal] = useState<string | null>(null);

  async function run(action: () => Promise<Outcome>) {
    setPending(true);
    setRefusal(null);
    try {
      const outcome = await action();
      if (!outcome.ok) setRefusal(outcome.message);
    } catch {
      setRefusal("Neap could not be reached; nothing was changed. Check the connection.");
    } finally {
      setPending(false);
      setChosen(null);
    }
  }

  return (
    <tr className="border-b border-rule last:border-0">
      <td className="px-4 py-3 whitespace-nowrap">
        {name}
        {isSelf ? <span className="text-ink-soft"> (you)</span> : null}
        <span className="block text-sm text-ink-soft sm:hidden">{member.email}</span>
      </td>
      <td className="px-4 py-3 max-sm:hidden">{member.email}</td>
      <td className="px-4 py-2">
        <span className="flex gap-2">
          <select
            aria-label={`Role of ${name}`}
            className={`${CONTROL} max-w-36 min-w-32`}
            value={chosen ?? member.role}
            disabled={pending}
            onChange={(event) => setChosen(event.target.value)}
          >
            {ROLES.map((role) => (
              <option key={role} value={role}>
                {role}
              </option>
            ))}
          </select>
          {chosen && chosen !== member.role ? (
            <Button
              disabled={pending}
              aria-label={`Store the role of ${name}`}
              onClick={() => run(() => actions.changeRole(userId, chosen))}
            >
              Store
            </Button>
          ) : null}
        </span>
        <ErrorNote message={refusal} />
      </td>
      <td className="px-4 py-2">
        {member.deactivatedOn ? (
          <span className="flex flex-wrap items-center gap-x-4 gap-y-1">
            <span>
              deactivated <span className="font-mono">{member.deactivatedOn}</span>
            </span>
            <Button
              look="quiet"
              disabled={pending}
              aria-label={`Reactivate ${name}`}
              onClick={() => run(() => actions.reactivate(userId))}
            >
              Reactivate
            </Button>
          </span>
        ) : isSelf ? (
          <span className="inline-block py-1">active</span>
        ) : (
          <ConfirmButton
            label="Deactivate"
            title={`Deactivate ${name}?`}
            confirmLabel="Deactivate"
            action={() => actions.deactivate(userId)}
          >
            {name} is signed out at once and cannot sign in any more. What {name} did stays in the
            audit trail, and you can reactivate the account at any time.
          </ConfirmButton>
        )}
      </td>
    </tr>
  );
}
