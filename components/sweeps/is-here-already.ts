import type { DeskFile } from "./desk-file";

/** The same bytes were imported before, and nobody has asked for them once more. */
export function isHereAlready({ preview, again }: Pick<DeskFile, "preview" | "again">): boolean {
  return !again && preview !== null && preview.same.length > 0;
}
