import { expect, test } from "vitest";
import { draftTransducer } from "@/components/benches/transducer-draft";
import { parseFactorTable } from "@/lib/formats/parse-factor-table";

const shown = (frequenciesHz: number[]) => {
  const factors = frequenciesHz.map((frequencyHz, i) => ({ frequencyHz, factorDb: 20.125 + i }));
  const path = { kind: "cable", calibratedOn: null, dueOn: null } as const;
  const draft = draftTransducer(1, { ...path, name: "Reed cable", factors });
  return { draft, factors, read: parseFactorTable(draft.text, Number(draft.unit)) };
};

test("a stored factor table is shown in MHz and reads back to the last digit", () => {
  const cases = [
    [9e3, 150e3, 30e6],
    [26_999_700, 100_125_000, 148_351_648],
    [1e9, 1_000_000_001, 6.1e9],
    Array.from({ length: 400 }, (_, i) => 9_001 + i * 14_999_987),
  ];
  for (const frequenciesHz of cases) {
    const { draft, factors, read } = shown(frequenciesHz);
    expect(draft.unit).toBe("1000000");
    expect(read).toMatchObject({ ok: true, factors });
  }
});

test("a table that MHz cannot hold to the last digit stays in Hz", () => {
  const { draft, factors, read } = shown([0.5, 20, 100]);
  expect(draft.unit).toBe("1");
  expect(read).toMatchObject({ ok: true, factors });
});
