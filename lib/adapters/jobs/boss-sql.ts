import type { SQL } from "drizzle-orm";
import { sql } from "drizzle-orm";
import type PgBoss from "pg-boss";
import type { Database } from "@/db/client";

/** A statement with `$1` … and its values, as Drizzle takes it; a value used twice is sent twice. */
function statementOf(text: string, values: readonly unknown[]): SQL {
  const parts = text.split(/\$(\d+)/);
  return sql.join(
    parts.map((part, i) => (i % 2 === 0 ? sql.raw(part) : sql.param(values[Number(part) - 1]))),
  );
}

/** A connection or a transaction for pg-boss to run its statements in. */
export function bossSql(db: Database): PgBoss.Db {
  return {
    executeSql: async (text: string, values: unknown[] = []) => {
      const { rows } = await db.execute(statementOf(text, values));
      return { rows };
    },
  };
}
