import { inventFile } from "./invented-sweep";
import type { Place } from "./place";
import type { Figure } from "./report";

const POINTS = 100_000;
const SWEEPS = 4;
const LIMIT = 5.5;

/** Bytes that a point takes in the database once it is a part of an evenly spaced sweep. */
export async function measureStoredBytes({ database, importFile }: Place): Promise<Figure[]> {
  const size = async () => {
    const { rows } = await database.owner.query<{ bytes: string }>(
      "select pg_total_relation_size('trace_blocks') as bytes",
    );
    return Number(rows[0]?.bytes);
  };
  const before = await size();
  for (let i = 0; i < SWEEPS; i += 1) await importFile(inventFile(POINTS, i));
  const after = await size();
  const { rows } = await database.owner.query<{ kind: string; bytes: string }>(
    "select kind, sum(length(bytes)) as bytes from trace_blocks group by kind order by kind",
  );
  const perPoint = (bytes: number) => bytes / (SWEEPS * POINTS);
  const whole = perPoint(rows.reduce((sum, { bytes }) => sum + Number(bytes), 0));
  const parts = rows.map(({ kind, bytes }) => `${kind} ${perPoint(Number(bytes)).toFixed(2)}`);
  return [
    {
      name: "Stored bytes per point with the pyramid",
      measured: whole.toFixed(3),
      limit: { text: `≤ ${LIMIT}`, isHeld: whole <= LIMIT },
      beside: parts.join(", "),
    },
    {
      name: "Bytes per point on disk, with indexes",
      measured: perPoint(after - before).toFixed(3),
      beside: `${SWEEPS} sweeps of ${POINTS} points`,
    },
  ];
}
