import type { SQL } from "drizzle-orm";
import type { Db } from "./client";

/**
 * Rows of a hand-written query. Both drivers hand back `{ rows }`, which the shared Db type can't say; the caller
 * names the columns, and a parity test runs every such query on both.
 */
export async function selectRows<Row extends object>(db: Db, query: SQL): Promise<Row[]> {
  const result: unknown = await db.execute(query);
  return (result as { rows: Row[] }).rows;
}
