/** Who compared a mask's limits with their own copy of the document, when, and with which copy. */
export interface MaskConfirmation {
  by: string;
  at: Date;
  copy: string;
}

/** The columns of a confirmation as one, null for a revision that nobody confirmed. */
export function confirmationOf(row: {
  confirmedByName: string | null;
  confirmedAt: Date | null;
  confirmedCopy: string | null;
}): MaskConfirmation | null {
  const { confirmedByName, confirmedAt, confirmedCopy } = row;
  if (confirmedAt === null) return null;
  return { by: confirmedByName ?? "somebody unknown", at: confirmedAt, copy: confirmedCopy ?? "" };
}
