import { randomUUID } from "node:crypto";
import { mkdir, readFile, rename, rm, stat, writeFile } from "node:fs/promises";
import { dirname, join, resolve } from "node:path";
import type { FileStore } from "@/lib/auth/context";

const exists = (path: string) =>
  stat(path).then(
    () => true,
    () => false,
  );

/** Files in a folder on this machine. A file appears under its key whole or not at all. */
export function folderStore(
  folder = join(process.env.NEAP_DATA_DIR ?? ".neap", "files"),
): FileStore {
  const root = resolve(/* turbopackIgnore: true */ folder);
  const at = (key: string) => {
    if (!/^[\w-]+(\/[\w-]+)*$/.test(key)) throw new Error(`"${key}" is no key of a file.`);
    return join(/* turbopackIgnore: true */ root, key);
  };
  return {
    put: async (key, bytes) => {
      const path = at(key);
      if (await exists(path)) return;
      await mkdir(dirname(path), { recursive: true });
      const draft = `${path}.${randomUUID()}`;
      try {
        // Flushed before it gets its name: after a power cut a short file would be kept for good.
        await writeFile(draft, bytes, { flush: true });
        await rename(draft, path);
      } catch (error) {
        await rm(draft, { force: true });
        throw error;
      }
    },
    get: async (key) => {
      try {
        return await readFile(at(key));
      } catch (error) {
        if (error instanceof Error && "code" in error && error.code === "ENOENT") return null;
        throw error;
      }
    },
  };
}
