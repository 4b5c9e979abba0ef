import type { Metadata } from "next";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listMembers } from "@/lib/queries/team/list-members";

export const metadata: Metadata = { title: "Team" };

export default async function TeamPage() {
  const ctx = await currentContext();
  if (!isAllowed(ctx, "people.read")) {
    return (
      <>
        <h1 className="mb-4 text-3xl">Team</h1>
        <p>Only an admin of your team sees its people.</p>
      </>
    );
  }
  const members = await listMembers(ctx);
  return (
    <>
      <h1 className="mb-6 text-3xl">Team</h1>
      <div className="overflow-x-auto border border-rule bg-sheet">
        <table className="w-full text-left">
          <thead className="text-sm text-ink-soft">
            <tr className="border-b border-rule">
              <th className="px-4 py-2 font-medium">Name</th>
              <th className="px-4 py-2 font-medium">E-mail</th>
              <th className="px-4 py-2 font-medium">Role</th>
            </tr>
          </thead>
          <tbody>
            {members.map((member) => (
              <tr key={member.userId} className="border-b border-rule last:border-0">
                <td className="px-4 py-3">{member.name}</td>
                <td className="px-4 py-3">{member.email}</td>
                <td className="px-4 py-3">
                  {member.role}
                  {member.deactivatedAt ? " (deactivated)" : ""}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </>
  );
}
