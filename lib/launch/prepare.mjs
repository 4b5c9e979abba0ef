import { randomBytes } from "node:crypto";
import { existsSync, mkdirSync, readFileSync, writeFileSync } from "node:fs";
import { join, resolve } from "node:path";
import { fileURLToPath } from "node:url";
import { startLocalServer } from "../../db/local-server.mjs";
import { ensurePackages } from "./packages.mjs";
import { ensurePostgres } from "./debian.mjs";
import { PlainStop } from "./plain-stop.mjs";
import { runTypeScript } from "./run.mjs";

export const ROOT = fileURLToPath(new URL("../..", import.meta.url)).replace(/\/$/, "");

const NEEDED_NODE = [20, 9];

export function checkNode(version = process.versions.node) {
  const [major = 0, minor = 0] = version.split(".").map(Number);
  if (major > NEEDED_NODE[0] || (major === NEEDED_NODE[0] && minor >= NEEDED_NODE[1])) return;
  throw new PlainStop(
    `Node.js ${NEEDED_NODE.join(".")} or newer is needed, this is ${version}; install a newer one.`,
  );
}

export function dataFolder() {
  return resolve(ROOT, process.env.NEAP_DATA_DIR || ".neap");
}

export const isDemo = () => process.env.NEAP_DEMO !== "0";

/** Random words of this installation, made once and readable by its owner only. */
function secrets(dataDir) {
  const file = join(dataDir, "secrets.json");
  if (!existsSync(file)) {
    mkdirSync(dataDir, { recursive: true });
    const word = () => randomBytes(32).toString("base64url");
    writeFileSync(file, JSON.stringify({ appPassword: word(), session: word() }), { mode: 0o600 });
  }
  return JSON.parse(readFileSync(file, "utf8"));
}

/** The same database as another user. */
function asApp(ownerUrl, password) {
  const url = new URL(ownerUrl);
  url.username = "neap_app";
  url.password = password;
  return url.toString();
}

/**
 * Packages, database, migrations and demo data. Resolves to the environment that the app needs
 * and a `stop` that ends what was started. With DATABASE_URL set no cluster is started.
 */
export async function prepare({ dataDir = dataFolder(), throwAway = false } = {}) {
  checkNode();
  await ensurePackages(ROOT);
  const { appPassword, session } = secrets(dataDir);
  const given = throwAway ? undefined : process.env.DATABASE_URL;
  const server = given
    ? { url: given, stop: async () => {} }
    : await startLocalServer({ programs: await ensurePostgres(), dataDir, throwAway });
  const env = {
    NEAP_OWNER_DATABASE_URL: server.url,
    NEAP_APP_DATABASE_URL: asApp(server.url, appPassword),
    NEAP_APP_PASSWORD: appPassword,
    NEAP_DATA_DIR: dataDir,
    NEAP_DEMO: isDemo() ? "1" : "0",
    NEXTAUTH_SECRET: session,
    NEXT_TELEMETRY_DISABLED: "1",
  };
  try {
    const step = async (file, problem) => {
      const { code, output } = await runTypeScript(file, env, { cwd: ROOT, capture: true });
      if (code === 0) return;
      console.error(output.trim());
      throw new PlainStop(problem);
    };
    await step(
      "db/migrate.ts",
      given
        ? "the database at DATABASE_URL cannot be prepared; check that it answers and that its user may create roles and tables."
        : "the database could not be brought up to date; the lines above say why.",
    );
    if (isDemo()) {
      await step("db/seed/index.ts", "the demo data could not be made; the lines above say why.");
    }
  } catch (error) {
    await server.stop();
    throw error;
  }
  return { env, stop: server.stop };
}
