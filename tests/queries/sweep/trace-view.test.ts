import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import { storeTrace } from "@/lib/commands/sweep/store-trace";
import { frequencyAt, pointCount } from "@/lib/core/sweep/axis";
import type { Trace } from "@/lib/core/sweep/trace";
import { readTraceView } from "@/lib/queries/sweep/read-trace-view";
import type { Context } from "@/lib/auth/context";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { importLevels, levelsOf, makePlace } from "../../support/sweeps";
import { makeTrace, randomFrom } from "../../support/traces";

let database: TestDatabase;
let ctx: Context;
let sweepId: string;
let next = 1;
beforeAll(async () => {
  database = await openTestDatabase();
  ctx = await makeMember(database, "engineer");
  ({ sweepId } = await importLevels(ctx, await makePlace(ctx), levelsOf(20)));
});
afterAll(() => database.close());

/** Stores a trace beside the sweep's own, as an import would; returns its position. */
async function store(trace: Trace): Promise<number> {
  const position = next;
  next += 1;
  const place = {
    teamId: ctx.teamId,
    sweepId,
    position,
    fileUnit: trace.unit,
    fileMaxDb: null,
    rbwHz: 120e3,
  };
  await inTeam(ctx.db, ctx.teamId, (tx) => storeTrace(tx, place, trace));
  return position;
}

async function view(position: number, fromHz: number, toHz: number, columns = 1000) {
  const found = await readTraceView(ctx, sweepId, position, {
    fromHz,
    toHz,
    columns,
    scale: "log",
  });
  if (!found) throw new Error("There is no such trace.");
  return found;
}

function noise(count: number): Float32Array {
  const random = randomFrom(count);
  return Float32Array.from({ length: count }, () => 10 + 20 * random());
}

/** The highest level of a trace between two frequencies, and where, looked for one by one. */
function highest(trace: Trace, fromHz: number, toHz: number) {
  let best = { hz: NaN, db: -Infinity };
  for (let i = 0; i < pointCount(trace.axis); i += 1) {
    const hz = frequencyAt(trace.axis, i);
    const db = trace.levelsDb[i] ?? NaN;
    if (hz >= fromHz && hz <= toHz && db > best.db) best = { hz, db };
  }
  return best;
}

describe("readTraceView", () => {
  test("gives every sample itself while there are no more than columns", async () => {
    const levels = Float32Array.of(20, 21.5, NaN, 19, 40.25, 18, 17);
    const trace = makeTrace(levels, {
      axis: { kind: "regular", startHz: 30e6, stepHz: 1e6, count: 7 },
    });
    const position = await store(trace);
    const whole = await view(position, 30e6, 36e6);
    expect(whole).toEqual({
      unit: "dBuV/m",
      firstHz: 30e6,
      lastHz: 36e6,
      points: 7,
      samplesPerBucket: 1,
      hz: [30e6, 31e6, 32e6, 33e6, 34e6, 35e6, 36e6],
      maxDb: [20, 21.5, null, 19, 40.25, 18, 17],
      minDb: [20, 21.5, null, 19, 40.25, 18, 17],
    });
    // One more on each side, so that the line is drawn to the edge.
    expect((await view(position, 33.5e6, 34.5e6)).hz).toEqual([33e6, 34e6, 35e6]);
  });

  test("reads a listed axis at its own frequencies", async () => {
    const frequenciesHz = Float64Array.from({ length: 90_000 }, (_, i) => 9e3 * 1.0001 ** i);
    const trace = makeTrace(noise(90_000), { axis: { kind: "listed", frequenciesHz } });
    trace.levelsDb[70_001] = 77.125;
    const position = await store(trace);
    const whole = await view(position, 9e3, 1e9);
    const at = whole.maxDb.indexOf(77.125);
    expect(whole.hz[at]).toBe(frequenciesHz[70_001]);
    const centreHz = frequenciesHz[70_001] ?? 0;
    const near = await view(position, centreHz * 0.9999, centreHz * 1.0001);
    expect(near.samplesPerBucket).toBe(1);
    const from = 70_001 - near.maxDb.indexOf(77.125);
    expect(near.hz).toEqual(Array.from(frequenciesHz.subarray(from, from + near.hz.length)));
  });

  test("answers 300,000 points from the pyramid with every maximum at its true frequency", async () => {
    const trace = makeTrace(noise(300_000), {
      axis: { kind: "regular", startHz: 30e6, stepHz: 3233.1, count: 300_000 },
    });
    for (const [i, db] of [
      [0, 61],
      [65_535, 62],
      [65_536, 63],
      [123_457, 70.5],
      [299_999, 64],
    ] as const)
      trace.levelsDb[i] = db;
    const position = await store(trace);
    // What lies in the blocks of levels must not be needed: the pyramid alone answers.
    await database.owner.query(
      `update trace_blocks b set bytes = '' from traces t
       where t.id = b.trace_id and t.sweep_id = $1 and t.position = $2 and b.kind = 'level'`,
      [sweepId, position],
    );
    const whole = await view(position, 30e6, 1e9);
    expect(whole.points).toBe(300_000);
    expect(whole.hz.length).toBeLessThanOrEqual(1000);
    for (const i of [0, 65_535, 65_536, 123_457, 299_999]) {
      const hz = 30e6 + i * 3233.1;
      const column = whole.hz.findIndex((shown) => Math.abs(shown - hz) < 1e-3);
      // Two neighbours can share a column, where the higher one counts.
      if (i === 65_535 && column < 0) continue;
      expect(column, `sample ${i}`).toBeGreaterThanOrEqual(0);
      expect(whole.maxDb[column]).toBe(Math.round((trace.levelsDb[i] ?? 0) * 1000) / 1000);
    }
    expect(Math.max(...whole.maxDb.map((db) => db ?? -Infinity))).toBe(70.5);
    expect(Math.min(...whole.minDb.map((db) => db ?? Infinity))).toBeCloseTo(
      trace.levelsDb.reduce((a, b) => Math.min(a, b)),
      2,
    );
  });

  test("zoomed anywhere, shows the highest level in view", async () => {
    const count = 200_000;
    const trace = makeTrace(noise(count), {
      axis: { kind: "regular", startHz: 150e3, stepHz: 4851.7, count },
    });
    const position = await store(trace);
    const random = randomFrom(7);
    for (let round = 0; round < 40; round += 1) {
      const fromHz = 150e3 + random() * 900e6;
      const toHz = fromHz + 10 ** (4 + 4.9 * random());
      const columns = 2 + Math.floor(random() * 1400);
      const shown = await view(position, fromHz, toHz, columns);
      const wanted = highest(trace, fromHz, toHz);
      if (!Number.isFinite(wanted.db)) continue;
      expect(shown.hz.length).toBeLessThanOrEqual(columns);
      const inView = shown.maxDb.filter((_, i) => {
        const hz = shown.hz[i] ?? 0;
        return hz >= fromHz && hz <= toHz;
      });
      const edges = Math.max(...shown.maxDb.map((db) => db ?? -Infinity));
      // A column at the edge may show its neighbour outside, which is then the higher one.
      const top = Math.max(...inView.map((db) => db ?? -Infinity));
      expect(Math.max(top, edges)).toBeGreaterThanOrEqual(Math.round(wanted.db * 1000) / 1000);
      if (edges === top) expect(top).toBeCloseTo(wanted.db, 3);
    }
  });

  test("says 1,500 columns of 1,000,000 points at awkward frequencies in 60 kB", async () => {
    const count = 1_000_000;
    const random = randomFrom(3);
    const levelsDb = Float32Array.from({ length: count }, () => -137.1 + 20 * random());
    const trace = makeTrace(levelsDb, {
      axis: { kind: "regular", startHz: 1e9 / 3, stepHz: 1e5 / 17, count },
    });
    const position = await store(trace);
    for (const [fromHz, toHz] of [
      [1e9 / 3, 7e9],
      [1.1e9, 1.31e9],
    ] as const) {
      const shown = await view(position, fromHz, toHz, 1500);
      expect(shown.hz.length).toBeGreaterThan(900);
      expect(Buffer.byteLength(JSON.stringify(shown))).toBeLessThanOrEqual(60_000);
    }
  });

  test("keeps no more than 5.5 bytes a point of a regular trace of 100,000 points", async () => {
    const position = await store(
      makeTrace(noise(100_000), {
        axis: { kind: "regular", startHz: 30e6, stepHz: 9700, count: 100_000 },
      }),
    );
    const found = await database.owner.query(
      `select sum(length(b.bytes))::float8 as bytes from trace_blocks b
       join traces t on t.id = b.trace_id where t.sweep_id = $1 and t.position = $2`,
      [sweepId, position],
    );
    expect(found.rows[0].bytes / 100_000).toBeLessThanOrEqual(5.5);
    expect(found.rows[0].bytes).toBeGreaterThanOrEqual(400_000);
  });

  test("refuses a block that rotted in the database", async () => {
    const position = await store(makeTrace(noise(1000)));
    await database.owner.query(
      `update trace_blocks b set bytes = set_byte(b.bytes, 100, 255 - get_byte(b.bytes, 100))
       from traces t where t.id = b.trace_id and t.sweep_id = $1 and t.position = $2
         and b.kind = 'level'`,
      [sweepId, position],
    );
    await expect(view(position, 30e6, 1e9)).rejects.toThrow("checksum");
  });

  test("finds nothing for another team, another position or what is no id", async () => {
    const request = { fromHz: 30e6, toHz: 1e9, columns: 10, scale: "log" } as const;
    const theirs = await makeMember(database, "engineer");
    expect(await readTraceView(ctx, sweepId, 0, request)).not.toBeNull();
    expect(await readTraceView(theirs, sweepId, 0, request)).toBeNull();
    expect(await readTraceView(ctx, sweepId, 9999, request)).toBeNull();
    expect(await readTraceView(ctx, "nothing", 0, request)).toBeNull();
  });

  test("a view beside the trace is no error", async () => {
    expect((await view(0, 1e3, 2e3)).points).toBeLessThanOrEqual(2);
    expect((await view(0, 5e9, 6e9)).points).toBeLessThanOrEqual(2);
  });
});
