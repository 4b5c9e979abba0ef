import Papa from "papaparse";
import type { Client } from "pg";
import { inventFile } from "./invented-sweep";
import { measureInTurns, middleOf, milliseconds, minAndMedian, quotients } from "./measure";
import type { Place } from "./place";
import type { Figure } from "./report";

const POINTS = 100_000;
const ROUNDS = 11;
const LIMIT = 3;

interface BlockRow {
  kind: string;
  level: number;
  position: number;
  crc32: number;
  bytes: Buffer;
}

/** The blocks of one sweep as the import stored them. */
async function storedBlocks(owner: Client, sweepId: string): Promise<BlockRow[]> {
  const { rows } = await owner.query<BlockRow>(
    `select b.kind, b.level, b.position, b.crc32, b.bytes
       from trace_blocks b join traces t on t.id = b.trace_id where t.sweep_id = $1`,
    [sweepId],
  );
  return rows;
}

/** One transaction with one row after another into a table without keys to others or policies. */
async function writeBare(owner: Client, rows: BlockRow[], round: number): Promise<void> {
  await owner.query("begin");
  for (const { kind, level, position, crc32, bytes } of rows) {
    await owner.query("insert into bare_blocks values ($1, $2, $3, $4, $5, $6)", [
      round,
      kind,
      level,
      position,
      crc32,
      bytes,
    ]);
  }
  await owner.query("commit");
}

const ROUGH_ROUNDS = 5;

/** The same with the roughest floor that noise can have, and with frequencies that are listed. */
async function measureOtherImports({ database, importFile }: Place): Promise<Figure[]> {
  const importEach = (options: Parameters<typeof inventFile>[2], seed: number) => {
    const files = Array.from({ length: 2 + ROUGH_ROUNDS }, (_, round) =>
      inventFile(POINTS, seed + round, options),
    );
    return (round: number) => importFile(files[round] ?? new Uint8Array(0));
  };
  const times = await measureInTurns(
    { rough: importEach({ samples: 1 }, 900), listed: importEach({ isListed: true }, 800) },
    ROUGH_ROUNDS,
  );
  const { rows } = await database.owner.query<{ most: string }>(
    "select count(*) as most from suspects group by reading_id order by 1 desc limit 1",
  );
  return [
    {
      name: `Import of ${POINTS} points with the roughest floor`,
      measured: milliseconds(times.rough),
      beside: `up to ${rows[0]?.most ?? 0} suspects in a reading`,
    },
    {
      name: `Import of ${POINTS} points at equal ratios of frequency`,
      measured: milliseconds(times.listed),
      beside: "frequencies are stored one by one",
    },
  ];
}

/** Import of a file up to stored readings against three masks, beside parsing and writing alone. */
export async function measureImport(place: Place): Promise<Figure[]> {
  const { database, importFile } = place;
  const { owner } = database;
  await owner.query(`create table bare_blocks (round integer, kind text, level integer,
    position integer, crc32 double precision, bytes bytea,
    primary key (round, kind, level, position))`);
  const files = Array.from({ length: 2 + ROUNDS }, (_, round) => inventFile(POINTS, 100 + round));
  const first = await importFile(inventFile(POINTS, 99));
  const rows = await storedBlocks(owner, first.sweepId);
  const fileOf = (round: number) => files[round] ?? new Uint8Array(0);
  const times = await measureInTurns(
    {
      whole: (round) => importFile(fileOf(round)),
      parse: (round) => {
        const { data } = Papa.parse(Buffer.from(fileOf(round)).toString("utf8"));
        if (data.length < POINTS) throw new Error("Papa Parse did not read every row.");
      },
      write: (round) => writeBare(owner, rows, round),
    },
    ROUNDS,
  );
  const bare = times.parse.map((ms, i) => ms + (times.write[i] ?? Number.NaN));
  const ratios = quotients(times.whole, bare);
  return [
    {
      name: `Import of ${POINTS} points, 3 masks ÷ (bare parse + bare write)`,
      measured: minAndMedian(ratios),
      limit: { text: `median ≤ ${LIMIT}`, isHeld: middleOf(ratios) <= LIMIT },
      beside: `${milliseconds(times.whole)}; parse ${milliseconds(times.parse)}, write ${milliseconds(times.write)}`,
    },
    ...(await measureOtherImports(place)),
  ];
}
