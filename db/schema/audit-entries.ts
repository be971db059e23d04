import { bigint, check, index, pgTable, text, unique } from "drizzle-orm/pg-core";
import { sql } from "drizzle-orm";
import { instant } from "./columns";

/**
 * Who did what to which record. No foreign keys: entries outlive their subjects. Append-only by trigger and
 * chained: `hash` runs over the canonical text of the entry and the hash before it. Before and after are text,
 * because jsonb would reorder them and break the hash.
 */
export const auditEntries = pgTable(
  "audit_entries",
  {
    seq: bigint("seq", { mode: "number" }).primaryKey(),
    at: instant("at").notNull(),
    actorKind: text("actor_kind").notNull(),
    actorId: text("actor_id"),
    actorName: text("actor_name").notNull(),
    action: text("action").notNull(),
    subjectType: text("subject_type").notNull(),
    subjectId: text("subject_id").notNull(),
    before: text("before"),
    after: text("after"),
    requestId: text("request_id").notNull(),
    previousHash: text("previous_hash").notNull(),
    hash: text("hash").notNull(),
  },
  (table) => [
    unique("audit_entries_hash").on(table.hash),
    index("audit_entries_subject").on(table.subjectType, table.subjectId),
    check("audit_entries_seq", sql`${table.seq} > 0`),
  ],
);

/** One row: where the chain ends. Locking it orders the writers, briefly, at the end of their transactions. */
export const auditHead = pgTable("audit_head", {
  id: bigint("id", { mode: "number" }).primaryKey(),
  seq: bigint("seq", { mode: "number" }).notNull(),
  hash: text("hash").notNull(),
});
