"use server";

import { defineAction } from "@/lib/adapters/define-action";
import { refreshed } from "@/lib/adapters/refreshed";
import { archiveBench } from "@/lib/commands/bench/archive-bench";
import { createBench } from "@/lib/commands/bench/create-bench";
import { editBench } from "@/lib/commands/bench/edit-bench";
import { restoreBench } from "@/lib/commands/bench/restore-bench";
import { reviseBudget } from "@/lib/commands/bench/revise-budget";
import { reviseSignalPath } from "@/lib/commands/bench/revise-signal-path";
import { setGuardRule } from "@/lib/commands/bench/set-guard-rule";
import { readFactorTable } from "@/lib/queries/bench/read-factor-table";

const runCreateBench = defineAction(createBench);
const runEditBench = defineAction(editBench);
const runArchiveBench = defineAction(archiveBench);
const runRestoreBench = defineAction(restoreBench);
const runReviseSignalPath = defineAction(reviseSignalPath);
const runReviseBudget = defineAction(reviseBudget);
const runSetGuardRule = defineAction(setGuardRule);
const runReadFactorTable = defineAction(readFactorTable);

export async function addBench(input: unknown) {
  return refreshed(runCreateBench(input));
}

export async function changeBench(input: unknown) {
  return refreshed(runEditBench(input));
}

export async function putBenchAway(input: unknown) {
  return refreshed(runArchiveBench(input));
}

export async function bringBenchBack(input: unknown) {
  return refreshed(runRestoreBench(input));
}

export async function saveSignalPath(input: unknown) {
  return refreshed(runReviseSignalPath(input));
}

export async function saveBudget(input: unknown) {
  return refreshed(runReviseBudget(input));
}

export async function saveGuardRule(input: unknown) {
  return refreshed(runSetGuardRule(input));
}

export async function readTypedTable(input: unknown) {
  return runReadFactorTable(input);
}
