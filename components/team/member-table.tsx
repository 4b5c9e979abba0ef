"use client";

import type { Role } from "@/lib/auth/permissions";
import { MemberRow } from "./member-row";
import type { MemberActions } from "./member-row";

interface MemberTableProps {
  members: {
    userId: string;
    name: string;
    email: string;
    role: Role;
    deactivatedOn: string | null;
  }[];
  ownUserId: string;
  actions: MemberActions;
}

export function MemberTable({ members, ownUserId, actions }: MemberTableProps) {
  return (
    <div
      className="overflow-x-auto border border-rule bg-sheet"
      tabIndex={0}
      role="region"
      aria-label="Members"
    >
      <table className="w-full text-left">
        <thead className="text-sm text-ink-soft">
          <tr className="border-b border-rule">
            <th className="px-4 py-2 font-medium">Name</th>
            <th className="px-4 py-2 font-medium max-sm:hidden">E-mail</th>
            <th className="px-4 py-2 font-medium">Role</th>
            <th className="px-4 py-2 font-medium">Access</th>
          </tr>
        </thead>
        <tbody>
          {members.map((member) => (
            <MemberRow
              key={member.userId}
              member={member}
              isSelf={member.userId === ownUserId}
              actions={actions}
            />
          ))}
        </tbody>
      </table>
    </div>
  );
}
