import { eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { hospital } from "@/db/schema";
import { systemActor } from "@/lib/policy";
import { getHospital, getHospitalName, setUpHospital, updateHospital } from "@/lib/services/hospital";
import { updateHospitalSchema } from "@/lib/schemas/hospital";
import { makeTestStore, type TestStore } from "@/tests/support/store";
import { auditOf } from "./people-fixtures";

let store: TestStore;

beforeAll(async () => {
  store = await makeTestStore();
});
afterAll(() => store.close());

describe("setUpHospital", () => {
  const setUp = (input: { name: string; timeZone: string }, actor = systemActor("set-up")) =>
    setUpHospital({ ctx: store.ctxFor(actor), input });

  it("makes the row once; a second start changes nothing", async () => {
    await store.db.delete(hospital).where(eq(hospital.id, 1));
    expect(await getHospitalName(store)).toBe("");
    expect(await setUp({ name: "Harrowmere", timeZone: "Europe/Lisbon" })).toEqual({
      name: "Harrowmere",
      timeZone: "Europe/Lisbon",
      dueDay: 8,
      holidays: [],
      version: 1,
    });
    expect(await setUp({ name: "Another", timeZone: "UTC" })).toMatchObject({ name: "Harrowmere" });
    expect(await auditOf(store, "hospital.set-up")).toHaveLength(1);
  });

  it.each(["Nowhere/Here", "+01:00", ""])("refuses %j, which is no time zone", async (timeZone) => {
    await expect(setUp({ name: "Harrowmere", timeZone })).rejects.toMatchObject({ code: "invalid" });
  });
});

describe("updateHospital", () => {
  it("is the lead's, by version, with an entry", async () => {
    const change = (actor = store.lead, version = 1) =>
      updateHospital({ ctx: store.ctxFor(actor), input: { dueDay: 10, version } });
    await expect(change(store.infection)).rejects.toMatchObject({ code: "forbidden" });
    expect(await change()).toMatchObject({ dueDay: 10, version: 2 });
    await expect(change()).rejects.toMatchObject({ code: "stale", current: { version: 2 } });
    const [entry] = await auditOf(store, "hospital.update");
    expect(JSON.parse(entry?.before ?? "")).toMatchObject({ dueDay: 8 });
    expect(JSON.parse(entry?.after ?? "")).toMatchObject({ dueDay: 10 });
  });

  it("is read by whoever works here, not by the board", async () => {
    expect(await getHospital({ ctx: store.ctxFor(store.nurseOf()) })).toMatchObject({ dueDay: 10 });
    await expect(getHospital({ ctx: store.ctxFor(store.board) })).rejects.toMatchObject({
      code: "forbidden",
    });
  });

  it("takes days that exist, sorted, each once", () => {
    const parse = (holidays: string[]) => updateHospitalSchema.safeParse({ version: 1, holidays });
    expect(parse(["2026-12-25", "2026-01-01", "2026-12-25"]).data?.holidays).toEqual([
      "2026-01-01",
      "2026-12-25",
    ]);
    expect(parse(["2026-02-30"]).success).toBe(false);
    expect(parse(["25/12/2026"]).success).toBe(false);
    expect(updateHospitalSchema.safeParse({ version: 1, dueDay: 29 }).success).toBe(false);
  });
});
