import { eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { indicators, sharedDenominators } from "@/db/schema";
import { createIndicatorSchema, updateIndicatorSchema } from "@/lib/schemas/indicator";
import {
  createIndicator,
  getIndicatorByCode,
  indicatorReply,
  listIndicators,
  updateIndicator,
} from "@/lib/services/indicators";
import { auditRows, withBrokenAudit } from "@/tests/support/audit";
import { addSentMonths } from "@/tests/support/sent-months";
import { makeTestStore, type TestStore } from "@/tests/support/store";

let store: TestStore;
beforeAll(async () => {
  store = await makeTestStore();
});
afterAll(() => store.close());

const asLead = () => store.ctxFor(store.lead);

const hygiene = (code: string, more: Record<string, unknown> = {}) =>
  createIndicatorSchema.parse({
    code,
    name: "Hand hygiene missed",
    numeratorLabel: "Moments missed",
    denominatorLabel: "Moments seen",
    kind: "proportion",
    betterWhen: "lower",
    team: "infection_control",
    ...more,
  });

const create = (code: string, more?: Record<string, unknown>) =>
  createIndicator({ ctx: asLead(), input: hygiene(code, more) });

const update = (code: string, body: Record<string, unknown>) =>
  updateIndicator({
    ctx: asLead(),
    input: { ...updateIndicatorSchema.parse({ version: 1, ...body }), code },
  });

describe("createIndicator", () => {
  it("writes the indicator, definition number 1 and an audit entry", async () => {
    const made = await create("HH-OBS", {
      target: 0.2,
      rules: ["beyond-action", { name: "trend", length: 7 }],
    });
    const reply = indicatorReply(made);
    expect(reply).toMatchObject({
      code: "HH-OBS",
      numeratorLabel: "Moments missed",
      kind: "proportion",
      per: 100,
      limits: "auto",
      numeratorBy: "ward",
      matureAfterDays: 0,
      sharedDenominator: null,
      rules: [{ name: "beyond-action" }, { name: "trend", length: 7 }],
      target: 0.2,
      version: 1,
      definitions: [{ number: 1, effectiveFrom: "1900-01", comparable: true, decidedBy: "Test lead" }],
    });
    expect(indicatorReply(await getIndicatorByCode({ ctx: asLead(), code: "hh-obs" }))).toEqual(reply);
    const entry = (await auditRows(store.db)).at(-1);
    expect(entry).toMatchObject({
      action: "indicator.create",
      subjectId: made.id,
      after: { code: "HH-OBS" },
    });
  });

  it("makes a shared denominator once and lets the next indicator join it", async () => {
    const first = await create("FALLS", {
      sharedDenominator: "BED-DAYS",
      denominatorLabel: "Occupied bed days",
    });
    const second = await create("ULCERS", { sharedDenominator: "bed-days", denominatorLabel: "Bed days" });
    expect(second.sharedDenominatorId).toBe(first.sharedDenominatorId);
    expect(await store.db.select().from(sharedDenominators)).toMatchObject([
      { code: "BED-DAYS", label: "Occupied bed days" },
    ]);
  });

  it("refuses a code that is taken", async () => {
    await create("AGAIN");
    await expect(create("AGAIN")).rejects.toMatchObject({ code: "conflict", errors: [{ path: "code" }] });
  });

  it("is a lead's alone", async () => {
    for (const actor of [store.infection, store.board, store.nurseOf()]) {
      const attempt = createIndicator({ ctx: store.ctxFor(actor), input: hygiene("REFUSED") });
      await expect(attempt).rejects.toMatchObject({ code: "forbidden" });
    }
  });

  it("leaves neither indicator nor shared denominator behind when the audit can't be written", async () => {
    await withBrokenAudit(store.db, async () => {
      await expect(create("HALF", { sharedDenominator: "HALF-DAYS" })).rejects.toThrow();
    });
    await expect(getIndicatorByCode({ ctx: asLead(), code: "HALF" })).rejects.toMatchObject({
      code: "not-found",
    });
    const codes = (await store.db.select().from(sharedDenominators)).map((row) => row.code);
    expect(codes).not.toContain("HALF-DAYS");
  });
});

describe("updateIndicator: settings", () => {
  it("changes what is given for the whole chart, with before and after in the audit", async () => {
    await create("SETTINGS");
    const after = await update("SETTINGS", { limits: "exact", target: 0.1, reason: "Small counts" });
    expect(after).toMatchObject({ limits: "exact", target: 0.1, version: 2, name: "Hand hygiene missed" });
    expect(after.definitions).toHaveLength(1);
    expect((await auditRows(store.db)).at(-1)).toMatchObject({
      action: "indicator.update",
      before: { limits: "auto", target: null, version: 1 },
      after: { limits: "exact", target: 0.1, version: 2, reason: "Small counts" },
    });
  });

  it("refuses a stale version and hands back the indicator as it stands", async () => {
    await create("STALE");
    await update("STALE", { name: "First" });
    const late = update("STALE", { name: "Second" });
    await expect(late).rejects.toMatchObject({
      code: "stale",
      current: { code: "STALE", name: "First", version: 2 },
    });
  });

  it("writes nothing where nothing changes", async () => {
    await create("SAME");
    const count = (await auditRows(store.db)).length;
    const same = await update("SAME", { name: "Hand hygiene missed", numeratorLabel: "Moments missed" });
    expect(same.version).toBe(1);
    expect(await auditRows(store.db)).toHaveLength(count);
  });

  it("refuses what can't stand together with what is stored", async () => {
    await create("TOGETHER");
    await expect(update("TOGETHER", { target: 3 })).rejects.toMatchObject({
      code: "invalid",
      errors: [{ path: "target" }],
    });
  });

  it("lets kind and shared denominator change until there are counts, and never after", async () => {
    await create("KIND");
    const rate = await update("KIND", { kind: "rate", per: 1000, sharedDenominator: "KIND-DAYS" });
    expect(rate).toMatchObject({ kind: "rate", sharedDenominator: { code: "KIND-DAYS" } });
    const ward = await store.addWard("KIND-WARD");
    await store.assign(ward.id, rate.id);
    await addSentMonths(store, { wardId: ward.id, indicatorId: rate.id }, [[2, 100]]);
    await expect(update("KIND", { kind: "proportion", version: 2 })).rejects.toMatchObject({
      code: "conflict",
      errors: [{ path: "kind" }],
    });
    await expect(update("KIND", { sharedDenominator: null, version: 2 })).rejects.toMatchObject({
      code: "conflict",
      errors: [{ path: "sharedDenominator" }],
    });
  });

  it("is a lead's alone, and unknown indicators are not there", async () => {
    await create("GUARDED");
    const input = { code: "GUARDED", version: 1, name: "Mine" };
    for (const actor of [store.infection, store.board, store.nurseOf()]) {
      await expect(updateIndicator({ ctx: store.ctxFor(actor), input })).rejects.toMatchObject({
        code: "forbidden",
      });
    }
    await expect(update("NOWHERE", { name: "Mine" })).rejects.toMatchObject({ code: "not-found" });
  });

  it("takes everything back when the audit can't be written", async () => {
    await create("ROLL");
    await withBrokenAudit(store.db, async () => {
      const words = {
        numeratorLabel: "Other",
        effectiveFrom: "2027-01",
        comparable: false,
        reason: "Review",
      };
      await expect(update("ROLL", { name: "Other", ...words })).rejects.toThrow();
    });
    const kept = await getIndicatorByCode({ ctx: asLead(), code: "ROLL" });
    expect(kept).toMatchObject({ name: "Hand hygiene missed", version: 1 });
    expect(kept.definitions).toHaveLength(1);
  });
});

describe("updateIndicator: definition", () => {
  const words = { numeratorLabel: "Moments missed, surroundings too" };
  const from2027 = { effectiveFrom: "2027-01", comparable: false, reason: "Surroundings added" };

  it("adds a version from a month on and keeps the old one", async () => {
    await create("VERSIONS");
    const after = await update("VERSIONS", { ...words, ...from2027 });
    const reply = indicatorReply(after);
    expect(reply.numeratorLabel).toBe("Moments missed, surroundings too");
    expect(reply.definitions).toMatchObject([
      { number: 1, numeratorLabel: "Moments missed" },
      { number: 2, ...words, ...from2027, denominatorLabel: "Moments seen", decidedBy: "Test lead" },
    ]);
  });

  it("asks for month, comparability and reason, each at its own field", async () => {
    await create("ASKS");
    for (const change of [words, { denominatorLabel: "Moments" }, { attribution: "The ward of discharge" }]) {
      await expect(update("ASKS", change)).rejects.toMatchObject({
        code: "invalid",
        errors: [{ path: "effectiveFrom" }, { path: "comparable" }, { path: "reason" }],
      });
    }
  });

  it("refuses a month that isn't later than the newest version's", async () => {
    await create("LATER");
    await update("LATER", { ...words, ...from2027 });
    for (const effectiveFrom of ["2027-01", "2026-12"]) {
      const attempt = update("LATER", { ...from2027, numeratorLabel: "Third", effectiveFrom, version: 2 });
      await expect(attempt).rejects.toMatchObject({ code: "invalid", errors: [{ path: "effectiveFrom" }] });
    }
  });

  it("refuses a version that changes no word", async () => {
    await create("NO-WORD");
    await expect(update("NO-WORD", from2027)).rejects.toMatchObject({
      code: "invalid",
      errors: [{ path: "effectiveFrom" }],
    });
  });
});

describe("updateIndicator: signals", () => {
  /** Sixteen months at 20 of 100, then eight at 12, from Jan 2024: a run above, then a run below. */
  const shift = Array.from({ length: 24 }, (_, index) => [index < 16 ? 20 : 12, 100] as const);

  async function shiftedSeries(code: string) {
    const indicator = await create(code);
    const ward = await store.addWard(`${code}-W`);
    await store.assign(ward.id, indicator.id, "2024-01");
    await addSentMonths(store, { wardId: ward.id, indicatorId: indicator.id }, shift, "2024-01");
    return { wardId: ward.id, indicatorId: indicator.id };
  }

  const signalsOf = async (indicatorId: string) => {
    const rows = await store.db.query.signals.findMany({
      where: (row, { eq: is }) => is(row.indicatorId, indicatorId),
    });
    return rows.map(({ side, status, withdrawnWhy, towards }) => ({ side, status, withdrawnWhy, towards }));
  };

  it("withdraws a run that a version that can't be compared cuts in two", async () => {
    const { indicatorId } = await shiftedSeries("CUT");
    expect(await signalsOf(indicatorId)).toHaveLength(2);
    await update("CUT", {
      numeratorLabel: "Other",
      effectiveFrom: "2025-09",
      comparable: false,
      reason: "Another sheet",
    });
    const lower = (await signalsOf(indicatorId)).filter((signal) => signal.side === "lower");
    expect(lower).toEqual([
      { side: "lower", status: "withdrawn", withdrawnWhy: "definition", towards: "favourable" },
    ]);
  });

  it("withdraws runs when their rule is switched off, and brings them back with it", async () => {
    const { indicatorId } = await shiftedSeries("RULES");
    await update("RULES", { rules: ["beyond-action"] });
    expect((await signalsOf(indicatorId)).map((signal) => signal.withdrawnWhy)).toEqual(["rules", "rules"]);
    await update("RULES", { rules: ["one-side"], version: 2 });
    expect((await signalsOf(indicatorId)).map((signal) => signal.status)).toEqual(["new", "new"]);
  });

  it("touches no signal by a change of the unit, the target or the name", async () => {
    const { indicatorId } = await shiftedSeries("SHOWN");
    const before = await signalsOf(indicatorId);
    await update("SHOWN", { per: 1000, target: 0.1, name: "Other name" });
    expect(await signalsOf(indicatorId)).toEqual(before);
  });
});

describe("listIndicators", () => {
  it("is for staff, by name, with every version", async () => {
    const nurse = store.ctxFor(store.nurseOf());
    const listed = await listIndicators({ ctx: nurse });
    const stored = await store.db.select().from(indicators);
    expect(listed).toHaveLength(stored.length);
    expect(listed.every((each) => each.definitions.length > 0)).toBe(true);
    await expect(listIndicators({ ctx: store.ctxFor(store.board) })).rejects.toMatchObject({
      code: "forbidden",
    });
    expect(await store.db.select().from(indicators).where(eq(indicators.code, "REFUSED"))).toEqual([]);
  });
});
