type Params = Record<string, string | string[] | undefined>;

/** Where the files go: a build, and perhaps a step of one of its ladders. */
export function readImportParams(params: Params): { buildId: string; stepId: string | null } {
  const one = (name: string) => (typeof params[name] === "string" ? params[name] : "");
  return { buildId: one("build"), stepId: one("step") || null };
}
