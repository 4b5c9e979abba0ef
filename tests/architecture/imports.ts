import { readFileSync, readdirSync } from "node:fs";
import { dirname, join, normalize, relative } from "node:path";
import { fileURLToPath } from "node:url";
import ts from "typescript";

export const ROOT = fileURLToPath(new URL("../..", import.meta.url)).replace(/\/$/, "");

/** All source files below a folder, as paths from the root. */
export function sourceFiles(folder: string): string[] {
  return readdirSync(join(ROOT, folder), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && /\.(ts|tsx|mjs)$/.test(entry.name))
    .map((entry) => relative(ROOT, join(entry.parentPath, entry.name)));
}

/** What a file imports: paths from the root without their ending, or package names. */
export function importsOf(file: string): string[] {
  const { importedFiles } = ts.preProcessFile(readFileSync(join(ROOT, file), "utf8"), true, true);
  return importedFiles.map(({ fileName }) => {
    if (fileName.startsWith("@/")) return fileName.slice(2);
    if (fileName.startsWith(".")) return normalize(join(dirname(file), fileName));
    return fileName;
  });
}
