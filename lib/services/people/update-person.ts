import "server-only";
import { eq } from "drizzle-orm";
import { people } from "@/db/schema";
import { withTransaction, type Ctx, type TxCtx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { authorize, LEAD_ROLE, mayHoldGrants, requireAction } from "@/lib/policy";
import type { PersonRecord, UpdatePersonInput } from "@/lib/schemas/person";
import { writeAudit } from "@/lib/services/audit";
import { endSessionsOf } from "@/lib/services/sessions";
import { isPlaceholder } from "./first-lead-email";
import { lockActiveLeads, requireGrantable, setWards } from "./internal";
import { toRecords } from "./queries";

type PersonRow = typeof people.$inferSelect;

/** Changes name, role, wards, extra powers, or switches on and off. Takes effect with the person's next request. */
export async function updatePerson({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: UpdatePersonInput & { id: string };
}): Promise<PersonRecord> {
  requireAction(ctx.actor, "people.update");
  return withTransaction(ctx, async (tx) => {
    const leads = await lockActiveLeads(tx.db);
    const [row] = await tx.db.select().from(people).where(eq(people.id, input.id)).for("update");
    if (!row || isPlaceholder(row.email)) throw new DomainError("not-found", "There is no such person.");
    authorize(tx.actor, "people.update", {});
    const before = await recordOf(tx, row);
    if (row.version !== input.version) {
      throw new DomainError("stale", `Somebody else changed ${row.name} meanwhile.`, { current: before });
    }

    const next = nextRow(row, input);
    requireGrantable(next.role, next.grants);
    requireLeadLeft(leads, next);
    const [saved] = await tx.db.update(people).set(next).where(eq(people.id, row.id)).returning();
    if (!saved) throw new Error("A person was not saved.");
    await setWards(tx, row.id, saved.role, input.wards ?? before.wards);
    const sessionsEnded = saved.state === "off" ? await endSessionsOf(tx, row.id, "switched-off") : 0;
    const after = await recordOf(tx, saved);
    writeAudit(tx, {
      action: "person.update",
      subject: { type: "person", id: row.id },
      before,
      after: { ...after, sessionsEnded },
    });
    return after;
  });
}

async function recordOf(tx: TxCtx, row: PersonRow): Promise<PersonRecord> {
  const [record] = await toRecords(tx.db, [row]);
  if (!record) throw new Error("A person can't be read back.");
  return record;
}

function nextRow(row: PersonRow, input: UpdatePersonInput): PersonRow {
  const role = input.role ?? row.role;
  // Powers that a new role can't hold go with the old one, unless they were asked for by name.
  const kept = mayHoldGrants(role) ? row.grants : [];
  return {
    ...row,
    name: input.name ?? row.name,
    role,
    grants: input.grants ?? kept,
    state: nextState(row, input.state),
    version: row.version + 1,
  };
}

/** Switched on again, somebody who never chose a password is still only invited. */
function nextState(row: PersonRow, asked: "active" | "off" | undefined): PersonRow["state"] {
  if (asked === undefined) return row.state;
  if (asked === "off") return "off";
  return row.passwordHash === null ? "invited" : "active";
}

function requireLeadLeft(activeLeads: readonly string[], next: PersonRow): void {
  const staysLead = next.role === LEAD_ROLE && next.state === "active";
  if (staysLead || !activeLeads.includes(next.id) || activeLeads.length > 1) return;
  throw new DomainError(
    "precondition",
    "The last quality lead stays: without one nobody could set anything up.",
  );
}
