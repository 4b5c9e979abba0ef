import type { Client } from "pg";
import { inventFile } from "./invented-sweep";
import type { Place } from "./place";
import type { Figure } from "./report";

const POINTS = 100_000;
const SWEEPS = 4;
const LIMIT = 5.5;

async function sizeOnDisk(owner: Client): Promise<number> {
  const { rows } = await owner.query<{ bytes: string }>(
    "select pg_total_relation_size('trace_blocks') as bytes",
  );
  return Number(rows[0]?.bytes);
}

async function bytesByKind(owner: Client): Promise<{ kind: string; bytes: number }[]> {
  const { rows } = await owner.query<{ kind: string; bytes: string }>(
    "select kind, sum(length(bytes)) as bytes from trace_blocks group by kind order by kind",
  );
  return rows.map(({ kind, bytes }) => ({ kind, bytes: Number(bytes) }));
}

const sumOf = (parts: { bytes: number }[]) => parts.reduce((sum, { bytes }) => sum + bytes, 0);

/** Bytes that a point takes in the database; the limit is for frequencies at equal steps. */
export async function measureStoredBytes({ database, importFile }: Place): Promise<Figure[]> {
  const { owner } = database;
  const empty = await sizeOnDisk(owner);
  for (let i = 0; i < SWEEPS; i += 1) await importFile(inventFile(POINTS, i));
  const onDisk = (await sizeOnDisk(owner)) - empty;
  const parts = await bytesByKind(owner);
  await importFile(inventFile(POINTS, SWEEPS, { isListed: true }));
  const listed = sumOf(await bytesByKind(owner)) - sumOf(parts);
  const perPoint = (bytes: number) => bytes / (SWEEPS * POINTS);
  const whole = perPoint(sumOf(parts));
  return [
    {
      name: "Stored bytes per point with the pyramid",
      measured: whole.toFixed(3),
      limit: { text: `≤ ${LIMIT}`, isHeld: whole <= LIMIT },
      beside: parts.map(({ kind, bytes }) => `${kind} ${perPoint(bytes).toFixed(2)}`).join(", "),
    },
    {
      name: "Bytes per point on disk, with indexes",
      measured: perPoint(onDisk).toFixed(3),
      beside: `${SWEEPS} sweeps of ${POINTS} points`,
    },
    {
      name: "Stored bytes per point when frequencies are listed",
      measured: (listed / POINTS).toFixed(3),
      beside: "8 more for each frequency, which no step explains",
    },
  ];
}
