"use server";

import { defineAction } from "@/lib/adapters/define-action";
import { refreshed } from "@/lib/adapters/refreshed";
import { approveReport } from "@/lib/commands/report/approve-report";
import { createReport } from "@/lib/commands/report/create-report";
import { discardDraft } from "@/lib/commands/report/discard-draft";
import { editReport } from "@/lib/commands/report/edit-report";
import { issueReport } from "@/lib/commands/report/issue-report";
import { withdrawReport } from "@/lib/commands/report/withdraw-report";

const runCreate = defineAction(createReport);
const runEdit = defineAction(editReport);
const runDiscard = defineAction(discardDraft);
const runIssue = defineAction(issueReport);
const runApprove = defineAction(approveReport);
const runWithdraw = defineAction(withdrawReport);

export async function draftReport(input: unknown) {
  return refreshed(runCreate(input));
}

export async function changeDraft(input: unknown) {
  return refreshed(runEdit(input));
}

export async function throwDraftAway(reportId: string) {
  return refreshed(runDiscard({ reportId }));
}

export async function issueDraft(reportId: string) {
  return refreshed(runIssue({ reportId }));
}

export async function approveIssued(reportId: string) {
  return refreshed(runApprove({ reportId }));
}

export async function withdrawIssued(input: unknown) {
  return refreshed(runWithdraw(input));
}
