import type { Doubt } from "@/lib/core/reading/reading";
import { DOUBT_NAMES } from "../doubt-names";
import { partDoubts } from "../doubt-summary";
import { joinWords } from "../report-text";
import { DoubtLine, Label, Paragraph } from "./blocks";

interface DoubtGroupsProps {
  doubts: readonly Doubt[];
  /** Name of a sweep by its part; without it the doubts are of one sweep. */
  nameOfPart?: (partIndex: number) => string;
}

/** A doubt's name, number and sentence, and which sweeps have it unless all do. */
function sentenceOf(doubt: Doubt, nameOfPart: DoubtGroupsProps["nameOfPart"]): string {
  const { code, valueDb, text, partIndexes } = doubt;
  const size = valueDb === null ? "" : ` (${Math.abs(valueDb).toFixed(1)} dB)`;
  const only =
    partIndexes && nameOfPart ? ` Only of ${joinWords(partIndexes.map(nameOfPart))}.` : "";
  return `${DOUBT_NAMES[code]}${size}: ${text}${only}`;
}

/** All doubts with their sentences: what weakens the reading, and what could not be checked. */
export function DoubtGroups({ doubts, nameOfPart }: DoubtGroupsProps) {
  const { weakening, unchecked } = partDoubts(doubts);
  const groups = [
    { title: `Doubts that weaken the reading (${weakening.length})`, own: weakening },
    { title: `Could not be checked (${unchecked.length})`, own: unchecked },
  ].filter(({ own }) => own.length > 0);
  if (groups.length === 0)
    return <Paragraph soft>No doubt was found in what the sweeps state.</Paragraph>;
  return (
    <>
      {groups.map(({ title, own }) => [
        <Label key={title} aheadPt={24}>
          {title}
        </Label>,
        ...own.map((doubt, i) => (
          <DoubtLine key={`${title} ${i}`}>{sentenceOf(doubt, nameOfPart)}</DoubtLine>
        )),
      ])}
    </>
  );
}
