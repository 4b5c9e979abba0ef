const PAST: Record<string, string> = {
  create: "created",
  add: "added",
  edit: "edited",
  remove: "removed",
  delete: "deleted",
  copy: "copied",
  import: "imported",
  archive: "archived",
  restore: "restored",
  revise: "revised",
  confirm: "confirmed",
  issue: "issued",
  approve: "approved",
  withdraw: "withdrew",
  share: "shared",
  revoke: "revoked",
  assign: "assigned",
  deactivate: "deactivated",
  reactivate: "reactivated",
};

/** Actions whose words are not simply "did the thing". */
const WHOLE: Record<string, string> = {
  "program.set-masks": "set the masks of program",
  "program.restate-distance": "asked to restate the sweeps' distance of program",
  "program.hold-as-taken": "took back the restating of the sweeps' distance of program",
  "program.set-milestones": "set the milestones of program",
  "build.set-clocks": "set the clocks of build",
  "member.change-role": "changed the role of member",
  "member.change-password": "changed the password of member",
  "bench.revise-signal-path": "revised the signal path of bench",
  "bench.revise-budget": "revised the uncertainty budget of bench",
  "bench.set-guard-rule": "set the guard rule of bench",
  "equipment.record-calibration": "recorded a calibration of",
  "equipment.withdraw-calibration": "withdrew a calibration of",
  "mask.recompute": "tried again to put in force mask",
  "sweep.accept-mismatch": "accepted a mismatch in the delta of sweep",
  "sweep.withdraw-acceptance": "took back an accepted mismatch in the delta of sweep",
  "ladder.reorder-steps": "changed the order of the steps of ladder",
  "step.set-state": "marked as kept or dropped the step",
  "step.put-on-record": "put on record the step",
  "bench-check.record": "recorded bench check",
  "suspect.follow": "started to follow",
  "suspect.edit": "edited",
  "suspect.assign": "changed the owner of",
  "suspect.set-state": "changed the state of",
  "suspect.add-note": "added a note to",
};

const words = (text: string) => text.replaceAll("-", " ");

/**
 * An action in words, "edited program". One that is not known here keeps its own name rather than
 * being told wrongly: "sweep: link trace".
 */
export function describeAction(action: string): string {
  const whole = WHOLE[action];
  if (whole) return whole;
  const [subject = action, verb = ""] = action.split(".");
  const past = PAST[verb];
  if (past) return `${past} ${words(subject)}`;
  return verb ? `${words(subject)}: ${words(verb)}` : words(subject);
}

const isRecord = (value: unknown): value is Record<string, unknown> =>
  typeof value === "object" && value !== null && !Array.isArray(value);

function show(value: unknown): string {
  if (value === null || value === undefined || value === "") return "not stated";
  if (Array.isArray(value)) return value.length === 0 ? "none" : value.map(show).join("; ");
  if (isRecord(value)) {
    return Object.entries(value)
      .map(([key, inner]) => `${key} ${show(inner)}`)
      .join(", ");
  }
  return String(value);
}

/** The details of an event, one line per field; what changed is told as it was and as it became. */
export function describeDetail(detail: unknown): { label: string; text: string }[] {
  if (!isRecord(detail)) return detail === null ? [] : [{ label: "detail", text: show(detail) }];
  const { from, to, ...rest } = detail;
  const lines = Object.entries(rest).map(([label, value]) => ({ label, text: show(value) }));
  if (isRecord(from) && isRecord(to)) {
    for (const label of new Set([...Object.keys(from), ...Object.keys(to)])) {
      lines.push({ label, text: `${show(from[label])} → ${show(to[label])}` });
    }
  } else if (from !== undefined || to !== undefined) {
    lines.push({ label: "before", text: show(from) }, { label: "after", text: show(to) });
  }
  return lines;
}

/** What the subject is called: today's name, else the one that was written down, else its id. */
export function nameSubject(event: {
  subjectName: string | null;
  subjectId: string;
  detail: unknown;
}): string {
  if (event.subjectName) return event.subjectName;
  const detail = isRecord(event.detail) ? event.detail : {};
  for (const key of ["name", "title", "key"]) {
    const written = detail[key];
    if (typeof written === "string" && written) return written;
  }
  return event.subjectId.slice(0, 8);
}
