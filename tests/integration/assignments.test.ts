import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { asMonth } from "@/lib/indicators/month";
import { setAssignmentSchema } from "@/lib/schemas/assignment";
import {
  assignedIndicators,
  findAssignment,
  listAssignments,
  setAssignment,
} from "@/lib/services/assignments";
import { updateIndicator } from "@/lib/services/indicators";
import type { Actor } from "@/lib/policy";
import { auditRows, withBrokenAudit } from "@/tests/support/audit";
import { addSentMonths } from "@/tests/support/sent-months";
import { makeTestStore, type TestStore } from "@/tests/support/store";

let store: TestStore;
beforeAll(async () => {
  store = await makeTestStore();
  await store.addWard("ALDER", { openFrom: asMonth("2024-01"), openTo: asMonth("2026-06") });
  await store.addWard("TERN");
});
afterAll(() => store.close());

const put = (ward: string, indicator: string, body: unknown, actor: Actor = store.lead) =>
  setAssignment({ ctx: store.ctxFor(actor), input: { ...setAssignmentSchema.parse(body), ward, indicator } });

describe("setAssignment", () => {
  it("assigns, and says the same again without a trace", async () => {
    await store.addIndicator("FALLS");
    const made = await put("tern", "falls", { from: "2025-01" });
    expect(made).toEqual({ ward: "TERN", indicator: "FALLS", from: "2025-01", to: null, version: 1 });
    const entries = await auditRows(store.db);
    expect(entries.at(-1)).toMatchObject({ action: "assignment.set", before: null, after: made });
    expect(await put("TERN", "FALLS", { from: "2025-01" })).toEqual(made);
    expect(await auditRows(store.db)).toHaveLength(entries.length);
  });

  it("changes the months, with both in the audit", async () => {
    await store.addIndicator("ULCERS");
    await put("TERN", "ULCERS", { from: "2025-01" });
    const changed = await put("TERN", "ULCERS", { from: "2024-06", to: "2026-12", version: 1 });
    expect(changed).toMatchObject({ from: "2024-06", to: "2026-12", version: 2 });
    const entry = (await auditRows(store.db)).at(-1);
    expect(entry).toMatchObject({
      before: { from: "2025-01", to: null },
      after: { from: "2024-06", to: "2026-12" },
    });
  });

  it("refuses a stale version and hands back the assignment as it stands", async () => {
    await store.addIndicator("STALE");
    await put("TERN", "STALE", { from: "2025-01", version: 0 });
    await expect(put("TERN", "STALE", { from: "2025-02", version: 0 })).rejects.toMatchObject({
      code: "stale",
      current: { from: "2025-01", version: 1 },
    });
  });

  it("refuses months in which the ward isn't open", async () => {
    await store.addIndicator("OPEN");
    const refused: [unknown, string][] = [
      [{ from: "2023-12" }, "from"],
      [{ from: "2026-07" }, "from"],
      [{ from: "2025-01", to: "2026-07" }, "to"],
    ];
    for (const [body, path] of refused) {
      await expect(put("ALDER", "OPEN", body)).rejects.toMatchObject({ code: "invalid", errors: [{ path }] });
    }
    await expect(put("ALDER", "OPEN", { from: "2024-01", to: "2026-06" })).resolves.toMatchObject({
      version: 1,
    });
  });

  it("refuses to cut off counts that were sent", async () => {
    const indicator = await store.addIndicator("SENT");
    const ward = await store.addWard("SALLOW");
    await put("SALLOW", "SENT", { from: "2025-01" });
    await addSentMonths(store, { wardId: ward.id, indicatorId: indicator.id }, [[1, 20]], "2025-03");
    await expect(put("SALLOW", "SENT", { from: "2025-04" })).rejects.toMatchObject({
      code: "conflict",
      errors: [{ path: "from" }],
    });
    await expect(put("SALLOW", "SENT", { from: "2025-01", to: "2025-02" })).rejects.toMatchObject({
      code: "conflict",
      errors: [{ path: "to" }],
    });
    await expect(put("SALLOW", "SENT", { from: "2025-03", to: "2025-03" })).resolves.toMatchObject({
      version: 2,
    });
  });

  it("knows neither unknown wards nor unknown indicators", async () => {
    await expect(put("NOWHERE", "FALLS", { from: "2025-01" })).rejects.toMatchObject({ code: "not-found" });
    await expect(put("TERN", "NOTHING", { from: "2025-01" })).rejects.toMatchObject({ code: "not-found" });
  });

  it("is a lead's alone", async () => {
    for (const actor of [store.infection, store.board, store.nurseOf()]) {
      const attempt = put("TERN", "OPEN", { from: "2025-01" }, actor);
      await expect(attempt).rejects.toMatchObject({ code: "forbidden" });
    }
  });

  it("leaves nothing behind when its audit entry can't be written", async () => {
    await store.addIndicator("ROLL");
    await withBrokenAudit(store.db, async () => {
      await expect(put("TERN", "ROLL", { from: "2025-01" })).rejects.toThrow();
    });
    const listed = await listAssignments({ ctx: store.ctxFor(store.lead), input: { indicator: "ROLL" } });
    expect(listed).toEqual([]);
  });
});

describe("reading assignments", () => {
  it("keeps to the actor's wards", async () => {
    const own = await store.addWard("OWN");
    const indicator = await store.addIndicator("READ");
    await put("OWN", "READ", { from: "2025-01" });
    await put("TERN", "READ", { from: "2025-01" });
    const nurse = store.ctxFor(store.nurseOf(own.id));
    const codes = (rows: { ward: string; indicator: string }[]) =>
      rows.map((row) => `${row.ward} ${row.indicator}`);
    expect(codes(await listAssignments({ ctx: nurse, input: {} }))).toEqual(["OWN READ"]);
    expect(codes(await listAssignments({ ctx: nurse, input: { indicator: "READ" } }))).toEqual(["OWN READ"]);
    const others = listAssignments({ ctx: nurse, input: { ward: "TERN" } });
    await expect(others).rejects.toMatchObject({ code: "not-found" });
    const all = await listAssignments({ ctx: store.ctxFor(store.infection), input: { indicator: "read" } });
    expect(codes(all)).toEqual(["OWN READ", "TERN READ"]);
    const board = listAssignments({ ctx: store.ctxFor(store.board), input: {} });
    await expect(board).rejects.toMatchObject({ code: "forbidden" });
    const pair = { wardId: own.id, indicatorId: indicator.id };
    expect(await findAssignment({ ctx: nurse, ...pair })).toMatchObject({ fromMonth: "2025-01" });
    const stranger = findAssignment({ ctx: store.ctxFor(store.nurseOf()), ...pair });
    await expect(stranger).rejects.toMatchObject({ code: "not-found" });
  });

  it("lists what a ward reports for a month, with the definition of that month", async () => {
    const ward = await store.addWard("LINES", { openTo: asMonth("2026-06") });
    const indicator = await store.addIndicator("LINE", { numeratorLabel: "First words" });
    await store.addIndicator("ENDED");
    await put("LINES", "LINE", { from: "2025-01" });
    await put("LINES", "ENDED", { from: "2025-01", to: "2025-06" });
    const change = { numeratorLabel: "New words", comparable: true, reason: "Clearer", version: 1 };
    const input = { ...change, code: "LINE", effectiveFrom: asMonth("2026-01") };
    await updateIndicator({ ctx: store.ctxFor(store.lead), input });

    const ctx = store.ctxFor(store.nurseOf(ward.id));
    const linesOf = async (month: string) =>
      (await assignedIndicators({ ctx, wardId: ward.id, month: asMonth(month) })).map((line) => [
        line.indicator.code,
        line.definition.numeratorLabel,
      ]);
    expect(await linesOf("2024-12")).toEqual([]);
    expect(await linesOf("2025-06")).toEqual([
      ["ENDED", "Events"],
      ["LINE", "First words"],
    ]);
    expect(await linesOf("2026-01")).toEqual([["LINE", "New words"]]);
    expect(await linesOf("2026-07")).toEqual([]);
    expect(indicator.version).toBe(1);
    const stranger = store.ctxFor(store.nurseOf());
    const elsewhere = assignedIndicators({ ctx: stranger, wardId: ward.id, month: asMonth("2025-06") });
    await expect(elsewhere).rejects.toMatchObject({ code: "not-found" });
  });
});
