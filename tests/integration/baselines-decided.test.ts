import { and, eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { baselines, signals } from "@/db/schema";
import { asMonth } from "@/lib/indicators/month";
import type { Actor } from "@/lib/policy";
import { previewBaselineQuery } from "@/lib/schemas/baseline";
import {
  decideBaseline,
  getBaselinePage,
  listBaselines,
  previewBaselineReply,
} from "@/lib/services/baselines";
import { auditRows } from "@/tests/support/audit";
import { codes, decide, lowerCounts, put } from "@/tests/support/baselines";
import { chartCounts, chartOf, newSeries, on, steadyCounts } from "@/tests/support/series";
import { makeTestStore, type TestStore } from "@/tests/support/store";

let store: TestStore;
beforeAll(async () => {
  store = await makeTestStore();
});
afterAll(() => store.close());

const before = { from: "2024-01", to: "2024-12" };

describe("a later baseline", () => {
  it("is proposed by one person and decided by another", async () => {
    const key = await newSeries(store, "CHANGE");
    await chartCounts(store, key, "2024-01", [...steadyCounts, ...lowerCounts]);
    await put(store, "CHANGE", { from: "2024-01", to: "2025-12" }, store.lead, on("2026-11-01"));
    const old = await chartOf(store, "CHANGE");
    expect(old.signals.map((each) => each.rule)).toContain("one-side");

    const change = {
      from: "2026-01",
      to: "2026-10",
      appliesFrom: "2026-01",
      reason: "New dispensers, here to stay",
    };
    const proposal = await put(store, "CHANGE", change, store.lead, on("2026-12-01"));
    expect(proposal).toMatchObject({ state: "proposed", centre: 0.05, decidedBy: null });
    expect((await chartOf(store, "CHANGE")).segments).toHaveLength(1);
    await expect(decide(store, "CHANGE", proposal, { actor: store.lead })).rejects.toMatchObject({
      code: "forbidden",
    });

    const decided = await decide(store, "CHANGE", proposal, {
      reason: "Seen on the ward",
      at: on("2026-12-02"),
    });
    expect(decided).toMatchObject({
      state: "decided",
      proposedBy: "Test lead",
      decidedBy: "Second lead",
      decisionReason: "Seen on the ward",
      version: 2,
    });
    const chart = await chartOf(store, "CHANGE");
    expect(chart.segments).toMatchObject([
      { begins: "first", centre: 0.1, to: "2025-12", baseline: { status: "set" } },
      {
        begins: "baseline",
        centre: 0.05,
        from: "2026-01",
        baseline: { status: "provisional", appliesFrom: "2026-01" },
      },
    ]);
    expect(chart.centre).toBe(0.05);
    expect(chart.signals).toEqual([]);
    const [gone] = await store.db
      .select()
      .from(signals)
      .where(
        and(
          eq(signals.wardId, key.wardId),
          eq(signals.rule, "one-side"),
          eq(signals.fromMonth, asMonth("2026-01")),
        ),
      );
    expect(gone).toMatchObject({ status: "withdrawn", withdrawnWhy: "baseline" });

    // The chart as known before the decision still shows the run under the old limits.
    const then = await chartOf(store, "CHANGE", { asOf: "2026-12-01" });
    expect(then.centre).toBe(0.1);
    expect(then.signals.map((each) => each.rule)).toContain("one-side");
  });

  it("replaces the first one only by a decision, and the old one stays on record", async () => {
    const key = await newSeries(store, "REPLACE");
    await chartCounts(store, key, "2024-01", steadyCounts);
    const first = await put(store, "REPLACE", before, store.lead, on("2026-11-01"));
    const proposal = await put(
      store,
      "REPLACE",
      { from: "2024-01", to: "2025-12", version: 1 },
      store.lead,
      on("2026-11-10"),
    );
    expect(proposal.state).toBe("proposed");
    await decide(store, "REPLACE", proposal, { at: on("2026-11-20") });
    const list = await listBaselines({ ctx: store.ctxFor(store.lead), input: codes("REPLACE") });
    expect(list.items.map((each) => [each.id, each.state])).toEqual([
      [proposal.id, "decided"],
      [first.id, "superseded"],
    ]);
    const months = async (asOf: string) => (await chartOf(store, "REPLACE", { asOf })).baseline.months;
    expect([await months("2026-10-31"), await months("2026-11-15"), await months("2026-11-20")]).toEqual([
      24, 12, 24,
    ]);
    expect((await chartOf(store, "REPLACE", { asOf: "2026-10-31" })).baseline.status).toBe("trial");
  });

  it("leaves the limits as they are when it is declined", async () => {
    const key = await newSeries(store, "DECLINE");
    await chartCounts(store, key, "2024-01", [...steadyCounts, ...lowerCounts]);
    await put(store, "DECLINE", { from: "2024-01", to: "2025-12" });
    const before = await chartOf(store, "DECLINE");
    const proposal = await put(store, "DECLINE", { from: "2026-01", to: "2026-10", appliesFrom: "2026-01" });
    const declined = await decide(store, "DECLINE", proposal, {
      agree: false,
      reason: "Cause not understood",
    });
    expect(declined).toMatchObject({ state: "declined", decisionReason: "Cause not understood" });
    expect(await chartOf(store, "DECLINE")).toEqual(before);
    await expect(decide(store, "DECLINE", declined)).rejects.toMatchObject({ code: "conflict" });
  });

  it("waits alone: somebody else's proposal is decided first, one's own is replaced", async () => {
    const key = await newSeries(store, "TWICE", { team: "infection_control" });
    await chartCounts(store, key, "2024-01", [...steadyCounts, ...lowerCounts]);
    await put(store, "TWICE", { from: "2024-01", to: "2025-12" });
    const change = { from: "2026-01", to: "2026-10", appliesFrom: "2026-01" };
    const proposal = await put(store, "TWICE", change, store.infection);
    expect(proposal).toMatchObject({ state: "proposed", proposedBy: "Test infection control" });
    await expect(put(store, "TWICE", change, store.lead)).rejects.toMatchObject({
      code: "conflict",
      current: { id: proposal.id },
    });
    const newer = await put(store, "TWICE", { ...change, to: "2026-09" }, store.infection);
    const { items } = await listBaselines({ ctx: store.ctxFor(store.lead), input: codes("TWICE") });
    expect(items.find((each) => each.id === proposal.id)?.state).toBe("declined");
    await expect(decide(store, "TWICE", newer, { actor: store.lead })).resolves.toMatchObject({
      state: "decided",
    });
  });

  it("refuses a stale version with what holds now", async () => {
    const key = await newSeries(store, "STALE");
    await chartCounts(store, key, "2024-01", steadyCounts);
    const set = await put(store, "STALE", before);
    await expect(put(store, "STALE", { ...before, version: 0 })).rejects.toMatchObject({
      code: "stale",
      current: { id: set.id },
    });
    const proposal = await put(store, "STALE", { from: "2024-01", to: "2025-06", version: set.version });
    await expect(decide(store, "STALE", proposal, { version: 7 })).rejects.toMatchObject({
      code: "stale",
      current: { id: proposal.id, state: "proposed" },
    });
  });
});

describe("who may", () => {
  beforeAll(async () => {
    const key = await newSeries(store, "WHO");
    await chartCounts(store, key, "2024-01", steadyCounts);
  });

  it("is a lead's to set; infection control proposes for its own team alone", async () => {
    await expect(put(store, "WHO", before, store.infection)).rejects.toMatchObject({ code: "forbidden" });
    const key = await newSeries(store, "TEAM", { team: "infection_control" });
    await chartCounts(store, key, "2024-01", steadyCounts);
    const proposal = await put(store, "TEAM", before, store.infection);
    expect(proposal).toMatchObject({ state: "proposed" });
    await expect(decide(store, "TEAM", proposal, { actor: store.infection })).rejects.toMatchObject({
      code: "forbidden",
    });
    await expect(decide(store, "TEAM", proposal)).resolves.toMatchObject({ state: "decided" });
  });

  it("is forbidden to nurses and board members, though nurses read their own ward's", async () => {
    const ward = await store.db.query.wards.findFirst({
      where: (wards, { eq: equals }) => equals(wards.code, "WHO"),
    });
    const nurse = store.nurseOf(ward?.id ?? "");
    for (const actor of [nurse, store.board]) {
      await expect(put(store, "WHO", before, actor)).rejects.toMatchObject({ code: "forbidden" });
    }
    const list = (actor: Actor) => listBaselines({ ctx: store.ctxFor(actor), input: codes("WHO") });
    expect((await list(nurse)).items).toEqual([]);
    await expect(list(store.nurseOf())).rejects.toMatchObject({ code: "not-found" });
    await expect(list(store.board)).rejects.toMatchObject({ code: "forbidden" });
    expect((await getBaselinePage({ ctx: store.ctxFor(nurse), input: codes("WHO") })).mode).toBeNull();
    expect((await getBaselinePage({ ctx: store.ctxFor(store.lead), input: codes("WHO") })).mode).toBe("set");
  });

  it("finds no proposal of another chart", async () => {
    const [row] = await store.db.select().from(baselines).limit(1);
    const attempt = decideBaseline({
      ctx: store.ctxFor(store.secondLead),
      input: { ...codes("WHO"), id: row?.id ?? "", agree: true, version: 1, reason: null },
    });
    await expect(attempt).rejects.toMatchObject({ code: "not-found" });
  });
});

describe("the preview", () => {
  it("says limits before and after and which signals would come and go, and writes nothing", async () => {
    const key = await newSeries(store, "PREVIEW");
    await chartCounts(store, key, "2024-01", [...steadyCounts, ...lowerCounts]);
    await put(store, "PREVIEW", { from: "2024-01", to: "2025-12" });
    const count = (await auditRows(store.db)).length;
    const query = { from: "2026-01", to: "2026-10", appliesFrom: "2026-01", leftOut: "2026-03,2026-04" };
    const input = { ...previewBaselineQuery.parse(query), ...codes("PREVIEW") };
    const preview = await previewBaselineReply({ ctx: store.ctxFor(store.lead), input });
    expect(preview.before).toMatchObject({ centre: 0.1, status: "set", months: 24 });
    expect(preview.after).toMatchObject({ status: "provisional", months: 8 });
    expect(preview.signals.go).toEqual([
      expect.objectContaining({ rule: "one-side", side: "lower", from: "2026-01", to: "2026-10" }),
    ]);
    expect(preview.signals.come).toEqual([]);
    expect(await auditRows(store.db)).toHaveLength(count);
    expect((await chartOf(store, "PREVIEW")).segments).toHaveLength(1);

    const bad = { ...previewBaselineQuery.parse({ from: "2030-01", to: "2030-02" }), ...codes("PREVIEW") };
    await expect(previewBaselineReply({ ctx: store.ctxFor(store.lead), input: bad })).rejects.toMatchObject({
      code: "invalid",
    });
  });
});
