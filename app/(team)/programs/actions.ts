"use server";

import { defineAction } from "@/lib/adapters/define-action";
import { refreshed } from "@/lib/adapters/refreshed";
import { createBuild } from "@/lib/commands/program/create-build";
import { createProgram } from "@/lib/commands/program/create-program";

const runCreateProgram = defineAction(createProgram);
const runCreateBuild = defineAction(createBuild);

export async function addProgram(input: unknown) {
  return refreshed(runCreateProgram(input));
}

export async function addBuild(input: unknown) {
  return refreshed(runCreateBuild(input));
}
