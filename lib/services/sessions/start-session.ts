import "server-only";
import { eq } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { people, sessions } from "@/db/schema";
import { withTransaction, type Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import type { PersonActor } from "@/lib/policy";
import { signInSchema } from "@/lib/schemas/sign-in";
import { writeAudit } from "@/lib/services/audit";
import { isPassword, NOBODYS_HASH } from "./password-hash";
import { ABSOLUTE_LIMIT } from "./session-limits";
import { countTry, forgetTries, type TryKeys } from "./throttle";

export interface SignInTry {
  email: unknown;
  password: unknown;
  address: string | null;
}

export interface StartedSession {
  sessionId: string;
  personId: string;
  name: string;
  email: string;
}

/** The same words whatever was wrong: they must not tell which addresses have an account. */
const refused = () => new DomainError("unauthenticated", "The email or the password isn't right.");

type PersonRow = typeof people.$inferSelect;

/**
 * Signs somebody in. Counted before the password is looked at; an unknown address costs the same work as a known
 * one; the hash is compared outside any transaction.
 */
export async function startSession({ ctx, input }: { ctx: Ctx; input: SignInTry }): Promise<StartedSession> {
  const parsed = signInSchema.safeParse({ email: input.email, password: input.password });
  if (!parsed.success) throw refused();
  const { email, password } = parsed.data;
  const keys: TryKeys = { email, address: input.address };

  const wait = await countTry({ ctx, keys });
  if (wait > 0) {
    throw new DomainError("rate-limited", "Too many tries. Wait a little, then try again.", {
      retryAfter: wait,
    });
  }

  const [person] = await ctx.db.select().from(people).where(eq(people.email, email));
  const isRight = await isPassword(password, person?.passwordHash ?? NOBODYS_HASH);
  if (!person || !isRight || person.state !== "active") {
    await noteRefusal(ctx, person);
    throw refused();
  }
  return openSession(ctx, person, keys);
}

async function openSession(ctx: Ctx, seen: PersonRow, keys: TryKeys): Promise<StartedSession> {
  const sessionId = uuidv7();
  const actor: PersonActor = { kind: "person", ...seen, wardIds: [], sessionId, personId: seen.id };
  return withTransaction({ ...ctx, actor }, async (tx) => {
    // Between reading the hash and now the person may have been switched off or chosen another password.
    const [person] = await tx.db.select().from(people).where(eq(people.id, seen.id)).for("share");
    if (person?.state !== "active" || person.passwordHash !== seen.passwordHash) throw refused();
    await tx.db.insert(sessions).values({
      id: sessionId,
      personId: person.id,
      createdAt: tx.now,
      lastSeenAt: tx.now,
      expiresAt: new Date(tx.now.valueOf() + ABSOLUTE_LIMIT),
    });
    await forgetTries({ ctx: tx, keys });
    writeAudit(tx, { action: "session.start", subject: { type: "session", id: sessionId } });
    return { sessionId, personId: person.id, name: person.name, email: person.email };
  });
}

/** Names the account that was tried, never what was typed: an unknown address may be a mistyped password. */
async function noteRefusal(ctx: Ctx, person: PersonRow | undefined): Promise<void> {
  // eslint-disable-next-line house/guarded-transaction -- whoever signs in has no role yet; the password is the right
  await withTransaction(ctx, async (tx) => {
    writeAudit(tx, {
      action: "session.refuse",
      subject: { type: "person", id: person?.id ?? "unknown" },
      after: { state: person?.state ?? "unknown" },
    });
  });
}
