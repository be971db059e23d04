import "server-only";
import { and, asc, eq, inArray, type SQL } from "drizzle-orm";
import { wards } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { requireAction, scopeOf, type Scope } from "@/lib/policy";
import { wardNotFound } from "./internal";

export type Ward = typeof wards.$inferSelect;

/** Condition that keeps a query to the wards of a scope; undefined where there is no bound. */
export function wardsWithin(scope: Scope): SQL | undefined {
  return scope.wards === "all" ? undefined : inArray(wards.id, [...scope.wards]);
}

/** The wards that the actor may know about, by name. */
export async function listWards({ ctx }: { ctx: Ctx }): Promise<Ward[]> {
  requireAction(ctx.actor, "ward.list");
  return ctx.db
    .select()
    .from(wards)
    .where(wardsWithin(scopeOf(ctx.actor)))
    .orderBy(asc(wards.name), asc(wards.code));
}

/** One ward within the actor's scope; not-found outside it. */
export async function getWardByCode({ ctx, code }: { ctx: Ctx; code: string }): Promise<Ward> {
  requireAction(ctx.actor, "ward.list");
  const [ward] = await ctx.db
    .select()
    .from(wards)
    .where(and(eq(wards.code, code.toUpperCase()), wardsWithin(scopeOf(ctx.actor))));
  if (!ward) throw wardNotFound();
  return ward;
}
