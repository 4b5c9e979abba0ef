import { randomUUID } from "node:crypto";
import { unstable_rethrow } from "next/navigation";
import type { Context } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { CommandError } from "@/lib/commands/result";
import type { Result } from "@/lib/commands/result";

/** Runs a command and maps what it throws; an unknown error is logged under an id and not shown. */
export async function toResult<T>(work: () => Promise<T>): Promise<Result<T>> {
  try {
    return { ok: true, data: await work() };
  } catch (error) {
    unstable_rethrow(error);
    if (error instanceof CommandError) {
      const { code, message, fieldErrors } = error;
      return { ok: false, code, message, fieldErrors };
    }
    const id = randomUUID().slice(0, 8);
    console.error(`[${id}]`, error);
    const message = `Something went wrong on our side and nothing was stored. Mention ${id} when you report it.`;
    return { ok: false, code: "conflict", message, fieldErrors: {} };
  }
}

/** Body of a server action: builds the context, calls one command, maps the result. */
export function defineAction<I, T>(
  command: (ctx: Context, input: I) => Promise<T>,
): (input: I) => Promise<Result<T>> {
  return (input) => toResult(async () => command(await currentContext(), input));
}
