import Link from "next/link";

interface ProgramLine {
  id: string;
  name: string;
  description: string;
  targetMarginDb: number;
  builds: number;
}

const signed = new Intl.NumberFormat("en", {
  minimumFractionDigits: 1,
  maximumFractionDigits: 1,
  signDisplay: "exceptZero",
});

/** A target as it is shown everywhere: signed, one decimal, with its unit. */
export function formatTarget(targetDb: number): string {
  return `${signed.format(targetDb).replace("-", "−")} dB`;
}

export function ProgramTable({ programs }: { programs: ProgramLine[] }) {
  return (
    <div className="overflow-x-auto border border-rule bg-sheet">
      <table className="w-full text-left">
        <thead className="text-sm text-ink-soft">
          <tr className="border-b border-rule">
            <th className="px-4 py-2 font-medium">Program</th>
            <th className="px-4 py-2 text-right font-medium">Target margin</th>
            <th className="px-4 py-2 text-right font-medium">Builds</th>
          </tr>
        </thead>
        <tbody>
          {programs.map((program) => (
            <tr key={program.id} className="border-b border-rule last:border-0">
              <td className="px-4 py-3">
                <Link href={`/programs/${program.id}`} className="font-medium text-deep underline">
                  {program.name}
                </Link>
                <span className="block text-sm text-ink-soft">{program.description}</span>
              </td>
              <td className="px-4 py-3 text-right font-mono whitespace-nowrap">
                {formatTarget(program.targetMarginDb)}
              </td>
              <td className="px-4 py-3 text-right font-mono">{program.builds}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
