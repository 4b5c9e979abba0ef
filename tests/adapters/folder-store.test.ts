import { statSync } from "node:fs";
import { mkdtemp, readdir, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, expect, test } from "vitest";
import { folderStore } from "@/lib/adapters/folder-store";

let folder: string;
beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), "neap-files-"));
});
afterEach(() => rm(folder, { recursive: true, force: true }));

const BYTES = Uint8Array.from({ length: 70_000 }, (_, i) => (i * 31) % 256);

test("what was put comes back byte for byte, from a second store on the same folder too", async () => {
  await folderStore(folder).put("team-1/ab/abcd", BYTES);
  const found = await folderStore(folder).get("team-1/ab/abcd");
  expect(Buffer.from(found ?? []).equals(Buffer.from(BYTES))).toBe(true);
});

test("nothing lies under a key that was never put", async () => {
  expect(await folderStore(folder).get("team-1/ab/none")).toBeNull();
});

test.each([
  "",
  "/etc/passwd",
  "../outside",
  "team/../../outside",
  "team/./x",
  "team//x",
  "team/x/",
  "team\\..\\x",
  "team/x\u0000",
  "team/x\n",
  "a b",
])("the key %j is refused and touches nothing", async (key) => {
  const store = folderStore(join(folder, "inner"));
  await expect(store.put(key, BYTES)).rejects.toThrow("no key");
  await expect(store.get(key)).rejects.toThrow("no key");
  expect(await readdir(folder)).toEqual([]);
});

test("bytes under a key never change once put", async () => {
  const store = folderStore(folder);
  await store.put("team/key", BYTES);
  await store.put("team/key", Uint8Array.of(1));
  expect((await store.get("team/key"))?.length).toBe(BYTES.length);
});

test("ten puts of one key at once leave one whole file and no drafts", async () => {
  const store = folderStore(folder);
  await Promise.all(Array.from({ length: 10 }, () => store.put("team/key", BYTES)));
  expect(await readdir(join(folder, "team"))).toEqual(["key"]);
  expect((await store.get("team/key"))?.length).toBe(BYTES.length);
});

test("a file is never seen half written", async () => {
  const large = new Uint8Array(32_000_000).fill(7);
  let isDone = false;
  const putting = folderStore(folder)
    .put("team/large", large)
    .finally(() => (isDone = true));
  const sizes = new Set<number>();
  let looks = 0;
  while (!isDone) {
    const found = statSync(join(folder, "team", "large"), { throwIfNoEntry: false });
    if (found) sizes.add(found.size);
    looks += 1;
    await new Promise((resolve) => setImmediate(resolve));
  }
  await putting;
  expect(looks).toBeGreaterThan(10);
  expect([...sizes].filter((size) => size !== large.length)).toEqual([]);
  expect((await folderStore(folder).get("team/large"))?.length).toBe(large.length);
});

test("a put that fails says so and leaves no draft behind", async () => {
  // A file stands where the folder of the key would have to be.
  await writeFile(join(folder, "team"), "in the way");
  await expect(folderStore(folder).put("team/key", BYTES)).rejects.toThrow();
  expect(await readdir(folder)).toEqual(["team"]);
});
