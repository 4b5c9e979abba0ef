import type { Database } from "@/db/client";
import type { Permission, Role } from "./permissions";
import { can } from "./permissions";

/** Who acts, for which team, on which database. Every command and query starts from one. */
export interface Context {
  db: Database;
  teamId: string;
  userId: string;
  role: Role;
}

export function isAllowed(ctx: Pick<Context, "role">, permission: Permission): boolean {
  return can(ctx.role, permission);
}
