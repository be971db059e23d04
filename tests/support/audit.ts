import { asc, sql } from "drizzle-orm";
import type { Db } from "@/db/client";
import { auditEntries } from "@/db/schema";

/** Audit entries in order, each with its texts parsed. */
export async function auditRows(db: Db) {
  const rows = await db.select().from(auditEntries).orderBy(asc(auditEntries.seq));
  return rows.map((row) => ({ ...row, before: parsed(row.before), after: parsed(row.after) }));
}

/** Runs work while every audit entry is refused by the database, as a full disk or a bug would. */
export async function withBrokenAudit(db: Db, work: () => Promise<void>): Promise<void> {
  await db.execute(sql`
    create function break_audit() returns trigger language plpgsql as
    $$ begin raise exception 'no audit today'; end; $$
  `);
  await db.execute(
    sql`create trigger break_audit before insert on audit_entries for each row execute function break_audit()`,
  );
  try {
    await work();
  } finally {
    await db.execute(sql`drop trigger break_audit on audit_entries`);
    await db.execute(sql`drop function break_audit()`);
  }
}

function parsed(text: string | null): unknown {
  return text === null ? null : JSON.parse(text);
}
