import { cpus } from "node:os";
import setUp from "../support/global-setup";
import { measureImport } from "./import-time";
import { openPlace } from "./place";
import { measurePeakMemory } from "./peak-memory";
import { measureReading } from "./reading-time";
import type { Figure } from "./report";
import { printFigures } from "./report";
import { measureStoredBytes } from "./stored-bytes";
import { measureZoom } from "./zoom-bytes";

const stop = await setUp();
const figures: Figure[] = [];
try {
  const place = await openPlace();
  try {
    // First of all, while the database holds nothing but what this figure puts there.
    figures.push(...(await measureStoredBytes(place)));
    figures.push(...(await measureImport(place)));
    figures.push(...(await measureReading()));
    figures.push(...(await measureZoom(place)));
  } finally {
    await place.close();
  }
  figures.push(await measurePeakMemory());
} finally {
  await stop();
}

const [processor] = cpus();
console.log(`\n${new Date().toISOString()}`);
console.log(
  `${cpus().length} cores (${processor?.model.trim() ?? "unknown"}), Node.js ${process.version}\n`,
);
const notHeld = printFigures(figures);
process.exitCode = notHeld === 0 ? 0 : 1;
