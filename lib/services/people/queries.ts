import "server-only";
import { asc, eq, inArray, sql } from "drizzle-orm";
import type { Db } from "@/db/client";
import { people, personWards, sessions, wards } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { requireAction } from "@/lib/policy";
import type { Me, PersonRecord } from "@/lib/schemas/person";
import { isPlaceholder } from "./first-lead-email";

type PersonRow = typeof people.$inferSelect;

function toRecord(row: PersonRow, wardCodes: string[], lastSignedInAt: string | null): PersonRecord {
  const { id, email, name, role, grants, state, version } = row;
  return { id, email, name, role, grants, wards: wardCodes, state, version, lastSignedInAt };
}

async function wardCodesOf(db: Db, personIds: string[]): Promise<Map<string, string[]>> {
  const rows = await db
    .select({ personId: personWards.personId, code: wards.code })
    .from(personWards)
    .innerJoin(wards, eq(wards.id, personWards.wardId))
    .where(inArray(personWards.personId, personIds))
    .orderBy(asc(wards.code));
  const codes = new Map<string, string[]>();
  for (const { personId, code } of rows) codes.set(personId, [...(codes.get(personId) ?? []), code]);
  return codes;
}

async function lastSignInsOf(db: Db, personIds: string[]): Promise<Map<string, string>> {
  const rows = await db
    .select({ personId: sessions.personId, at: sql<string | Date>`max(${sessions.createdAt})` })
    .from(sessions)
    .where(inArray(sessions.personId, personIds))
    .groupBy(sessions.personId);
  return new Map(rows.map(({ personId, at }) => [personId, new Date(at).toISOString()]));
}

export async function toRecords(db: Db, rows: PersonRow[]): Promise<PersonRecord[]> {
  if (rows.length === 0) return [];
  const ids = rows.map((row) => row.id);
  const codes = await wardCodesOf(db, ids);
  const lastSignIns = await lastSignInsOf(db, ids);
  return rows.map((row) => toRecord(row, codes.get(row.id) ?? [], lastSignIns.get(row.id) ?? null));
}

/** Everybody, by name. The stand-in for a first lead who hasn't come yet is nobody. */
export async function listPeople({ ctx }: { ctx: Ctx }): Promise<PersonRecord[]> {
  requireAction(ctx.actor, "people.list");
  const rows = await ctx.db.select().from(people).orderBy(asc(people.name), asc(people.email));
  return toRecords(
    ctx.db,
    rows.filter((row) => !isPlaceholder(row.email)),
  );
}

/** Who asks, with the codes of their own wards and of those that they cover today. */
export async function getMe({ ctx }: { ctx: Ctx }): Promise<Me> {
  requireAction(ctx.actor, "me.read");
  if (ctx.actor.kind !== "person") throw new DomainError("precondition", "Only a person has a name here.");
  const { email, name, role, wardIds } = ctx.actor;
  if (wardIds.length === 0) return { email, name, role, wards: [] };
  const rows = await ctx.db
    .select({ code: wards.code })
    .from(wards)
    .where(inArray(wards.id, [...wardIds]))
    .orderBy(asc(wards.code));
  return { email, name, role, wards: rows.map((row) => row.code) };
}

/** Ids of wards by code, in no order; throws `invalid` naming the first code that is unknown. */
export async function wardIdsOf(db: Db, codes: readonly string[]): Promise<string[]> {
  const wanted = [...new Set(codes)];
  if (wanted.length === 0) return [];
  const rows = await db
    .select({ id: wards.id, code: wards.code })
    .from(wards)
    .where(inArray(wards.code, wanted));
  const known = new Set(rows.map((row) => row.code));
  const missing = wanted.find((code) => !known.has(code));
  if (missing !== undefined) {
    const message = `There is no ward ${missing}.`;
    throw new DomainError("invalid", message, { errors: [{ path: "wards", message }] });
  }
  return rows.map((row) => row.id);
}
