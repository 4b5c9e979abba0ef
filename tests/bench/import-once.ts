import { inventFile } from "./invented-sweep";
import { openPlace } from "./place";

const POINTS = 1_000_000;

/** Runs alone, started by `peak-memory.ts`: the peak of a process covers all of its life. */
const place = await openPlace();
try {
  await place.importFile(inventFile(1000, 1));
  const bytes = inventFile(POINTS, 2);
  globalThis.gc?.();
  const before = process.memoryUsage().rss;
  await place.importFile(bytes);
  const peak = process.resourceUsage().maxRSS * 1024;
  console.log(`points ${POINTS} file ${bytes.length} before ${before} peak ${peak}`);
} finally {
  await place.close();
}
