import { eq } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { auditEntries, people } from "@/db/schema";
import type { PersonActor, Role } from "@/lib/policy";
import { hashPassword, startSession } from "@/lib/services/sessions";
import { anonymousActor } from "@/lib/policy";
import { TEST_NOW, type TestStore } from "@/tests/support/store";

export const PASSWORD = "a tide that falls slowly";

/** One hash for all: making it is slow on purpose. */
const hash = hashPassword(PASSWORD);

/** Somebody who can sign in with PASSWORD. */
export async function addPerson(store: TestStore, role: Role, name: string): Promise<PersonActor> {
  const row = {
    id: uuidv7(),
    email: `${name.toLowerCase()}@example.test`,
    name,
    role,
    grants: [],
    state: "active" as const,
    passwordHash: await hash,
  };
  await store.db.insert(people).values(row);
  const { email, grants } = row;
  return { kind: "person", personId: row.id, name, email, role, grants, wardIds: [], sessionId: uuidv7() };
}

export async function personRow(store: TestStore, id: string) {
  const [row] = await store.db.select().from(people).where(eq(people.id, id));
  if (!row) throw new Error("no such person");
  return row;
}

export function signIn(
  store: TestStore,
  email: string,
  password = PASSWORD,
  at = TEST_NOW,
  address: string | null = null,
) {
  return startSession({ ctx: store.ctxFor(anonymousActor, at), input: { email, password, address } });
}

/** Entries of one action, oldest first. */
export async function auditOf(store: TestStore, action: string) {
  return store.db
    .select()
    .from(auditEntries)
    .where(eq(auditEntries.action, action))
    .orderBy(auditEntries.seq);
}
