import { eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { uuidv7 } from "uuidv7";
import { tallies, wards } from "@/db/schema";
import { asMonth } from "@/lib/indicators/month";
import { createWard, getWardByCode, listWards, updateWard } from "@/lib/services/wards";
import { auditRows, withBrokenAudit } from "@/tests/support/audit";
import { addSentMonths } from "@/tests/support/sent-months";
import { makeTestStore, TEST_NOW, type TestStore } from "@/tests/support/store";

let store: TestStore;
beforeAll(async () => {
  store = await makeTestStore();
});
afterAll(() => store.close());

const osier = (code: string) => ({
  code,
  name: "Osier",
  division: "Medicine",
  openFrom: asMonth("2024-01"),
  openTo: null,
});

const typedBy = { updatedAt: TEST_NOW, updatedBy: "Test nurse" };

const asLead = () => store.ctxFor(store.lead);
const readWard = async (code: string) => (await store.db.select().from(wards).where(eq(wards.code, code)))[0];

describe("createWard", () => {
  it("writes the ward and one audit entry that names it", async () => {
    const ward = await createWard({ ctx: asLead(), input: osier("OSIER") });
    expect(ward).toMatchObject({ code: "OSIER", openFrom: "2024-01", openTo: null, version: 1 });
    const entry = (await auditRows(store.db)).at(-1);
    expect(entry).toMatchObject({
      action: "ward.create",
      subjectId: ward.id,
      before: null,
      actorName: "Test lead",
    });
    expect(entry?.after).toMatchObject({ code: "OSIER", name: "Osier" });
  });

  it("refuses a code that is taken, at its field", async () => {
    await createWard({ ctx: asLead(), input: osier("TWICE") });
    await expect(createWard({ ctx: asLead(), input: osier("TWICE") })).rejects.toMatchObject({
      code: "conflict",
      errors: [{ path: "code" }],
    });
  });

  it("is a lead's alone", async () => {
    for (const actor of [store.infection, store.board, store.nurseOf()]) {
      const attempt = createWard({ ctx: store.ctxFor(actor), input: osier("NOT-YOURS") });
      await expect(attempt).rejects.toMatchObject({ code: "forbidden" });
    }
    expect(await readWard("NOT-YOURS")).toBeUndefined();
  });

  it("leaves nothing behind when its audit entry can't be written", async () => {
    await withBrokenAudit(store.db, async () => {
      await expect(createWard({ ctx: asLead(), input: osier("HALF") })).rejects.toThrow();
    });
    expect(await readWard("HALF")).toBeUndefined();
  });
});

describe("updateWard", () => {
  it("changes what is given, keeps the rest and raises the version", async () => {
    await createWard({ ctx: asLead(), input: osier("TERN") });
    const changed = await updateWard({
      ctx: asLead(),
      input: { code: "tern", division: "Surgery", openTo: asMonth("2026-12"), version: 1 },
    });
    expect(changed).toMatchObject({ name: "Osier", division: "Surgery", openTo: "2026-12", version: 2 });
    const entry = (await auditRows(store.db)).at(-1);
    expect(entry).toMatchObject({
      action: "ward.update",
      before: { division: "Medicine", openTo: null, version: 1 },
      after: { division: "Surgery", openTo: "2026-12", version: 2 },
    });
  });

  it("refuses a stale version and hands back the ward as it stands", async () => {
    await createWard({ ctx: asLead(), input: osier("STALE") });
    await updateWard({ ctx: asLead(), input: { code: "STALE", name: "First", version: 1 } });
    const late = updateWard({ ctx: asLead(), input: { code: "STALE", name: "Second", version: 1 } });
    await expect(late).rejects.toMatchObject({ code: "stale", current: { name: "First", version: 2 } });
    expect(await readWard("STALE")).toMatchObject({ name: "First", version: 2 });
  });

  it("writes nothing where nothing changes", async () => {
    await createWard({ ctx: asLead(), input: osier("SAME") });
    const count = (await auditRows(store.db)).length;
    const same = await updateWard({ ctx: asLead(), input: { code: "SAME", name: "Osier", version: 1 } });
    expect(same.version).toBe(1);
    expect(await auditRows(store.db)).toHaveLength(count);
  });

  it("refuses a last month before the first one that is stored", async () => {
    await createWard({ ctx: asLead(), input: osier("ORDER") });
    const attempt = updateWard({
      ctx: asLead(),
      input: { code: "ORDER", openTo: asMonth("2023-12"), version: 1 },
    });
    await expect(attempt).rejects.toMatchObject({ code: "invalid", errors: [{ path: "openTo" }] });
  });

  it("refuses to close before counts that were sent, but not before ones that are only typed", async () => {
    const ward = await store.addWard("GORSE");
    const indicator = await store.addIndicator("GORSE-FALLS");
    await store.assign(ward.id, indicator.id);
    const series = { wardId: ward.id, indicatorId: indicator.id };
    await addSentMonths(store, series, [[1, 20]], "2026-03");
    await store.db
      .insert(tallies)
      .values({ id: uuidv7(), ...series, month: asMonth("2026-05"), numerator: 1, ...typedBy });
    const close = (month: string) =>
      updateWard({ ctx: asLead(), input: { code: "GORSE", openTo: asMonth(month), version: 1 } });
    await expect(close("2026-02")).rejects.toMatchObject({ code: "conflict", errors: [{ path: "openTo" }] });
    await expect(close("2026-03")).resolves.toMatchObject({ openTo: "2026-03" });
  });

  it("is a lead's alone, and unknown wards are not there", async () => {
    const input = { code: "OSIER", name: "Mine", version: 1 };
    const ward = await readWard("OSIER");
    const nurse = store.ctxFor(store.nurseOf(ward?.id ?? ""));
    await expect(updateWard({ ctx: nurse, input })).rejects.toMatchObject({ code: "forbidden" });
    const unknown = updateWard({ ctx: asLead(), input: { ...input, code: "NOWHERE" } });
    await expect(unknown).rejects.toMatchObject({ code: "not-found" });
  });

  it("takes the change back when its audit entry can't be written", async () => {
    await createWard({ ctx: asLead(), input: osier("ROLL") });
    await withBrokenAudit(store.db, async () => {
      const attempt = updateWard({ ctx: asLead(), input: { code: "ROLL", name: "Other", version: 1 } });
      await expect(attempt).rejects.toThrow();
    });
    expect(await readWard("ROLL")).toMatchObject({ name: "Osier", version: 1 });
  });
});

describe("reading wards", () => {
  it("shows a nurse their own wards and hides the others", async () => {
    const own = await store.addWard("OWN");
    await store.addWard("OTHER");
    const nurse = store.ctxFor(store.nurseOf(own.id));
    expect((await listWards({ ctx: nurse })).map((ward) => ward.code)).toEqual(["OWN"]);
    await expect(getWardByCode({ ctx: nurse, code: "own" })).resolves.toMatchObject({ code: "OWN" });
    await expect(getWardByCode({ ctx: nurse, code: "OTHER" })).rejects.toMatchObject({ code: "not-found" });
    expect(await listWards({ ctx: store.ctxFor(store.nurseOf()) })).toEqual([]);
  });

  it("shows all wards to infection control and none to a board member", async () => {
    const codes = (await listWards({ ctx: store.ctxFor(store.infection) })).map((ward) => ward.code);
    expect(codes).toEqual(expect.arrayContaining(["OWN", "OTHER"]));
    await expect(listWards({ ctx: store.ctxFor(store.board) })).rejects.toMatchObject({ code: "forbidden" });
  });
});
