import { expect, test } from "vitest";
import {
  equipmentOptions,
  fillFromEquipment,
  pathWithNewest,
} from "@/components/benches/fill-from-equipment";
import type { SignalPath } from "@/lib/core/bench/signal-path";

const FACTORS = [
  { frequencyHz: 30e6, factorDb: 0.5 },
  { frequencyHz: 1e9, factorDb: 2 },
];
const PIECE = {
  id: "k3",
  kind: "cable" as const,
  name: "Reed cable",
  inventoryNumber: "K-3",
  calibratedOn: "2026-10-01",
  dueOn: "2027-10-01",
  factors: FACTORS,
};

test("choosing a piece fills in what its newest calibration says", () => {
  expect(fillFromEquipment(PIECE)).toMatchObject({
    equipmentId: "k3",
    name: "Reed cable",
    kind: "cable",
    calibratedOn: "2026-10-01",
    dueOn: "2027-10-01",
    text: "30\t0.5\n1000\t2",
  });
});

test("typed factors are not lost to a calibration without any, nor by choosing none", () => {
  expect(fillFromEquipment({ ...PIECE, factors: null })).not.toHaveProperty("text");
  expect(fillFromEquipment(undefined)).toEqual({ equipmentId: "" });
});

test("instruments are not offered, and a piece that is gone keeps its line", () => {
  const pieces = [PIECE, { ...PIECE, id: "i", kind: "instrument" as const }];
  expect(equipmentOptions(pieces, "").map((o) => o.value)).toEqual(["", "k3"]);
  expect(equipmentOptions(pieces, "gone").map((o) => o.value)).toEqual(["", "gone", "k3"]);
});

test("the newest calibrations replace dates and factors, and each change is told", () => {
  const old = {
    name: "Cable",
    kind: "cable" as const,
    calibratedOn: "2025-10-01",
    dueOn: "2026-10-01",
    factors: [],
    equipmentId: "k3",
  };
  const path: SignalPath = {
    version: 1,
    impedanceOhm: 50,
    transducers: [old, { ...old, name: "Other", equipmentId: null }],
  };
  const filled = pathWithNewest(path, [PIECE]);
  expect(filled.path.transducers).toEqual([
    { ...old, calibratedOn: "2026-10-01", dueOn: "2027-10-01", factors: FACTORS },
    path.transducers[1],
  ]);
  expect(filled.changes).toEqual(["Cable: calibration of 2026-10-01 with its factors."]);
  const bare = pathWithNewest(path, [{ ...PIECE, factors: null }]);
  expect(bare.path.transducers[0]?.factors).toEqual([]);
  expect(bare.changes[0]).toContain("still the earlier one");
  expect(pathWithNewest(filled.path, [PIECE]).changes).toEqual([]);
});
