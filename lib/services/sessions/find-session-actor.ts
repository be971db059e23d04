import "server-only";
import { and, eq, gt, isNull, lt, sql } from "drizzle-orm";
import { cover, hospital, people, personWards, sessions } from "@/db/schema";
import type { Db } from "@/db/client";
import { hasNamedWards, type PersonActor } from "@/lib/policy";
import { IDLE_LIMIT } from "./session-limits";

const MINUTE = 60 * 1000;
const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i;

/** Wards of the person and those that they cover on the hospital's date of `now`; as JSON, alike on both drivers. */
function wardIdsAt(now: Date) {
  const today = sql`to_char(${now.toISOString()}::timestamptz at time zone coalesce(${hospital.timeZone}, 'UTC'), 'YYYY-MM-DD')`;
  return sql<string[]>`(
    select coalesce(json_agg(open_wards.ward_id), '[]'::json) from (
      select ${personWards.wardId} from ${personWards} where ${personWards.personId} = ${people.id}
      union
      select ${cover.wardId} from ${cover}
      where ${cover.personId} = ${people.id} and ${today} between ${cover.fromDate} and ${cover.untilDate}
    ) as open_wards)`;
}

/**
 * Who a session belongs to, as of now: one query, nothing remembered between requests. Null where the session has
 * ended, ran out or lay idle, or the person is switched off.
 */
export async function findSessionActor({
  db,
  now,
  sessionId,
}: {
  db: Db;
  now: Date;
  sessionId: string;
}): Promise<PersonActor | null> {
  if (!UUID.test(sessionId)) return null;
  const [row] = await db
    .select({
      personId: people.id,
      name: people.name,
      email: people.email,
      role: people.role,
      grants: people.grants,
      lastSeenAt: sessions.lastSeenAt,
      wardIds: wardIdsAt(now),
    })
    .from(sessions)
    .innerJoin(people, eq(people.id, sessions.personId))
    .leftJoin(hospital, eq(hospital.id, 1))
    .where(
      and(
        eq(sessions.id, sessionId),
        isNull(sessions.endedAt),
        gt(sessions.expiresAt, now),
        gt(sessions.lastSeenAt, new Date(now.valueOf() - IDLE_LIMIT)),
        eq(people.state, "active"),
      ),
    );
  if (!row) return null;
  await touch(db, sessionId, row.lastSeenAt, now);
  const { personId, name, email, role, grants } = row;
  const wardIds = hasNamedWards(role) ? row.wardIds : [];
  return { kind: "person", personId, name, email, role, grants, wardIds, sessionId };
}

/** Notes that the session is in use, at most once a minute. */
async function touch(db: Db, sessionId: string, lastSeenAt: Date, now: Date): Promise<void> {
  const minuteAgo = new Date(now.valueOf() - MINUTE);
  if (lastSeenAt > minuteAgo) return;
  await db
    .update(sessions)
    .set({ lastSeenAt: now })
    .where(and(eq(sessions.id, sessionId), lt(sessions.lastSeenAt, now)));
}
