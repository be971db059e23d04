import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { auditHead, seriesState } from "@/db/schema";
import { asMonth } from "@/lib/indicators/month";
import { systemActor } from "@/lib/policy";
import { ripenSeries } from "@/lib/services/series";
import { getReturn, submitReturn } from "@/lib/services/returns";
import { TEST_NOW } from "../support/store";
import { refusal, ReturnsSuite } from "./returns-fixtures";

const suite = new ReturnsSuite();
const { by, input, save, indicatorOf, tallyOf, eventsOf, signalsOf, lastAudit, withHistory } = suite;

describe("sending", () => {
  it("is refused with every line that is still to enter", async () => {
    const [blank, half] = [await indicatorOf("BLANK"), await indicatorOf("HALF")];
    await save(half.code, { numerator: 3 });
    const refused = await refusal(submitReturn({ ctx: by(suite.nurse), input: input() }));
    expect(refused.code).toBe("invalid");
    expect(refused.errors).toEqual([
      { path: blank.code, message: `BLANK-${suite.count} indicator is still to enter.` },
      { path: half.code, message: `HALF-${suite.count} indicator: discharges still to enter.` },
    ]);
    expect((await getReturn({ ctx: by(suite.nurse), input: input() })).status).toBe("open");
  });

  it("of a running month is taken, but judged only when the month is over", async () => {
    const counted = await indicatorOf("COUNTED");
    const december = asMonth("2026-12");
    await save(counted.code, { numerator: 1, denominator: 20 }, suite.nurse, december);
    await submitReturn({ ctx: by(suite.nurse), input: { ward: suite.ward.code, month: december } });
    const newest = async () => {
      const isOwn = eq(seriesState.indicatorId, counted.id);
      const [state] = await suite.store.db.select().from(seriesState).where(isOwn);
      return state?.newestMonth;
    };
    expect(await newest()).toBeNull();
    await ripenSeries({ ctx: by(systemActor("schedule"), new Date("2026-12-31T12:00:00Z")) });
    expect(await newest()).toBe("2026-12");
  });

  it("charts every answer, leaves blanks off that don't hold it back, and is audited", async () => {
    const counted = await indicatorOf("COUNTED");
    const lost = await indicatorOf("LOST");
    const awaited = await indicatorOf("AWAITED");
    const ripening = await indicatorOf("RIPE", { matureAfterDays: 30 });
    const team = await indicatorOf("TEAM", { team: "infection_control", numeratorBy: "team" });
    await save(counted.code, { numerator: 4, denominator: 80 });
    await save(lost.code, { notCollected: "Sheet lost" });
    await save(awaited.code, { numerator: 97, awaited: "pharmacy" });
    const sent = await submitReturn({ ctx: by(suite.nurse), input: input() });
    expect(sent).toMatchObject({ status: "submitted", submittedBy: "Test nurse", version: 2 });
    expect(sent.submittedAt).toBe(TEST_NOW.toISOString());
    expect(await tallyOf(counted.id)).toMatchObject({
      charted: true,
      chartedNumerator: 4,
      chartedDenominator: 80,
    });
    expect(await tallyOf(lost.id)).toMatchObject({ charted: true, chartedNotCollected: "Sheet lost" });
    expect(await tallyOf(awaited.id)).toMatchObject({
      charted: true,
      chartedNumerator: 97,
      chartedAwaited: "pharmacy",
    });
    expect(await tallyOf(ripening.id)).toBeUndefined();
    expect(await eventsOf(counted.id)).toEqual([
      ["saved", null, 4, 80],
      ["sent", true, 4, 80],
    ]);
    expect(await eventsOf(team.id)).toEqual([]);
    const [state] = await suite.store.db
      .select()
      .from(seriesState)
      .where(eq(seriesState.indicatorId, counted.id));
    expect(state?.columns.numerators.at(-1)).toBe(4);
    expect(await lastAudit()).toMatchObject({
      action: "return.submit",
      subjectId: `${suite.ward.code}/2026-11`,
    });
  });

  it("asks for the ward's denominator once infection control has counted", async () => {
    const team = await indicatorOf("TEAM", { team: "infection_control", numeratorBy: "team" });
    await save(team.code, { numerator: 1 }, suite.store.infection);
    const refused = await refusal(submitReturn({ ctx: by(suite.nurse), input: input() }));
    expect(refused.errors).toMatchObject([{ path: team.code }]);
  });

  it("charts a shared denominator with each of its lines", async () => {
    const shared = await suite.sharedDenominator();
    const [first, second] = [
      await indicatorOf("S1", { sharedDenominatorId: shared }),
      await indicatorOf("S2", { sharedDenominatorId: shared }),
    ];
    await save(first.code, { numerator: 4, awaited: "admissions" });
    const refused = await refusal(submitReturn({ ctx: by(suite.nurse), input: input() }));
    expect(refused.errors).toMatchObject([{ path: second.code }]);
    await save(second.code, { notCollected: "Not counted" });
    await save(first.code, { denominator: 804, version: 1, denominatorVersion: 1 });
    await submitReturn({ ctx: by(suite.nurse), input: input() });
    expect(await tallyOf(first.id)).toMatchObject({ chartedDenominator: 804, denominator: null });
    expect(await tallyOf(second.id)).toMatchObject({ charted: true, chartedDenominator: null });
  });

  it("closes the return to everybody's saving", async () => {
    const indicator = await indicatorOf("CLOSED");
    await save(indicator.code, { numerator: 1, denominator: 2 });
    await submitReturn({ ctx: by(suite.nurse), input: input() });
    for (const actor of [suite.nurse, suite.store.lead]) {
      expect((await refusal(save(indicator.code, { numerator: 2, version: 1 }, actor))).code).toBe(
        "conflict",
      );
    }
    expect((await refusal(submitReturn({ ctx: by(suite.nurse), input: input() }))).code).toBe("conflict");
  });

  it("is for the ward and a lead alone, and on the version that was seen", async () => {
    const indicator = await indicatorOf("WHO");
    await save(indicator.code, { numerator: 1, denominator: 2 });
    const stranger = await suite.stranger();
    expect((await refusal(submitReturn({ ctx: by(stranger), input: input() }))).code).toBe("not-found");
    expect((await refusal(submitReturn({ ctx: by(suite.store.infection), input: input() }))).code).toBe(
      "forbidden",
    );
    expect((await refusal(submitReturn({ ctx: by(suite.store.board), input: input() }))).code).toBe(
      "forbidden",
    );
    const stale = await refusal(submitReturn({ ctx: by(suite.nurse), input: { ...input(), version: 7 } }));
    expect(stale).toMatchObject({ code: "stale", current: { version: 1, status: "open" } });
    await expect(
      submitReturn({ ctx: by(suite.store.lead), input: { ...input(), version: 1 } }),
    ).resolves.toBeTruthy();
  });

  it("brings a signal to light, and undoes all of it where the audit can't be written", async () => {
    const indicator = await indicatorOf("SIGNAL");
    await withHistory(indicator.id);
    await save(indicator.code, { numerator: 40, denominator: 100 });
    const [head] = await suite.store.db.select().from(auditHead);
    if (!head) throw new Error("no head");
    await suite.store.db.delete(auditHead).where(eq(auditHead.id, 1));
    try {
      await expect(submitReturn({ ctx: by(suite.nurse), input: input() })).rejects.toThrow("no head");
    } finally {
      await suite.store.db.insert(auditHead).values(head);
    }
    expect(await signalsOf(indicator.id)).toEqual([]);
    expect(await tallyOf(indicator.id)).toMatchObject({ charted: false });
    expect((await getReturn({ ctx: by(suite.nurse), input: input() })).status).toBe("open");
    await submitReturn({ ctx: by(suite.nurse), input: input() });
    expect(await signalsOf(indicator.id)).toEqual([["beyond-action", "new", null]]);
  });
});
