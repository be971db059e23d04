import { desc, eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { auditEntries, auditHead, tallies, wardReturns } from "@/db/schema";
import { asMonth } from "@/lib/indicators/month";
import { answerOf } from "@/lib/indicators/tally-answer";
import { getReturn } from "@/lib/services/returns";
import { NOVEMBER, refusal } from "./returns-fixtures";
import { TalliesSuite } from "./tallies-fixtures";

const suite = new TalliesSuite();
const { save, indicatorOf, revisionsOf } = suite;

describe("a return, when first looked at", () => {
  it("opens with every assigned indicator, nothing saved, and its due day", async () => {
    await indicatorOf("FIRST");
    await suite.store.addIndicator("ELSEWHERE");
    const found = await getReturn({
      ctx: suite.store.ctxFor(suite.nurse),
      input: { ward: "osier", month: NOVEMBER },
    });
    expect(found).toMatchObject({
      ward: "OSIER",
      status: "open",
      dueOn: "2026-12-07",
      version: 1,
      late: false,
    });
    expect(found.tallies.map((line) => line.indicator)).toEqual(["FIRST"]);
    expect(found.tallies[0]).toMatchObject({
      numerator: null,
      denominator: null,
      version: 0,
      notCollected: null,
    });
    const rows = await suite.store.db.select().from(wardReturns).where(eq(wardReturns.month, NOVEMBER));
    expect(rows).toHaveLength(1);
  });

  it("keeps the due day that it was opened with", async () => {
    const ctx = { ...suite.store.ctxFor(suite.nurse), now: new Date("2026-12-08T00:00:00Z") };
    const found = await getReturn({ ctx, input: { ward: "OSIER", month: NOVEMBER } });
    expect(found).toMatchObject({ dueOn: "2026-12-07", late: true });
  });

  it.each([
    ["a month to come", "2027-01"],
    ["a month before the ward opened", "2026-02"],
  ])("isn't there for %s", async (_what, month) => {
    const attempt = getReturn({
      ctx: suite.store.ctxFor(suite.nurse),
      input: { ward: "OSIER", month: asMonth(month) },
    });
    expect((await refusal(attempt)).code).toBe("not-found");
  });

  it("is hidden from another ward's nurse and refused to a board member", async () => {
    const other = await suite.store.addWard("TERN");
    const input = { ward: "OSIER", month: NOVEMBER };
    const hidden = getReturn({ ctx: suite.store.ctxFor(suite.store.nurseOf(other.id)), input });
    expect((await refusal(hidden)).code).toBe("not-found");
    expect((await refusal(getReturn({ ctx: suite.store.ctxFor(suite.store.board), input }))).code).toBe(
      "forbidden",
    );
    await expect(getReturn({ ctx: suite.store.ctxFor(suite.store.infection), input })).resolves.toBeTruthy();
  });
});

describe("saving a line", () => {
  it("writes the figures, a revision and an audit entry, and charts nothing", async () => {
    const indicator = await indicatorOf("FALLS");
    const saved = await save("FALLS", { numerator: 4, denominator: 804 });
    expect(saved).toMatchObject({ numerator: 4, denominator: 804, version: 1, savedBy: "Test nurse" });
    const [row] = await suite.store.db.select().from(tallies).where(eq(tallies.indicatorId, indicator.id));
    expect(row).toMatchObject({ charted: false, chartedNumerator: null });
    expect(await revisionsOf(indicator.id)).toMatchObject([
      { event: "saved", charted: null, numerator: 4, denominator: 804, tallyVersion: 1, source: "form" },
    ]);
    const [entry] = await suite.store.db.select().from(auditEntries).orderBy(desc(auditEntries.seq)).limit(1);
    expect(entry).toMatchObject({
      action: "tally.save",
      subjectId: "OSIER/FALLS/2026-11",
      actorName: "Test nurse",
    });
  });

  it("keeps what is left out, and a blank is no zero", async () => {
    await indicatorOf("DRAFT");
    expect(await save("DRAFT", { numerator: 0 })).toMatchObject({
      numerator: 0,
      denominator: null,
      version: 1,
    });
    expect(await save("DRAFT", { denominator: 12, version: 1 })).toMatchObject({
      numerator: 0,
      denominator: 12,
    });
    expect(await save("DRAFT", { numerator: null, version: 2 })).toMatchObject({
      numerator: null,
      denominator: 12,
    });
  });

  it("tells four answers apart", async () => {
    await indicatorOf("ANSWERS");
    const counted = await save("ANSWERS", { numerator: 3, denominator: 9, note: "Counted twice" });
    const none = await save("ANSWERS", { notCollected: "Sheet lost", version: counted.version });
    expect(none).toMatchObject({
      numerator: null,
      denominator: null,
      notCollected: "Sheet lost",
      note: "Counted twice",
    });
    const awaited = await save("ANSWERS", { numerator: 3, awaited: "pharmacy", version: none.version });
    expect(awaited).toMatchObject({
      numerator: 3,
      denominator: null,
      notCollected: null,
      awaited: "pharmacy",
    });
    const filled = await save("ANSWERS", { denominator: 9, version: awaited.version });
    expect(filled).toMatchObject({ numerator: 3, denominator: 9, awaited: null });
    const nothing = await save("ANSWERS", { numerator: null, denominator: 0, version: filled.version });
    expect(answerOf(nothing)).toBe("nothing-to-count");
    const both = await refusal(
      save("ANSWERS", { numerator: 1, notCollected: "Lost", version: nothing.version }),
    );
    expect(both).toMatchObject({ code: "invalid", errors: [{ path: "notCollected" }] });
  });

  it("refuses pairs that can't be, with the numbers", async () => {
    await indicatorOf("HANDS", { numeratorLabel: "Moments missed", denominatorLabel: "Moments seen" });
    await indicatorOf("RATE", { kind: "rate", per: 1000 });
    const swapped = await refusal(save("HANDS", { numerator: 118, denominator: 19 }));
    expect(swapped).toMatchObject({
      code: "invalid",
      errors: [{ path: "numerator", message: "Moments missed (118) are more than moments seen (19)." }],
    });
    expect((await refusal(save("HANDS", { numerator: 1, denominator: 0 }))).code).toBe("invalid");
    expect((await refusal(save("RATE", { numerator: 1, denominator: 0 }))).code).toBe("invalid");
    await expect(save("RATE", { numerator: 9, denominator: 4 })).resolves.toMatchObject({ version: 1 });
  });

  it("answers not-found for an indicator that the ward doesn't report", async () => {
    expect((await refusal(save("ELSEWHERE", { numerator: 1 }))).code).toBe("not-found");
    expect((await refusal(save("NOWHERE", { numerator: 1 }))).code).toBe("not-found");
  });

  it("is refused to a board member and hidden from another ward's nurse", async () => {
    await indicatorOf("GUARDED");
    const stranger = suite.store.nurseOf((await suite.store.addWard("HERON")).id);
    expect((await refusal(save("GUARDED", { numerator: 1 }, stranger))).code).toBe("not-found");
    expect((await refusal(save("GUARDED", { numerator: 1 }, suite.store.board))).code).toBe("forbidden");
    expect((await refusal(save("GUARDED", { numerator: 1 }, suite.store.infection))).code).toBe("forbidden");
  });

  it("leaves nothing behind where the audit can't be written", async () => {
    const indicator = await indicatorOf("ROLLED");
    const [head] = await suite.store.db.select().from(auditHead);
    if (!head) throw new Error("no head");
    await suite.store.db.delete(auditHead).where(eq(auditHead.id, 1));
    try {
      await expect(save("ROLLED", { numerator: 1, denominator: 2 })).rejects.toThrow("no head");
    } finally {
      await suite.store.db.insert(auditHead).values(head);
    }
    expect(
      await suite.store.db.select().from(tallies).where(eq(tallies.indicatorId, indicator.id)),
    ).toHaveLength(0);
    expect(await revisionsOf(indicator.id)).toHaveLength(0);
  });
});

describe("a line that infection control counts", () => {
  it("is typed by the team alone, and the ward types its denominator", async () => {
    await indicatorOf("CATHETER", {
      kind: "rate",
      per: 1000,
      team: "infection_control",
      numeratorBy: "team",
    });
    expect((await refusal(save("CATHETER", { numerator: 1 }))).code).toBe("forbidden");
    const counted = await save("CATHETER", { numerator: 1 }, suite.store.infection);
    expect(counted).toMatchObject({ numerator: 1, version: 1 });
    const whole = await save("CATHETER", { numerator: 1, denominator: 268, version: 1 });
    expect(whole).toMatchObject({ numerator: 1, denominator: 268 });
    expect(await save("CATHETER", { numerator: 2, version: 2 }, suite.store.lead)).toMatchObject({
      numerator: 2,
    });
  });
});
