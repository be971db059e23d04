import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { annotations } from "@/db/schema";
import { asMonth } from "@/lib/indicators/month";
import { createAnnotation, listAnnotations } from "@/lib/services/annotations";
import type { Actor } from "@/lib/policy";
import { auditRows, withBrokenAudit } from "@/tests/support/audit";
import { makeTestStore, TEST_NOW, type TestStore } from "@/tests/support/store";

let store: TestStore;
let series: { wardId: string; indicatorId: string };
beforeAll(async () => {
  store = await makeTestStore();
  const ward = await store.addWard("OSIER");
  const indicator = await store.addIndicator("FALLS");
  await store.assign(ward.id, indicator.id, "2025-01", asMonth("2026-06"));
  series = { wardId: ward.id, indicatorId: indicator.id };
});
afterAll(() => store.close());

const note = (actor: Actor, text: string, more: { month?: string; ward?: string; indicator?: string } = {}) =>
  createAnnotation({
    ctx: store.ctxFor(actor),
    input: {
      ward: more.ward ?? "OSIER",
      indicator: more.indicator ?? "FALLS",
      month: asMonth(more.month ?? "2026-03"),
      text,
    },
  });

describe("createAnnotation", () => {
  it("writes the note, who wrote it and when, with an audit entry", async () => {
    const written = await note(store.nurseOf(series.wardId), "Moved to the new block");
    expect(written).toMatchObject({
      ward: "OSIER",
      indicator: "FALLS",
      month: "2026-03",
      text: "Moved to the new block",
      createdBy: "Test nurse",
      createdAt: TEST_NOW.toISOString(),
    });
    expect((await auditRows(store.db)).at(-1)).toMatchObject({ action: "annotation.create", after: written });
    await note(store.infection, "New beds", { month: "2025-02" });
    const listed = await listAnnotations({ ctx: store.ctxFor(store.nurseOf(series.wardId)), input: series });
    expect(listed.map((each) => [each.month, each.text])).toEqual([
      ["2025-02", "New beds"],
      ["2026-03", "Moved to the new block"],
    ]);
  });

  it("keeps to months that the ward reports", async () => {
    for (const month of ["2024-12", "2026-07"]) {
      const attempt = note(store.lead, "Outside", { month });
      await expect(attempt).rejects.toMatchObject({ code: "invalid", errors: [{ path: "month" }] });
    }
    await store.addIndicator("ELSEWHERE");
    const notCounted = note(store.lead, "Not counted here", { indicator: "ELSEWHERE" });
    await expect(notCounted).rejects.toMatchObject({ code: "invalid" });
  });

  it("hides another ward's charts and refuses a board member", async () => {
    const stranger = store.nurseOf();
    await expect(note(stranger, "Not mine")).rejects.toMatchObject({ code: "not-found" });
    await expect(note(store.board, "Not mine")).rejects.toMatchObject({ code: "forbidden" });
    const reading = listAnnotations({ ctx: store.ctxFor(stranger), input: series });
    await expect(reading).rejects.toMatchObject({ code: "not-found" });
    const board = listAnnotations({ ctx: store.ctxFor(store.board), input: series });
    await expect(board).rejects.toMatchObject({ code: "forbidden" });
  });

  it("leaves nothing behind when its audit entry can't be written", async () => {
    await withBrokenAudit(store.db, async () => {
      await expect(note(store.lead, "Half written")).rejects.toThrow();
    });
    const texts = (await store.db.select().from(annotations)).map((row) => row.text);
    expect(texts).not.toContain("Half written");
  });
});
