import { describe, expect, test } from "vitest";
import { importsOf, sourceFiles } from "./imports";

const FOLDERS = ["app", "components", "lib", "db"];
const files = FOLDERS.flatMap(sourceFiles);

function violations(from: RegExp, isForbidden: (target: string) => boolean): string[] {
  return files
    .filter((file) => from.test(file))
    .flatMap((file) =>
      importsOf(file)
        .filter(isForbidden)
        .map((target) => `${file} -> ${target}`),
    );
}

describe("direction of imports", () => {
  test("the rules look at real files", () => {
    expect(files.length).toBeGreaterThan(40);
    expect(importsOf("db/client.ts")).toContain("db/schema");
  });

  test("lib/core imports nothing outside itself but fft.js", () => {
    const allowed = (target: string) => target.startsWith("lib/core/") || target === "fft.js";
    expect(violations(/^lib\/core\//, (target) => !allowed(target))).toEqual([]);
  });

  test("app and components never reach the database", () => {
    const isDatabase = (target: string) => /^(db(\/|$)|drizzle-orm|pg$)/.test(target);
    expect(violations(/^(app|components)\//, isDatabase)).toEqual([]);
  });

  test("components know only the core, each other and client-safe modules", () => {
    const isServer = (target: string) =>
      /^(lib\/(queries|adapters|reports|launch)|app)(\/|$)/.test(target) ||
      (target.startsWith("lib/commands/") && !target.endsWith("/schemas")) ||
      (target.startsWith("lib/auth/") && target !== "lib/auth/permissions");
    expect(violations(/^components\//, isServer)).toEqual([]);
  });

  test("commands and queries stay clear of screens and of Next.js", () => {
    const isScreen = (target: string) =>
      /^(app|components|lib\/adapters)\/|^next(\/|$)/.test(target);
    expect(violations(/^lib\/(commands|queries)\//, isScreen)).toEqual([]);
  });
});

describe("circles", () => {
  test("no file imports itself through others", () => {
    const names = new Map(files.map((file) => [file.replace(/(\/index)?\.(tsx?|mjs)$/, ""), file]));
    const done = new Set<string>();
    const circles: string[] = [];
    const visit = (file: string, trail: string[]) => {
      if (trail.includes(file)) {
        circles.push([...trail.slice(trail.indexOf(file)), file].join(" -> "));
        return;
      }
      if (done.has(file)) return;
      for (const target of importsOf(file)) {
        const next = names.get(target.replace(/\.mjs$/, ""));
        if (next) visit(next, [...trail, file]);
      }
      done.add(file);
    };
    for (const file of files) visit(file, []);
    expect(circles).toEqual([]);
  });
});
