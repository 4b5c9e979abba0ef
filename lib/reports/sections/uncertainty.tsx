import { View } from "@react-pdf/renderer";
import { Facts, Label, Paragraph } from "../parts/blocks";
import { Table } from "../parts/table";
import {
  degreesWords,
  DISTRIBUTION_LABELS,
  GUARD_RULE,
  guardSource,
  inDb,
  REFERENCE_LABELS,
} from "../budget-words";
import type { ReportContent, SnapshotBudget } from "../report-content";
import { stateValue } from "../report-text";

function Budget({ bench, budget }: { bench: string; budget: SnapshotBudget }) {
  const { lines, reference, student } = budget;
  const title = budget.title.trim() === "" ? "" : ` · ${budget.title.trim()}`;
  return (
    <>
      <Label
        aheadPt={90}
      >{`Uncertainty budget of ${bench}, revision ${budget.revision}${title}`}</Label>
      <Table
        columns={[
          { title: "Quantity", share: 3, longest: 34 },
          { title: "Value", share: 1.1, kind: "number", align: "right" },
          { title: "Distribution", share: 1.9, kind: "small" },
          { title: "Sensitivity", share: 1, kind: "number", align: "right" },
          { title: "Degrees of freedom", share: 1.3, kind: "number", align: "right" },
          { title: "Contribution", share: 1.3, kind: "number", align: "right" },
        ]}
        rows={lines.map((line) => [
          line.name,
          stateValue(line.value, "dB"),
          line.observations === null
            ? DISTRIBUTION_LABELS[line.distribution]
            : `${DISTRIBUTION_LABELS[line.distribution]}, n = ${line.observations}`,
          String(line.sensitivity),
          degreesWords(line.degreesOfFreedom),
          inDb(line.contributionDb),
        ])}
      />
      <View style={{ height: 5 }} />
      <Facts
        columns={5}
        facts={[
          { label: "Combined", value: `u_c = ${inDb(budget.combinedDb)}`, kind: "number" },
          {
            label: "Effective degrees of freedom",
            value: degreesWords(budget.effectiveDegrees),
            kind: "number",
          },
          { label: "Coverage factor", value: `k = ${budget.coverageFactor}`, kind: "number" },
          { label: "Expanded", value: `U = ${inDb(budget.expandedDb)}`, kind: "number" },
          {
            label: "Published, from memory",
            value: reference ? `U_CISPR = ${inDb(reference.uncertaintyDb)}` : "none chosen",
            kind: reference ? "number" : "text",
          },
        ]}
      />
      {reference ? (
        <Paragraph soft>
          {`U_CISPR is that of CISPR 16-4-2 for ${REFERENCE_LABELS[reference.measurement]}, from memory: check it against your own copy.`}
        </Paragraph>
      ) : null}
      {student ? (
        <Paragraph soft>
          {`With so few degrees of freedom 95.45 % asks for k = ${student.coverageFactor.toFixed(2)}, which gives U = ${inDb(student.expandedDb)}.`}
        </Paragraph>
      ) : null}
    </>
  );
}

/** The guard recorded with each sweep, its rule, and the budgets behind it, each once. */
export function Uncertainty({ content }: { content: ReportContent }) {
  const budgets = new Map(
    content.sweeps.flatMap(({ bench: { name, budget } }) =>
      budget ? [[`${name} ${JSON.stringify(budget)}`, { bench: name, budget }] as const] : [],
    ),
  );
  return (
    <>
      <Label>Guard and uncertainty</Label>
      <Paragraph>{GUARD_RULE}</Paragraph>
      <Table
        columns={[
          { title: "Sweep", share: 2.6, longest: 30 },
          { title: "Bench", share: 1.6, longest: 18 },
          { title: "Guard recorded", share: 1.1, kind: "number", align: "right" },
          { title: "Expanded U", share: 0.9, kind: "number", align: "right" },
          { title: "Where the guard comes from", share: 2.3, kind: "small" },
        ]}
        rows={content.sweeps.map(({ name, bench }) => [
          name,
          bench.name,
          stateValue(bench.guardDb, "dB"),
          bench.budget ? inDb(bench.budget.expandedDb) : "–",
          bench.budget
            ? guardSource(bench.guardDb, bench.budget)
            : `${guardSource(bench.guardDb, null)}. No uncertainty budget stated for this bench.`,
        ])}
      />
      {[...budgets].map(([key, one]) => (
        <Budget key={key} {...one} />
      ))}
    </>
  );
}
