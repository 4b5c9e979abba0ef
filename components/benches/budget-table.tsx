import type { ReactNode } from "react";
import { keepUnits } from "@/components/ui/keep-units";
import type { ExpandedUncertainty } from "@/lib/core/bench/expanded-uncertainty";
import { U_CISPR_DB } from "@/lib/core/bench/guard";
import type { ReferenceUncertainty } from "@/lib/core/bench/uncertainty-budget";
import {
  degreesWords,
  DISTRIBUTION_LABELS,
  DIVISORS,
  inDb,
  REFERENCE_LABELS,
} from "./budget-words";

const HEADS = ["Quantity", "Value", "Distribution", "u", "c", "Contribution", "Degrees of freedom"];

/** The lines of a budget with what each of them contributes, the largest easy to see. */
export function BudgetTable({ result }: { result: ExpandedUncertainty }) {
  return (
    <div
      className="overflow-x-auto border border-rule bg-sheet"
      tabIndex={0}
      role="region"
      aria-label="Uncertainty budget"
    >
      <table className="w-full text-left">
        <thead className="text-sm text-ink-soft">
          <tr className="border-b border-rule">
            {HEADS.map((head) => (
              <th key={head} className="px-3 py-2 font-medium whitespace-nowrap">
                {head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {result.lines.map(({ line, standardDb, contributionDb, share, degreesOfFreedom }, i) => (
            <tr key={i} className="border-b border-rule last:border-0">
              <th scope="row" className="min-w-44 px-3 py-2 font-medium">
                {keepUnits(line.name)}
              </th>
              <td className="px-3 py-2 font-mono whitespace-nowrap">{line.value} dB</td>
              <td className="min-w-40 px-3 py-2 text-sm">
                {DISTRIBUTION_LABELS[line.distribution]},{" "}
                <span className="whitespace-nowrap text-ink-soft">
                  {DIVISORS[line.distribution]}
                  {line.observations === null ? "" : `, n = ${line.observations}`}
                </span>
              </td>
              <td className="px-3 py-2 font-mono whitespace-nowrap">{inDb(standardDb)}</td>
              <td className="px-3 py-2 font-mono">{line.sensitivity}</td>
              <td className="px-3 py-2">
                <ShareBar share={share} />
                <span className="font-mono whitespace-nowrap">{inDb(contributionDb)}</span>{" "}
                <span className="text-sm whitespace-nowrap text-ink-soft">
                  {Math.round(share * 100)} % of u²
                </span>
              </td>
              <td className="px-3 py-2">
                <span className={Number.isFinite(degreesOfFreedom) ? "font-mono" : "text-ink-soft"}>
                  {degreesWords(degreesOfFreedom)}
                </span>
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function ShareBar({ share }: { share: number }) {
  return (
    <span aria-hidden className="mb-1 block h-1.5 w-32 bg-water-1">
      <span className="block h-full bg-water-3" style={{ width: `${share * 100}%` }} />
    </span>
  );
}

interface BudgetResultProps {
  result: ExpandedUncertainty;
  reference: ReferenceUncertainty | null;
}

/** What follows from the lines: u_c, effective degrees of freedom, k, U, and U_CISPR beside it. */
export function BudgetResult({ result, reference }: BudgetResultProps) {
  const { combinedDb, effectiveDegrees, coverageFactor, expandedDb, student } = result;
  return (
    <div>
      <p className="mb-2">
        <span className="font-mono text-4xl whitespace-nowrap">{expandedDb.toFixed(2)}</span>{" "}
        <span className="text-lg">
          dB is the expanded uncertainty U{" "}
          <span className="whitespace-nowrap">(k = {coverageFactor}).</span>
        </span>
      </p>
      <dl className="flex flex-wrap gap-x-8 gap-y-1">
        <Amount
          label={
            <>
              u<sub>c</sub>
            </>
          }
          value={inDb(combinedDb)}
        />
        <Amount label="Effective degrees of freedom" value={degreesWords(effectiveDegrees)} />
        {reference ? (
          <Amount
            label={
              <>
                U<sub>CISPR</sub>, {REFERENCE_LABELS[reference]} (from memory)
              </>
            }
            value={`${U_CISPR_DB[reference].toFixed(1)} dB`}
          />
        ) : null}
      </dl>
      {student ? (
        <p className="mt-2 max-w-prose text-shoal">
          With so few degrees of freedom k = 2 covers less than 95.45 %: Student&apos;s k is{" "}
          <span className="font-mono">{student.coverageFactor.toFixed(2)}</span>, and U would be{" "}
          <span className="font-mono">{inDb(student.expandedDb)}</span>. The guard is computed with
          k = 2.
        </p>
      ) : null}
      <p className="mt-2 max-w-prose text-sm text-ink-soft">
        The quantities are taken as independent of each other.
      </p>
    </div>
  );
}

function Amount({ label, value }: { label: ReactNode; value: string }) {
  return (
    <div className="flex gap-2">
      <dt className="text-ink-soft">{label}</dt>
      <dd className="font-mono whitespace-nowrap">{value}</dd>
    </div>
  );
}
