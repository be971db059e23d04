import { eq, sql } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { auditEntries, auditHead } from "@/db/schema";
import { asMonth } from "@/lib/indicators/month";
import { auditPageSchema, auditQuery } from "@/lib/schemas/audit";
import { getAuditPage } from "@/lib/services/audit";
import { createWard, updateWard } from "@/lib/services/wards";
import { makeTestStore, type TestStore } from "@/tests/support/store";

const ENTRIES = 7;

let store: TestStore;
beforeAll(async () => {
  store = await makeTestStore();
  const ctx = store.ctxFor(store.lead);
  const ward = {
    code: "OSIER",
    name: "Name 0",
    division: "Medicine",
    openFrom: asMonth("2024-01"),
    openTo: null,
  };
  await createWard({ ctx, input: ward });
  for (let version = 1; version < ENTRIES; version += 1) {
    await updateWard({ ctx, input: { code: "OSIER", name: `Name ${version}`, version } });
  }
});
afterAll(() => store.close());

const page = (input: { cursor?: number; limit?: number } = {}) =>
  getAuditPage({ ctx: store.ctxFor(store.lead), input });

/** Does what nobody may, behind the trigger's back, and puts it right afterwards. */
async function tampered(
  change: () => Promise<unknown>,
  restore: () => Promise<unknown>,
  look: () => Promise<void>,
) {
  await store.db.execute(sql`alter table audit_entries disable trigger user`);
  try {
    await change();
    await look();
    await restore();
  } finally {
    await store.db.execute(sql`alter table audit_entries enable trigger user`);
  }
}

describe("getAuditPage", () => {
  it("says who did what, newest first, in the shape that the API promises", async () => {
    const first = auditPageSchema.parse(await page({ limit: 2 }));
    expect(first.items.map((entry) => entry.seq)).toEqual([7, 6]);
    expect(first.items[0]).toMatchObject({
      actor: { kind: "person", id: store.lead.personId, name: "Test lead" },
      action: "ward.update",
      subjectType: "ward",
      before: { name: "Name 5", version: 6 },
      after: { name: "Name 6", version: 7 },
    });
    expect(first.chain).toMatchObject({ intact: true, entries: ENTRIES, brokenAt: null });
    expect(first.chain.headHash).toBe(first.items[0]?.hash);
  });

  it("pages through all entries once and ends", async () => {
    const seen: number[] = [];
    let cursor: string | undefined;
    do {
      const next: { items: { seq: number }[]; nextCursor: string | null } = await page(
        auditQuery.parse({ limit: "3", ...(cursor ? { cursor } : {}) }),
      );
      seen.push(...next.items.map((entry) => entry.seq));
      cursor = next.nextCursor ?? undefined;
    } while (cursor !== undefined);
    expect(seen).toEqual([7, 6, 5, 4, 3, 2, 1]);
  });

  it("is a lead's alone", async () => {
    for (const actor of [store.infection, store.board, store.nurseOf()]) {
      const attempt = getAuditPage({ ctx: store.ctxFor(actor), input: {} });
      await expect(attempt).rejects.toMatchObject({ code: "forbidden" });
    }
  });

  it("finds an entry that was altered", async () => {
    const where = eq(auditEntries.seq, 3);
    const [original] = await store.db.select().from(auditEntries).where(where);
    const setAfter = (after: string | null | undefined) =>
      store.db.update(auditEntries).set({ after }).where(where);
    await tampered(
      () => setAfter("not even JSON"),
      () => setAfter(original?.after),
      async () => {
        const found = await page();
        expect(found.chain).toMatchObject({ intact: false, brokenAt: 3 });
        expect(found.items.find((entry) => entry.seq === 3)?.after).toBe("not even JSON");
      },
    );
    expect((await page()).chain.intact).toBe(true);
  });

  it("finds a tail that was cut off", async () => {
    const where = eq(auditEntries.seq, ENTRIES);
    const [last] = await store.db.select().from(auditEntries).where(where);
    if (!last) throw new Error("no last entry");
    await tampered(
      () => store.db.delete(auditEntries).where(where),
      () => store.db.insert(auditEntries).values(last),
      async () => expect((await page()).chain).toMatchObject({ intact: false, brokenAt: ENTRIES }),
    );
    expect((await store.db.select().from(auditHead))[0]?.seq).toBe(ENTRIES);
  });

  it("can't be altered through the database's own door", async () => {
    const change = store.db
      .update(auditEntries)
      .set({ actorName: "Somebody else" })
      .where(eq(auditEntries.seq, 1));
    await expect(change).rejects.toThrow();
    await expect(store.db.delete(auditEntries).where(eq(auditEntries.seq, 1))).rejects.toThrow();
  });

  it("never calls an unbroken chain broken while others write", async () => {
    const ctx = store.ctxFor(store.lead);
    const input = {
      code: "SEDGE",
      name: "Name 0",
      division: "Medicine",
      openFrom: asMonth("2024-01"),
      openTo: null,
    };
    await createWard({ ctx, input });
    const write = async () => {
      for (let version = 1; version <= 25; version += 1) {
        await updateWard({ ctx, input: { code: "SEDGE", name: `Name ${version}`, version } });
      }
      return [];
    };
    const read = async () => {
      const verdicts: boolean[] = [];
      while (verdicts.length < 40) verdicts.push((await page({ limit: 1 })).chain.intact);
      return verdicts;
    };
    const verdicts = (await Promise.all([write(), read(), read()])).flat();
    expect(verdicts).toEqual(Array(80).fill(true));
  });
});
