import { ROLES } from "@/lib/auth/permissions";
import type { Role } from "@/lib/auth/permissions";

const DUTIES: Record<Role, string> = {
  admin: "everything, and people",
  engineer: "programs, benches, masks, sweeps, reports",
  manager: "programs, approving reports",
  liaison: "reading, handoffs to labs",
};

/** The four roles with a word on what each is for. */
export const ROLE_OPTIONS = ROLES.map((role) => ({
  value: role,
  label: `${role} (${DUTIES[role]})`,
}));
