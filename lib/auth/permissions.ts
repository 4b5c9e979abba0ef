/** The four roles of a team member. Share links are not members and have no role. */
export const ROLES = ["admin", "engineer", "manager", "liaison"] as const;
export type Role = (typeof ROLES)[number];

/** One permission per cell of the product's table; call sites name these, never roles. */
export const PERMISSIONS = [
  "people.read",
  "people.write",
  "audit.read",
  "program.read",
  "program.write",
  "bench.read",
  "bench.write",
  "mask.read",
  "mask.write",
  "sweep.read",
  "sweep.write",
  "sweep.comment",
  "suspect.assign",
  "report.read",
  "report.read-draft",
  "report.write",
  "report.approve",
  "handoff.read",
  "handoff.write",
] as const;
export type Permission = (typeof PERMISSIONS)[number];

const READ_ALL: Permission[] = [
  "program.read",
  "bench.read",
  "mask.read",
  "sweep.read",
  "report.read",
  "handoff.read",
];

const WORK: Permission[] = [
  ...READ_ALL,
  "program.write",
  "bench.write",
  "mask.write",
  "sweep.write",
  "sweep.comment",
  "suspect.assign",
  "report.read-draft",
  "report.write",
  "handoff.write",
];

const TABLE: Record<Role, ReadonlySet<Permission>> = {
  admin: new Set([...WORK, "people.read", "people.write", "audit.read"]),
  engineer: new Set(WORK),
  manager: new Set([
    ...READ_ALL,
    "program.write",
    "sweep.comment",
    "suspect.assign",
    "report.read-draft",
    "report.approve",
  ]),
  liaison: new Set([...READ_ALL, "handoff.write"]),
};

export function can(role: Role, permission: Permission): boolean {
  return TABLE[role].has(permission);
}
