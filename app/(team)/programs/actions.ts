"use server";

import { revalidatePath } from "next/cache";
import { defineAction } from "@/lib/adapters/define-action";
import { createBuild } from "@/lib/commands/program/create-build";
import { createProgram } from "@/lib/commands/program/create-program";

const runCreateProgram = defineAction(createProgram);
const runCreateBuild = defineAction(createBuild);

export async function addProgram(input: unknown) {
  const result = await runCreateProgram(input);
  if (result.ok) revalidatePath("/", "layout");
  return result;
}

export async function addBuild(input: unknown) {
  const result = await runCreateBuild(input);
  if (result.ok) revalidatePath("/", "layout");
  return result;
}
