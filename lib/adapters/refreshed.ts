import { revalidatePath } from "next/cache";

/**
 * Waits for an action and has every page read anew when it changed something: a margin shows on
 * the overview, the program, the build and the ladder alike.
 */
export async function refreshed<R extends { ok: boolean }>(running: Promise<R>): Promise<R> {
  const result = await running;
  if (result.ok) revalidatePath("/", "layout");
  return result;
}
