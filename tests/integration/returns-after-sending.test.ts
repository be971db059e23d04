import { describe, expect, it } from "vitest";
import { asMonth } from "@/lib/indicators/month";
import { acceptReturn, listReturns, recallReturn, reopenReturn, submitReturn } from "@/lib/services/returns";
import { loadSeries } from "@/lib/services/series";
import { TEST_NOW } from "../support/store";
import { refusal, ReturnsSuite } from "./returns-fixtures";

const suite = new ReturnsSuite();
const { by, input, save, indicatorOf, tallyOf, eventsOf, signalsOf, lastAudit, withHistory } = suite;

describe("taking back", () => {
  it("opens the return, takes its figures off the chart and withdraws what rested on them", async () => {
    const indicator = await indicatorOf("RECALL");
    await withHistory(indicator.id);
    await save(indicator.code, { numerator: 40, denominator: 100 });
    await submitReturn({ ctx: by(suite.nurse), input: input() });
    const open = await recallReturn({ ctx: by(suite.nurse), input: input() });
    expect(open).toMatchObject({ status: "open", submittedAt: null, version: 3, reopened: false });
    expect(await tallyOf(indicator.id)).toMatchObject({
      numerator: 40,
      charted: false,
      chartedNumerator: null,
    });
    expect(await signalsOf(indicator.id)).toEqual([["beyond-action", "withdrawn", "recall"]]);
    const latest = (await eventsOf(indicator.id)).slice(-2);
    expect(latest).toEqual([
      ["sent", true, 40, 100],
      ["recalled", false, 40, 100],
    ]);
    expect(await lastAudit()).toMatchObject({ action: "return.recall" });
  });

  it("judges lateness by the first sending", async () => {
    const indicator = await indicatorOf("LATE");
    await save(indicator.code, { numerator: 4, denominator: 100 });
    await submitReturn({ ctx: by(suite.nurse), input: input() });
    await recallReturn({ ctx: by(suite.nurse), input: input() });
    const again = await submitReturn({
      ctx: by(suite.nurse, new Date("2026-12-20T09:00:00Z")),
      input: input(),
    });
    expect(again).toMatchObject({ late: false, firstSubmittedAt: TEST_NOW.toISOString() });
  });

  it("ends with acceptance, and is the ward's or a lead's to do", async () => {
    const indicator = await indicatorOf("DONE");
    await save(indicator.code, { numerator: 4, denominator: 100 });
    expect((await refusal(recallReturn({ ctx: by(suite.nurse), input: input() }))).code).toBe("conflict");
    await submitReturn({ ctx: by(suite.nurse), input: input() });
    expect((await refusal(recallReturn({ ctx: by(suite.store.infection), input: input() }))).code).toBe(
      "forbidden",
    );
    expect((await refusal(acceptReturn({ ctx: by(suite.nurse), input: input() }))).code).toBe("forbidden");
    const stale = await refusal(
      acceptReturn({ ctx: by(suite.store.lead), input: { ...input(), version: 1 } }),
    );
    expect(stale.code).toBe("stale");
    const accepted = await acceptReturn({ ctx: by(suite.store.lead), input: { ...input(), version: 2 } });
    expect(accepted).toMatchObject({ status: "accepted", acceptedBy: "Test lead", version: 3 });
    expect(await lastAudit()).toMatchObject({ action: "return.accept" });
    expect((await refusal(recallReturn({ ctx: by(suite.nurse), input: input() }))).code).toBe("conflict");
    expect((await refusal(acceptReturn({ ctx: by(suite.store.lead), input: input() }))).code).toBe(
      "conflict",
    );
  });
});

describe("reopening", () => {
  it("keeps what was sent last on the chart until it is sent again", async () => {
    const indicator = await indicatorOf("REOPEN");
    await withHistory(indicator.id);
    await save(indicator.code, { numerator: 40, denominator: 100 });
    await submitReturn({ ctx: by(suite.nurse), input: input() });
    await acceptReturn({ ctx: by(suite.store.lead), input: input() });
    const reason = "Counted on the wrong sheet";
    const open = await reopenReturn({ ctx: by(suite.store.lead), input: { ...input(), reason } });
    expect(open).toMatchObject({ status: "open", reopened: true, reopenedReason: reason, acceptedAt: null });
    await save(indicator.code, { numerator: 12, version: 1 });
    expect(await tallyOf(indicator.id)).toMatchObject({ numerator: 12, charted: true, chartedNumerator: 40 });
    expect(await signalsOf(indicator.id)).toEqual([["beyond-action", "new", null]]);
    const again = await submitReturn({ ctx: by(suite.nurse), input: input() });
    expect(again).toMatchObject({ status: "submitted", reopened: false });
    expect(await tallyOf(indicator.id)).toMatchObject({ chartedNumerator: 12, corrected: true });
    expect(await signalsOf(indicator.id)).toMatchObject([["beyond-action", "withdrawn", "trial-limits"]]);
  });

  it("is a lead's, from a sent return, with a reason in the audit", async () => {
    await indicatorOf("LEADS");
    const again = { ...input(), reason: "Please check" };
    expect((await refusal(reopenReturn({ ctx: by(suite.nurse), input: again }))).code).toBe("forbidden");
    expect((await refusal(reopenReturn({ ctx: by(suite.store.lead), input: again }))).code).toBe("conflict");
    await save(`LEADS-${suite.count}`, { numerator: 1, denominator: 2 });
    await submitReturn({ ctx: by(suite.nurse), input: input() });
    await reopenReturn({ ctx: by(suite.store.lead), input: again });
    const entry = await lastAudit();
    expect(entry?.action).toBe("return.reopen");
    expect(entry?.after).toContain("Please check");
  });
});

describe("as known on a past day", () => {
  it("draws what was on the chart then: sent, taken back, sent again", async () => {
    const indicator = await indicatorOf("ASOF");
    const day = (date: number) => new Date(Date.UTC(2026, 11, date, 12));
    await save(indicator.code, { numerator: 17, denominator: 71 });
    await submitReturn({ ctx: by(suite.nurse, day(1)), input: input() });
    await recallReturn({ ctx: by(suite.nurse, day(3)), input: input() });
    await save(indicator.code, { numerator: 7, version: 1 });
    await submitReturn({ ctx: by(suite.nurse, day(5)), input: input() });
    await reopenReturn({ ctx: by(suite.store.lead, day(7)), input: { ...input(), reason: "Check" } });
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
    expect(await knownOn(day(2))).toEqual([17]);
    expect(await knownOn(day(4))).toEqual([]);
    expect(await knownOn(day(6))).toEqual([7]);
    expect(await knownOn(day(8))).toEqual([7]);
  });
});

describe("the list", () => {
  it("shows the last twelve months of one's own wards with what is entered", async () => {
    const indicator = await indicatorOf("LIST");
    await indicatorOf("LIST-B");
    await save(indicator.code, { numerator: 1, denominator: 2 });
    const items = await listReturns({ ctx: by(suite.nurse), input: {} });
    expect(items).toHaveLength(12);
    expect(items[0]).toMatchObject({
      ward: suite.ward.code,
      month: "2026-12",
      status: "open",
      late: false,
      answered: 0,
    });
    expect(items[1]).toMatchObject({
      month: "2026-11",
      lines: 2,
      answered: 1,
      dueOn: "2026-12-07",
      late: false,
    });
    expect(items[2]).toMatchObject({ month: "2026-10", late: true });
    expect((await refusal(listReturns({ ctx: by(suite.store.board), input: {} }))).code).toBe("forbidden");
  });

  it("finds one ward and month for whoever sees all", async () => {
    await indicatorOf("ONE");
    const items = await listReturns({
      ctx: by(suite.store.lead),
      input: { ward: suite.ward.code, month: asMonth("2024-02") },
    });
    expect(items).toMatchObject([{ ward: suite.ward.code, month: "2024-02", lines: 1 }]);
    const hidden = listReturns({ ctx: by(suite.nurse), input: { ward: "WARD-1" } });
    expect((await refusal(hidden)).code).toBe("not-found");
  });
});
