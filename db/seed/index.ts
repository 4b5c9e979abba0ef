import { openDatabase } from "@/db/client";
import { seedDemo } from "./seed-demo";

const url = process.env.NEAP_OWNER_DATABASE_URL;
const dataDir = process.env.NEAP_DATA_DIR;
if (!url || !dataDir) {
  throw new Error("NEAP_OWNER_DATABASE_URL and NEAP_DATA_DIR are not set; `npm start` sets them.");
}
if (process.env.NEAP_DEMO === "0") throw new Error("NEAP_DEMO=0 forbids demo data.");

const { db, pool } = openDatabase(url);
// One transaction: an interrupted start leaves no half demo behind.
await db.transaction((tx) => seedDemo(tx, dataDir));
await pool.end();
