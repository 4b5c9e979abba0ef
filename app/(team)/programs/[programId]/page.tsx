import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { BuildForm } from "@/components/programs/build-form";
import { formatTarget } from "@/components/programs/program-table";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { readProgram } from "@/lib/queries/program/read-program";
import { addBuild } from "../actions";

export const metadata: Metadata = { title: "Program" };

export default async function ProgramPage(props: { params: Promise<{ programId: string }> }) {
  const { programId } = await props.params;
  const ctx = await currentContext();
  const program = await readProgram(ctx, programId);
  if (!program) notFound();
  return (
    <>
      <h1 className="text-3xl">{program.name}</h1>
      <p className="mt-1 text-ink-soft">{program.description}</p>
      <p className="mt-4">
        Target margin{" "}
        <span className="font-mono text-2xl">{formatTarget(program.targetMarginDb)}</span>
      </p>
      <h2 className="mt-10 mb-3 text-xl">Builds</h2>
      {program.builds.length > 0 ? (
        <div className="overflow-x-auto border border-rule bg-sheet">
          <table className="w-full text-left">
            <thead className="text-sm text-ink-soft">
              <tr className="border-b border-rule">
                <th className="px-4 py-2 font-medium">Build</th>
                <th className="px-4 py-2 font-medium">Built on</th>
                <th className="px-4 py-2 font-medium">Notes</th>
              </tr>
            </thead>
            <tbody>
              {program.builds.map((build) => (
                <tr key={build.id} className="border-b border-rule last:border-0">
                  <td className="px-4 py-3 font-medium whitespace-nowrap">{build.name}</td>
                  <td className="px-4 py-3 font-mono whitespace-nowrap">
                    {build.builtOn ?? "not stated"}
                  </td>
                  <td className="px-4 py-3 text-ink-soft">{build.notes}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      ) : (
        <p className="border border-dashed border-rule p-8 text-ink-soft">No builds yet.</p>
      )}
      {isAllowed(ctx, "program.write") ? (
        <section className="mt-10">
          <h2 className="mb-3 text-xl">Add a build</h2>
          <BuildForm programId={program.id} action={addBuild} />
        </section>
      ) : null}
    </>
  );
}
