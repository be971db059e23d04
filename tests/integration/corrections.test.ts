import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { auditHead, corrections, denominatorValues, seriesState } from "@/db/schema";
import type { Actor } from "@/lib/policy";
import { correctTally, decideCorrection, listCorrections } from "@/lib/services/corrections";
import { acceptReturn, reopenReturn, submitReturn } from "@/lib/services/returns";
import { loadSeries } from "@/lib/services/series";
import { getTallyHistory } from "@/lib/services/tallies";
import { TEST_NOW, type TestStore } from "../support/store";
import { NOVEMBER, refusal, ReturnsSuite } from "./returns-fixtures";

const suite = new ReturnsSuite();
const { by, input, save, indicatorOf, tallyOf, eventsOf, lastAudit } = suite;

const send = () => submitReturn({ ctx: by(suite.nurse), input: input() });
const correct = (actor: Actor, indicator: string, figures: object, at: Date = TEST_NOW) =>
  correctTally({
    ctx: by(actor, at),
    input: { ...input(), indicator, reason: "Ten were planned returns", version: 1, ...figures },
  });

/** One line, sent as 17 of 71. */
async function sentLine(code: string, values: Parameters<TestStore["addIndicator"]>[1] = {}) {
  const indicator = await indicatorOf(code, values);
  await save(indicator.code, { numerator: 17, denominator: 71 });
  await send();
  return indicator;
}

describe("a lead's correction", () => {
  it("holds at once: figures, chart, revision, mark and audit", async () => {
    const indicator = await sentLine("LEAD");
    const done = await correct(suite.store.lead, indicator.code, { numerator: 7, denominator: 71 });
    expect(done).toMatchObject({
      state: "agreed",
      decidedBy: "Test lead",
      tally: { numerator: 7, version: 2, corrected: true },
    });
    expect(await tallyOf(indicator.id)).toMatchObject({ numerator: 7, chartedNumerator: 7, corrected: true });
    expect((await eventsOf(indicator.id)).at(-1)).toEqual(["corrected", true, 7, 71]);
    const [state] = await suite.store.db
      .select()
      .from(seriesState)
      .where(eq(seriesState.indicatorId, indicator.id));
    expect(state?.columns.numerators).toEqual([7]);
    const entry = await lastAudit();
    expect(entry?.action).toBe("tally.correct");
    expect(entry?.after).toContain("Ten were planned returns");
  });

  it("corrects an accepted month too, says not collected, and completes what was awaited", async () => {
    const indicator = await indicatorOf("AWAITED");
    await save(indicator.code, { numerator: 97, awaited: "pharmacy" });
    await send();
    await acceptReturn({ ctx: by(suite.store.lead), input: { ward: suite.ward.code, month: NOVEMBER } });
    const filled = await correct(suite.store.lead, indicator.code, { denominator: 3015 });
    expect(filled.tally).toMatchObject({ numerator: 97, denominator: 3015, awaited: null });
    expect(await tallyOf(indicator.id)).toMatchObject({ chartedDenominator: 3015, chartedAwaited: null });
    await correct(suite.store.lead, indicator.code, {
      notCollected: "Sheets of two bays are lost",
      version: 2,
    });
    expect(await tallyOf(indicator.id)).toMatchObject({
      chartedNumerator: null,
      chartedNotCollected: "Sheets of two bays are lost",
    });
  });

  it("is refused where it is stale, impossible, half, or changes nothing", async () => {
    const indicator = await sentLine("REFUSED");
    const stale = await refusal(correct(suite.store.lead, indicator.code, { numerator: 7, version: 0 }));
    expect(stale).toMatchObject({ code: "stale", current: { numerator: 17, version: 1 } });
    const refused = async (figures: object) => refusal(correct(suite.store.lead, indicator.code, figures));
    expect((await refused({ numerator: 72 })).errors).toMatchObject([{ path: "numerator" }]);
    expect((await refused({ denominator: null })).errors).toMatchObject([{ path: "denominator" }]);
    expect((await refused({ numerator: 17, denominator: 71 })).code).toBe("invalid");
  });

  it("isn't taken while the return is open", async () => {
    const indicator = await indicatorOf("OPEN");
    await save(indicator.code, { numerator: 17, denominator: 71 });
    expect((await refusal(correct(suite.store.lead, indicator.code, { numerator: 7 }))).code).toBe(
      "conflict",
    );
  });

  it("undoes everything where the audit can't be written", async () => {
    const indicator = await sentLine("ROLLED");
    const [head] = await suite.store.db.select().from(auditHead);
    if (!head) throw new Error("no head");
    await suite.store.db.delete(auditHead).where(eq(auditHead.id, 1));
    try {
      await expect(correct(suite.store.lead, indicator.code, { numerator: 7 })).rejects.toThrow("no head");
    } finally {
      await suite.store.db.insert(auditHead).values(head);
    }
    expect(await tallyOf(indicator.id)).toMatchObject({
      numerator: 17,
      chartedNumerator: 17,
      corrected: false,
    });
    expect(
      await suite.store.db.select().from(corrections).where(eq(corrections.indicatorId, indicator.id)),
    ).toEqual([]);
  });
});

describe("a shared denominator, corrected", () => {
  it("changes once for all of its sent lines, each with a revision", async () => {
    const shared = await suite.sharedDenominator();
    const lines = [];
    for (const code of ["A", "B", "C"]) lines.push(await indicatorOf(code, { sharedDenominatorId: shared }));
    const [first, second, third] = lines as [(typeof lines)[0], (typeof lines)[0], (typeof lines)[0]];
    await save(first.code, { numerator: 4, denominator: 800, denominatorVersion: 0 });
    await save(second.code, { numerator: 300 });
    await save(third.code, { notCollected: "Lost" });
    await send();
    const refused = await refusal(correct(suite.store.lead, first.code, { denominator: 200, version: 1 }));
    expect(refused).toMatchObject({ code: "invalid", errors: [{ path: "denominator" }] });
    await correct(suite.store.lead, first.code, { denominator: 804, version: 1 });
    expect(await tallyOf(first.id)).toMatchObject({ chartedDenominator: 804, version: 1, corrected: true });
    expect(await tallyOf(second.id)).toMatchObject({ chartedDenominator: 804, version: 1, corrected: true });
    expect(await tallyOf(third.id)).toMatchObject({ chartedDenominator: null, corrected: false });
    expect((await eventsOf(second.id)).at(-1)).toEqual(["corrected", true, 300, 804]);
    const states = await suite.store.db
      .select()
      .from(seriesState)
      .where(eq(seriesState.wardId, suite.ward.id));
    expect(states.filter((state) => state.columns.denominators[0] === 804)).toHaveLength(2);
    const [value] = await suite.store.db
      .select()
      .from(denominatorValues)
      .where(eq(denominatorValues.sharedDenominatorId, shared));
    expect(value).toMatchObject({ value: 804, version: 2 });
  });
});

describe("a nurse's correction", () => {
  it("waits for a lead, who agrees", async () => {
    const indicator = await sentLine("ASKED");
    const asked = await correct(suite.nurse, indicator.code, { numerator: 7, denominator: 71 });
    expect(asked).toMatchObject({ state: "waiting", numerator: 7, tally: { numerator: 17, version: 1 } });
    expect(await tallyOf(indicator.id)).toMatchObject({ numerator: 17, chartedNumerator: 17 });
    const waiting = await listCorrections({
      ctx: by(suite.store.lead),
      input: { state: "waiting", ward: suite.ward.code },
    });
    expect(waiting.items).toMatchObject([{ id: asked.id, indicator: indicator.code, askedBy: "Test nurse" }]);

    expect(
      (await refusal(decideCorrection({ ctx: by(suite.nurse), input: { id: asked.id, agree: true } }))).code,
    ).toBe("forbidden");
    const agreed = await decideCorrection({
      ctx: by(suite.store.lead),
      input: { id: asked.id, agree: true, version: 1 },
    });
    expect(agreed).toMatchObject({
      state: "agreed",
      decidedBy: "Test lead",
      tally: { numerator: 7, corrected: true },
    });
    expect(await eventsOf(indicator.id)).toEqual([
      ["saved", null, 17, 71],
      ["sent", true, 17, 71],
      ["correction-asked", null, 7, 71],
      ["corrected", true, 7, 71],
    ]);
    const again = await refusal(
      decideCorrection({ ctx: by(suite.store.lead), input: { id: asked.id, agree: true } }),
    );
    expect(again.code).toBe("conflict");
  });

  it("is declined with why, and nothing moves", async () => {
    const indicator = await sentLine("DECLINED");
    const asked = await correct(suite.nurse, indicator.code, { numerator: 7 });
    const declined = await decideCorrection({
      ctx: by(suite.store.secondLead),
      input: { id: asked.id, agree: false, reason: "The sheet says 17" },
    });
    expect(declined).toMatchObject({
      state: "declined",
      decisionReason: "The sheet says 17",
      tally: { numerator: 17 },
    });
    const { items } = await getTallyHistory({
      ctx: by(suite.nurse),
      input: { ward: suite.ward.code, month: NOVEMBER, indicator: indicator.code },
    });
    expect(items.at(-1)).toMatchObject({
      event: "correction-declined",
      reason: "The sheet says 17",
      charted: null,
    });
  });

  it("waits one at a time", async () => {
    const indicator = await sentLine("ONCE");
    await correct(suite.nurse, indicator.code, { numerator: 7 });
    expect((await refusal(correct(suite.nurse, indicator.code, { numerator: 8 }))).code).toBe("conflict");
  });

  it("can't be agreed to once the line or its shared denominator has moved, or the return is open", async () => {
    const shared = await suite.sharedDenominator();
    const indicator = await indicatorOf("MOVED", { sharedDenominatorId: shared });
    const sibling = await indicatorOf("SIBLING", { sharedDenominatorId: shared });
    await save(indicator.code, { numerator: 17, denominator: 71 });
    await save(sibling.code, { numerator: 1 });
    await send();
    const asked = await correct(suite.nurse, indicator.code, { numerator: 7 });
    await correct(suite.store.lead, sibling.code, { denominator: 72 });
    const decide = () =>
      decideCorrection({ ctx: by(suite.store.lead), input: { id: asked.id, agree: true } });
    expect((await refusal(decide())).code).toBe("stale");
    await reopenReturn({
      ctx: by(suite.store.lead),
      input: { ward: suite.ward.code, month: NOVEMBER, reason: "Check" },
    });
    expect((await refusal(decide())).code).toBe("conflict");
    expect(await tallyOf(indicator.id)).toMatchObject({ numerator: 17 });
  });

  it("may not touch what infection control counts, nor another ward's lines", async () => {
    const indicator = await indicatorOf("TEAM", { team: "infection_control", numeratorBy: "team" });
    await save(indicator.code, { numerator: 2, denominator: 268 }, suite.store.infection);
    await send();
    expect((await refusal(correct(suite.nurse, indicator.code, { numerator: 1 }))).code).toBe("forbidden");
    await expect(correct(suite.nurse, indicator.code, { denominator: 270 })).resolves.toMatchObject({
      state: "waiting",
    });
    expect((await refusal(correct(suite.store.infection, indicator.code, { numerator: 1 }))).code).toBe(
      "forbidden",
    );
    const stranger = await suite.stranger();
    expect((await refusal(correct(stranger, indicator.code, { numerator: 1 }))).code).toBe("not-found");
    expect((await listCorrections({ ctx: by(stranger), input: {} })).items).toEqual([]);
    const hidden = listCorrections({ ctx: by(stranger), input: { ward: suite.ward.code } });
    expect((await refusal(hidden)).code).toBe("not-found");
    expect((await refusal(listCorrections({ ctx: by(suite.store.board), input: {} }))).code).toBe(
      "forbidden",
    );
  });
});

describe("as known on a past day", () => {
  it("a correction shows from the day it was agreed to, not from the day it was asked for", async () => {
    const indicator = await sentLine("ASOF");
    const day = (date: number) => new Date(Date.UTC(2026, 11, date, 12));
    const asked = await correct(suite.nurse, indicator.code, { numerator: 7 }, day(8));
    await decideCorrection({ ctx: by(suite.store.lead, day(10)), input: { id: asked.id, agree: true } });
    const knownOn = async (at: Date) => {
      const [series] = await loadSeries(
        by(suite.nurse),
        [{ wardId: suite.ward.id, indicatorId: indicator.id }],
        {
          asOf: at,
        },
      );
      return series?.facts.tallies.map((tally) => tally.numerator);
    };
    expect(await knownOn(day(9))).toEqual([17]);
    expect(await knownOn(day(11))).toEqual([7]);
  });
});
