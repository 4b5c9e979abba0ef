import { readdir, readFile } from "node:fs/promises";
import { basename, join } from "node:path";
import type { Mask } from "@/lib/core/mask/mask";
import { maskFromJson } from "@/lib/core/mask/mask-json";

async function readShippedMask(folder: string, file: string): Promise<Mask> {
  const text = await readFile(join(/* turbopackIgnore: true */ folder, file), "utf8");
  let json: unknown;
  try {
    json = JSON.parse(text);
  } catch (error) {
    throw new Error(`The shipped mask ${file} is no JSON.`, { cause: error });
  }
  const read = maskFromJson(json);
  if (!read.ok) {
    const problems = read.problems.map(({ path, text: what }) => `${path}: ${what}`).join(" ");
    throw new Error(`The shipped mask ${file} cannot be used. ${problems}`);
  }
  if (read.mask.key !== basename(file, ".json"))
    throw new Error(`The shipped mask ${file} names another key, "${read.mask.key}".`);
  if (read.mask.key.startsWith("team-"))
    throw new Error(`The shipped mask ${file} has a key kept for the masks of teams.`);
  return read.mask;
}

/** The masks of the folder `masks/`, by key; throws with the file's name when one is broken. */
export async function readShippedMasks(folder = join(process.cwd(), "masks")): Promise<Mask[]> {
  const files = (await readdir(/* turbopackIgnore: true */ folder))
    .filter((file) => file.endsWith(".json"))
    .sort();
  return Promise.all(files.map((file) => readShippedMask(folder, file)));
}
