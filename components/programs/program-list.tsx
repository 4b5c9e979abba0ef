import Link from "next/link";
import type { ComponentProps } from "react";
import { ProgramTable } from "./program-table";

interface ProgramListProps {
  title: string;
  lead: string;
  programs: ComponentProps<typeof ProgramTable>["programs"];
  mayCreate: boolean;
}

/** The team's programs, or how to make the first one. */
export function ProgramList({ title, lead, programs, mayCreate }: ProgramListProps) {
  return (
    <>
      <div className="mb-6 flex flex-wrap items-baseline gap-4">
        <div>
          <h1 className="text-3xl">{title}</h1>
          <p className="mt-1 text-ink-soft">{lead}</p>
        </div>
        {mayCreate ? (
          <Link href="/programs/new" className="ml-auto text-deep underline">
            New program
          </Link>
        ) : null}
      </div>
      {programs.length > 0 ? (
        <ProgramTable programs={programs} />
      ) : (
        <p className="border border-dashed border-rule p-8 text-ink-soft">
          No programs yet.{" "}
          {mayCreate
            ? "Make the first one: a product under development with its target margin."
            : "An engineer or a manager of your team makes them."}
        </p>
      )}
    </>
  );
}
