import { existsSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, test } from "vitest";
import { ROOT, sourceFiles } from "./imports";

describe("papers", () => {
  for (const paper of ["README.md", "DEVELOPERS.md"]) {
    test(`every path that ${paper} names exists`, () => {
      const text = readFileSync(join(ROOT, paper), "utf8");
      const paths = [...text.matchAll(/`([\w.@()[\]-]+(?:\/[\w.@()[\]-]*)+)`/g)].map((m) => m[1]!);
      expect(paths.length).toBeGreaterThan(0);
      expect(paths.filter((path) => !existsSync(join(ROOT, path)))).toEqual([]);
    });
  }
});

describe("files", () => {
  test("none is longer than 300 lines", () => {
    const long = ["app", "components", "lib", "db", "tests"]
      .flatMap(sourceFiles)
      .filter((file) => readFileSync(join(ROOT, file), "utf8").split("\n").length > 301);
    expect(long).toEqual([]);
  });
});
