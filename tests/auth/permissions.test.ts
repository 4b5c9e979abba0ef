import { describe, expect, test } from "vitest";
import type { Permission } from "@/lib/auth/permissions";
import { PERMISSIONS, ROLES, can } from "@/lib/auth/permissions";

// The table of the product, written again by hand: A admin, E engineer, M manager, L liaison.
const EXPECTED: Record<Permission, string> = {
  "people.read": "A",
  "people.write": "A",
  "audit.read": "A",
  "program.read": "AEML",
  "program.write": "AEM",
  "bench.read": "AEML",
  "bench.write": "AE",
  "mask.read": "AEML",
  "mask.write": "AE",
  "sweep.read": "AEML",
  "sweep.write": "AE",
  "sweep.comment": "AEM",
  "suspect.assign": "AEM",
  "report.read": "AEML",
  "report.read-draft": "AEM",
  "report.write": "AE",
  "report.approve": "M",
  "handoff.read": "AEML",
  "handoff.write": "AEL",
};

describe("permission table", () => {
  for (const permission of PERMISSIONS) {
    for (const role of ROLES) {
      const allowed = EXPECTED[permission].includes(role.charAt(0).toUpperCase());
      test(`${role} ${allowed ? "may" : "may not"} ${permission}`, () => {
        expect(can(role, permission)).toBe(allowed);
      });
    }
  }
});
