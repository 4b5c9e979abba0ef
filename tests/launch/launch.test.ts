import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, describe, expect, test } from "vitest";
import {
  addCounts,
  closingLine,
  playwrightCounts,
  vitestCounts,
} from "../../lib/launch/counts.mjs";
import { missingSentence } from "../../lib/launch/debian.mjs";
import { freePort, isFree } from "../../lib/launch/free-port.mjs";
import { choosePort } from "../../lib/launch/launch.mjs";
import { checkNode } from "../../lib/launch/prepare.mjs";
import { hashSources, isStamped, stamp } from "../../lib/launch/sources.mjs";

const folder = mkdtempSync(join(tmpdir(), "neap-launch-"));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

describe("counting", () => {
  test("adds steps and writes the closing line", () => {
    const sum = addCounts([
      { passed: 2, failed: 0, skipped: 1 },
      { passed: 3, failed: 1, skipped: 0 },
    ]);
    expect(closingLine(sum)).toBe("5 passed, 1 failed, 1 skipped");
  });

  test("a vitest run that crashed, or ran nothing, counts as failed", () => {
    const report = { numPassedTests: 4, numFailedTests: 0, numPendingTests: 0, numTodoTests: 0 };
    expect(vitestCounts({ ...report, numTotalTests: 4 }, 0).failed).toBe(0);
    expect(vitestCounts({ ...report, numTotalTests: 4 }, 1).failed).toBe(1);
    expect(vitestCounts({ ...report, numPassedTests: 0, numTotalTests: 0 }, 0).failed).toBe(1);
    expect(vitestCounts(null, 0).failed).toBe(1);
  });

  test("a flaky browser test counts as failed", () => {
    const stats = { expected: 2, unexpected: 0, flaky: 1, skipped: 0 };
    expect(playwrightCounts({ stats }, 0)).toEqual({ passed: 2, failed: 1, skipped: 0 });
  });
});

describe("ports", () => {
  test("a port in use is not free, and asking for it says so with the remedy", async () => {
    const server = createServer();
    await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
    const address = server.address();
    const port = typeof address === "object" && address ? address.port : 0;
    expect(await isFree(port)).toBe(false);
    expect(await freePort(port)).not.toBe(port);
    await expect(choosePort(String(port))).rejects.toThrow(/in use.*PORT=/);
    await new Promise((resolve) => server.close(resolve));
    expect(await choosePort(String(port))).toBe(port);
  });

  test("a PORT that is no port is refused", async () => {
    await expect(choosePort("70000")).rejects.toThrow("from 1 to 65535");
    await expect(choosePort("web")).rejects.toThrow("from 1 to 65535");
  });
});

describe("sources", () => {
  test("the hash follows names and bytes, and a stamp remembers it", () => {
    writeFileSync(join(folder, "a.ts"), "one");
    const first = hashSources(folder, ["a.ts", "missing"]);
    expect(hashSources(folder, ["a.ts"])).toBe(first);
    writeFileSync(join(folder, "a.ts"), "two");
    expect(hashSources(folder, ["a.ts"])).not.toBe(first);
    const file = join(folder, "deep", "stamp");
    expect(isStamped(file, first)).toBe(false);
    stamp(file, first);
    expect(isStamped(file, first)).toBe(true);
  });
});

describe("what cannot be set up", () => {
  test("is one sentence with the remedy, for root and for others", () => {
    const rootless = missingSentence("PostgreSQL", ["postgresql"], false);
    expect(rootless).toContain("needs root; run `sudo apt-get install postgresql`");
    expect(missingSentence("PostgreSQL", ["postgresql"], true)).toContain("could not be installed");
  });

  test("an old Node.js is named with the version that is needed", () => {
    expect(() => checkNode("18.19.0")).toThrow("Node.js 20.9 or newer is needed, this is 18.19.0");
    expect(() => checkNode("20.9.0")).not.toThrow();
    expect(() => checkNode("22.1.0")).not.toThrow();
  });
});
