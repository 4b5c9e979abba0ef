import { existsSync, mkdirSync, readFileSync, readdirSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { PlainStop } from "./plain-stop.mjs";
import { run } from "./run.mjs";

/** One sentence with the remedy, for whoever cannot install by themselves. */
export function missingSentence(what, packages, isRoot) {
  const install = `apt-get install ${packages.join(" ")}`;
  return isRoot
    ? `${what} is missing and could not be installed here; run \`${install}\` and start again.`
    : `${what} is missing and installing it needs root; run \`sudo ${install}\` once and start again.`;
}

async function aptInstall(what, packages) {
  const isRoot = process.getuid?.() === 0;
  if (!isRoot || !existsSync("/usr/bin/apt-get")) {
    throw new PlainStop(missingSentence(what, packages, isRoot));
  }
  console.log(`Installing ${packages.join(", ")} …`);
  const env = { ...process.env, DEBIAN_FRONTEND: "noninteractive" };
  const apt = (args) => run("apt-get", args, { env, capture: true });
  await apt(["update", "-qq"]);
  const { code, output } = await apt([
    "install",
    "-y",
    "-qq",
    "--no-install-recommends",
    ...packages,
  ]);
  if (code !== 0) {
    console.error(output.split("\n").slice(-12).join("\n"));
    throw new PlainStop(missingSentence(what, packages, isRoot));
  }
}

/** Makes sure that a program of a Debian package is there. */
export async function ensureProgram(path, what, packages) {
  if (!existsSync(path)) await aptInstall(what, packages);
}

/** The newest PostgreSQL's folder of programs, or null. */
export function postgresPrograms(base = "/usr/lib/postgresql") {
  if (!existsSync(base)) return null;
  const versions = readdirSync(base)
    .filter((name) => existsSync(join(base, name, "bin", "initdb")))
    .sort((a, b) => Number(b) - Number(a));
  return versions[0] ? join(base, versions[0], "bin") : null;
}

/** Installs PostgreSQL when missing, without the cluster that Debian would start for it. */
export async function ensurePostgres() {
  const found = postgresPrograms();
  if (found) return found;
  await aptInstall("PostgreSQL", ["postgresql-common"]);
  const file = "/etc/postgresql-common/createcluster.conf";
  const before = existsSync(file) ? readFileSync(file, "utf8") : "";
  mkdirSync("/etc/postgresql-common", { recursive: true });
  writeFileSync(
    file,
    `${before.replace(/^\s*#?\s*create_main_cluster.*$/gm, "")}\ncreate_main_cluster = false\n`,
  );
  await aptInstall("PostgreSQL", ["postgresql"]);
  const installed = postgresPrograms();
  if (!installed) throw new PlainStop(missingSentence("PostgreSQL", ["postgresql"], true));
  return installed;
}
