import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { reviseSignalPath } from "@/lib/commands/bench/revise-signal-path";
import { addStep } from "@/lib/commands/ladder/add-step";
import { editStep } from "@/lib/commands/ladder/edit-step";
import { setStepState } from "@/lib/commands/ladder/set-step-state";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { readLadder } from "@/lib/queries/ladder/read-ladder";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import {
  importLevels,
  levelsOf,
  LINK,
  makeBench,
  makeLadder,
  makePlace,
  SETTINGS,
} from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const FIELD = { unit: "dBuV/m" };

/** A ladder of as many steps as wanted, and how to import corrected levels at one of them. */
async function arrange(steps: number) {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const ladderId = await makeLadder(ctx, place.buildId);
  const stepIds = [(await readLadder(ctx, ladderId))?.steps[0]?.id ?? ""];
  for (let i = 1; i < steps; i += 1) {
    stepIds.push((await addStep(ctx, { ladderId, name: `Step ${i}`, description: "" })).stepId);
  }
  const at = (step: number, levels: number[], change = {}, table = {}) =>
    importLevels(
      ctx,
      place,
      levels,
      { stepId: stepIds[step], corrected: true, name: `At ${step}`, ...change },
      { ...FIELD, ...table },
    );
  const read = async () => {
    const ladder = await readLadder(ctx, ladderId);
    if (!ladder) throw new Error("The ladder is gone.");
    return ladder;
  };
  return { ctx, place, ladderId, at, read };
}

/** 10 log10 of the sum over 28 points: 27 at the floor and one at the peak. */
const sumDb = (floorDb: number, peakDb: number) =>
  10 * Math.log10(27 * 10 ** (floorDb / 10) + 10 ** (peakDb / 10));

describe("readLadder", () => {
  test("says what each step bought against the one before and against step 0, as by hand", async () => {
    const { at, read } = await arrange(3);
    await at(0, levelsOf(20, { 7: 45 }));
    await at(1, levelsOf(22, { 7: 40 }));
    await at(2, levelsOf(22, { 9: 38.5 }));
    const { steps } = await read();
    expect([steps[0]?.againstPrevious, steps[0]?.againstStart]).toEqual([[], []]);
    const [first] = steps[1]?.againstPrevious ?? [];
    expect(first).toMatchObject({
      beforeName: "At 0",
      afterName: "At 1",
      mismatches: [],
      changes: {
        detector: "peak",
        peakDb: expect.closeTo(-5, 5),
        floorDb: expect.closeTo(2, 5),
        bandPowerDb: expect.closeTo(sumDb(22, 40) - sumDb(20, 45), 4),
        bandPowerIsPower: false,
        margins: [
          {
            lineName: "Peak",
            maskTitle: "Loft limit",
            beforeDb: expect.closeTo(5, 5),
            afterDb: expect.closeTo(10, 5),
            changeDb: expect.closeTo(5, 5),
            beforeStanding: "clear",
            afterStanding: "clear",
          },
        ],
      },
    });
    expect(first?.changes?.sentence).toMatch(/^Peaks came down 5\.0 dB, the floor came up 2\.0 dB/);
    expect(steps[1]?.againstStart).toEqual(steps[1]?.againstPrevious);
    expect(steps[2]?.againstPrevious[0]?.changes).toMatchObject({
      peakDb: expect.closeTo(-1.5, 5),
      floorDb: expect.closeTo(0, 5),
      margins: [{ changeDb: expect.closeTo(1.5, 5) }],
    });
    expect(steps[2]?.againstStart[0]).toMatchObject({
      beforeName: "At 0",
      changes: {
        peakDb: expect.closeTo(-6.5, 5),
        margins: [{ beforeDb: expect.closeTo(5, 5), changeDb: expect.closeTo(6.5, 5) }],
      },
    });
  });

  test.each<[string, object, object, RegExp]>([
    ["rbw", { settings: { ...SETTINGS, rbwHz: 9e3 } }, {}, /120.*9/],
    ["rbw-kind", { settings: { ...SETTINGS, rbwKind: "3dB" } }, {}, /6 dB.*3 dB/],
    ["polarization", { settings: { ...SETTINGS, polarization: "horizontal" } }, {}, /horizontal/],
    ["distance", { settings: { ...SETTINGS, distanceM: 10 } }, {}, /3 m.*10 m/],
    ["position", { settings: { ...SETTINGS, heightM: 2 } }, {}, /2 m/],
    ["span", {}, { stepMhz: 9 }, /273/],
    ["detector", {}, { detector: "QP" }, /quasi-peak/],
    ["signal-path", { corrected: false }, { unit: "dBuV" }, /corrected/],
  ])(
    "does not compare over a different %s, and says so with both values",
    async (field, change, table, said) => {
      const { at, read } = await arrange(2);
      await at(0, levelsOf(20, { 7: 45 }));
      await at(1, levelsOf(20, { 7: 40 }), change, table);
      const [delta] = (await read()).steps[1]?.againstPrevious ?? [];
      expect(delta?.changes).toBeNull();
      const found = delta?.mismatches.find((mismatch) => mismatch.field === field);
      expect(found?.text).toMatch(said);
    },
  );

  test("does not compare over a revised signal path or another bench", async () => {
    const { ctx, place, at, read } = await arrange(3);
    await at(0, levelsOf(20));
    await reviseSignalPath(ctx, { benchId: place.benchId, impedanceOhm: 50, transducers: [] });
    await at(1, levelsOf(20));
    await at(2, levelsOf(20), { benchId: await makeBench(ctx, "Another") });
    const { steps } = await read();
    const fields = steps.map((step) =>
      step.againstPrevious.flatMap((delta) => delta.mismatches.map((m) => m.field)),
    );
    expect(fields).toEqual([[], ["signal-path"], ["bench"]]);
  });

  test("differences that only weaken a delta stand beside it", async () => {
    const { at, read } = await arrange(2);
    await at(0, levelsOf(20));
    await at(1, levelsOf(20), { settings: { ...SETTINGS, attenuationDb: 20 } });
    const [delta] = (await read()).steps[1]?.againstPrevious ?? [];
    expect(delta?.changes).not.toBeNull();
    expect(delta?.doubts.join(" ")).toContain("10 dB before, 20 dB after");
  });

  test("pairs each position with its own, and leaves ambient and archived sweeps out", async () => {
    const { ctx, at, read } = await arrange(2);
    const horizontal = { settings: { ...SETTINGS, polarization: "horizontal" } };
    await at(0, levelsOf(20, { 7: 45 }), { name: "V before" });
    await at(0, levelsOf(20, { 7: 47 }), { ...horizontal, name: "H before" });
    await at(0, levelsOf(5), { name: "Ambient", purpose: "ambient" });
    await at(1, levelsOf(20, { 7: 41 }), { ...horizontal, name: "H after" });
    await at(1, levelsOf(20, { 7: 42 }), { name: "V after" });
    const aside = await at(1, levelsOf(20, { 7: 60 }), { name: "Aside" });
    await archiveSweep(ctx, { sweepId: aside.sweepId });
    const { steps } = await read();
    const pairs = steps[1]?.againstPrevious.map((delta) => [
      delta.beforeName,
      delta.afterName,
      delta.changes?.peakDb,
    ]);
    expect(pairs).toEqual([
      ["H before", "H after", expect.closeTo(-6, 5)],
      ["V before", "V after", expect.closeTo(-3, 5)],
    ]);
  });

  test("a step without sweeps has no delta, and the next one only against step 0", async () => {
    const { at, read } = await arrange(3);
    await at(0, levelsOf(20, { 7: 45 }));
    await at(2, levelsOf(20, { 7: 40 }));
    const { steps } = await read();
    expect(steps[1]).toMatchObject({ againstPrevious: [], againstStart: [], link: null });
    expect(steps[2]?.againstPrevious).toEqual([]);
    expect(steps[2]?.againstStart[0]?.changes?.peakDb).toBeCloseTo(-5, 5);
  });

  test("carries the link settings of the newest product sweep, and whether it is on record", async () => {
    const { at, read } = await arrange(2);
    await at(0, levelsOf(20), { onRecord: false });
    await at(0, levelsOf(20), { onRecord: false, link: { ...LINK, coding: "64b66b" } });
    await at(1, levelsOf(20), { purpose: "ambient", link: { ...LINK, coding: "none" } });
    await at(1, levelsOf(20));
    const ladder = await read();
    expect(ladder.steps.map((step) => [step.link?.coding, step.onRecord])).toEqual([
      ["64b66b", false],
      ["8b10b", true],
    ]);
  });

  test("finds nothing for another team or under what is no id", async () => {
    const { ctx, ladderId } = await arrange(1);
    const theirs = await makeMember(database, "admin");
    expect(await readLadder(theirs, ladderId)).toBeNull();
    expect(await readLadder(ctx, "nothing")).toBeNull();
    const liaison = await makeMember(database, "liaison", ctx.teamId);
    expect((await readLadder(liaison, ladderId))?.id).toBe(ladderId);
  });

  test("takes repeats of a step together, with their ±, and follows the suspects", async () => {
    const { at, read } = await arrange(2);
    await at(0, levelsOf(20, { 7: 45, 20: 40 }));
    await at(0, levelsOf(20, { 7: 46, 20: 40 }));
    await at(1, levelsOf(20, { 7: 38, 12: 41 }));
    await at(1, levelsOf(20, { 7: 37, 12: 41.5 }));
    const { steps } = await read();
    const [delta, ...rest] = steps[1]?.againstPrevious ?? [];
    expect(rest).toEqual([]);
    expect([delta?.beforeIds.length, delta?.afterIds.length]).toEqual([2, 2]);
    expect(delta?.changes?.repeatability).toBe("The ± is 95 % from 2 sweeps before and 2 after.");
    const { followed, fresh, gone } = delta?.changes?.suspects ?? {};
    expect(followed).toMatchObject([
      { frequencyHz: 100e6, changeDb: expect.closeTo(-8, 4), repeats: { before: 2, after: 2 } },
    ]);
    // √(0.5/2 + 0.5/2) times Student's 4.302653 at ν = 2 (scipy, C).
    expect(followed?.[0]?.uncertaintyDb).toBeCloseTo(3.042435, 4);
    expect(fresh).toMatchObject([{ frequencyHz: 150e6, beforeDb: 20 }]);
    expect(gone).toMatchObject([{ frequencyHz: 230e6, afterDb: 20 }]);
  });

  test("holds a step against its base: past a dropped one, or where a branch starts", async () => {
    const { ctx, at, read } = await arrange(4);
    for (const [i, peak] of [45, 40, 36, 30].entries()) await at(i, levelsOf(20, { 7: peak }));
    const bought = async () =>
      (await read()).steps.map((step) => {
        const change = step.againstPrevious[0]?.changes?.margins[0]?.changeDb;
        return [step.base?.position ?? null, change === undefined ? null : Math.round(change ?? 0)];
      });
    expect(await bought()).toEqual([
      [null, null],
      [0, 5],
      [1, 4],
      [2, 6],
    ]);
    const ids = (await read()).steps.map((step) => step.id);
    await setStepState(ctx, { stepId: ids[2], state: "dropped" });
    expect((await bought())[3]).toEqual([1, 10]);
    await editStep(ctx, { stepId: ids[3], name: "B", description: "", branchOfId: ids[0] });
    expect((await bought())[3]).toEqual([0, 15]);
  });

  test("hands over names of sweeps that have no counterpart at the base", async () => {
    const { at, read } = await arrange(2);
    await at(0, levelsOf(20, { 7: 45 }));
    await at(1, levelsOf(20, { 7: 45 }));
    await at(1, levelsOf(20, { 7: 45 }), { name: "Higher" }, { startMhz: 1000 });
    expect((await read()).steps[1]?.unpaired).toEqual(["Higher"]);
  });
});
