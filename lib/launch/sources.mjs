import { createHash } from "node:crypto";
import { existsSync, mkdirSync, readFileSync, readdirSync, statSync, writeFileSync } from "node:fs";
import { dirname, join } from "node:path";

/** What a production build is made of. */
export const BUILD_SOURCES = [
  "app",
  "components",
  "lib",
  "db",
  "masks",
  "public",
  "package-lock.json",
  "next.config.mjs",
  "tailwind.config.ts",
  "postcss.config.mjs",
  "tsconfig.json",
  "proxy.ts",
  "instrumentation.ts",
];

/** One hash over the names and bytes of all files under the given paths; missing paths are skipped. */
export function hashSources(root, paths) {
  const hash = createHash("sha256");
  const visit = (path) => {
    const full = join(root, path);
    if (!existsSync(full)) return;
    if (statSync(full).isDirectory()) {
      for (const name of readdirSync(full).sort()) visit(join(path, name));
      return;
    }
    hash.update(path).update("\0").update(readFileSync(full)).update("\0");
  };
  paths.forEach(visit);
  return hash.digest("hex");
}

/** Whether the stamp file says that this hash has been dealt with. */
export function isStamped(file, hash) {
  return existsSync(file) && readFileSync(file, "utf8") === hash;
}

export function stamp(file, hash) {
  mkdirSync(dirname(file), { recursive: true });
  writeFileSync(file, hash);
}
