import type { Database, Transaction } from "@/db/client";
import type { Permission, Role } from "./permissions";
import { can } from "./permissions";

/** Where whole files lie, by key. A key's bytes never change once put. */
export interface FileStore {
  put: (key: string, bytes: Uint8Array) => Promise<void>;
  /** null when nothing lies there. */
  get: (key: string) => Promise<Uint8Array | null>;
}

/** Work that is done after the request, by a worker. */
export interface JobQueue {
  /** Keeps a job as part of the transaction: one that is rolled back leaves none. */
  send: (tx: Transaction, name: string, data: Record<string, string>) => Promise<void>;
}

/** Who acts, for which team, on which database. Every command and query starts from one. */
export interface Context {
  db: Database;
  files: FileStore;
  jobs: JobQueue;
  teamId: string;
  userId: string;
  role: Role;
}

export function isAllowed(ctx: Pick<Context, "role">, permission: Permission): boolean {
  return can(ctx.role, permission);
}
