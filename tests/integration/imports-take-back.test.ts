import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { eq } from "drizzle-orm";
import { denominatorValues, seriesState, tallyRevisions } from "@/db/schema";
import { asMonth, monthRange } from "@/lib/indicators/month";
import { commitImport, takeBackImport } from "@/lib/services/imports";
import { reopenReturn } from "@/lib/services/returns";
import { saveTally } from "@/lib/services/tallies";
import { makeImportHospital, refusal, type ImportHospital } from "../support/import-hospital";
import { TEST_NOW } from "../support/store";
import type { SheetRow } from "../support/sheets";

let hospital: ImportHospital;
beforeAll(async () => {
  hospital = await makeImportHospital();
});
afterAll(() => hospital.close());

const LATER = new Date(TEST_NOW.getTime() + 3_600_000);
const commit = (id: string, input: object = {}, actor = hospital.lead) =>
  commitImport({ ctx: hospital.ctxFor(actor), input: { id, ...input } });
const takeBack = (id: string, actor = hospital.lead) =>
  takeBackImport({ ctx: hospital.ctxFor(actor, LATER), input: { id } });

describe("taking an import back", () => {
  it("restores open returns by new revisions and lets the same sheet in again", async () => {
    const ctx = hospital.ctxFor(hospital.lead);
    const line = { ward: "OSIER", month: asMonth("2026-11"), indicator: "OBS" };
    await saveTally({
      ctx,
      input: { ...line, numerator: 3, denominator: 40, note: "First count", version: 0 },
    });
    const rows: SheetRow[] = [
      ["OSIER", "OBS", "2026-11", 4, 41, "", "Second count"],
      ["OSIER", "FALLS", "2026-11", 2, 800],
    ];
    const { id } = await hospital.check(rows, hospital.nurse);
    await commit(id, {}, hospital.nurse);
    const summary = await takeBack(id, hospital.nurse);
    expect(summary).toMatchObject({ state: "taken-back", takenBackAt: LATER.toISOString() });
    expect(await hospital.tallyOf(hospital.obs.id, "2026-11")).toMatchObject({
      numerator: 3,
      denominator: 40,
      note: "First count",
      version: 3,
    });
    expect(await hospital.tallyOf(hospital.falls.id, "2026-11")).toMatchObject({
      numerator: null,
      version: 2,
    });
    const [shared] = await hospital.db.select().from(denominatorValues);
    expect(shared).toMatchObject({ value: null, version: 2 });
    const revisions = await hospital.db
      .select()
      .from(tallyRevisions)
      .where(eq(tallyRevisions.importRunId, id))
      .orderBy(tallyRevisions.at);
    expect(revisions.map((revision) => revision.reason)).toEqual([
      null,
      null,
      "Import taken back",
      "Import taken back",
    ]);
    expect(await takeBack(id, hospital.nurse)).toEqual(summary);
    expect(await hospital.auditsOf("import.take-back")).toHaveLength(1);

    const again = await hospital.check(rows, hospital.nurse);
    expect(again.counts).toMatchObject({ new: 1, changed: 1 });
    expect((await refusal(commit(id))).code).toBe("precondition");
  });

  it("opens returns that it accepted again and withdraws the signals that rested on it", async () => {
    const rows = monthRange(asMonth("2024-01"), asMonth("2025-12")).map((month, index): SheetRow => [
      "TERN",
      "OBS",
      month,
      index === 20 ? 40 : 5,
      60,
    ]);
    const { id } = await hospital.check(rows);
    await commit(id, { accept: true });
    const active = (await hospital.signalsOf(hospital.obs.id)).filter((signal) => signal.status === "new");
    expect(active.map((signal) => signal.rule)).toContain("beyond-action");

    await takeBack(id);
    const after = await hospital.signalsOf(hospital.obs.id);
    expect(after.every((signal) => signal.status === "withdrawn")).toBe(true);
    expect(new Set(after.map((signal) => signal.withdrawnWhy))).toEqual(new Set(["import-taken-back"]));
    const row = await hospital.returnOf("2024-05", hospital.tern.id);
    expect(row).toMatchObject({
      status: "open",
      firstSubmittedAt: null,
      submittedAt: null,
      acceptedAt: null,
    });
    const tally = await hospital.tallyOf(hospital.obs.id, "2024-05", hospital.tern.id);
    expect(tally).toMatchObject({ charted: false, numerator: null, chartedNumerator: null });
    const states = await hospital.db
      .select()
      .from(seriesState)
      .where(eq(seriesState.wardId, hospital.tern.id));
    expect(states.map((state) => state.hasLimits)).toEqual([false]);
  });

  it("puts a corrected month back as it was sent", async () => {
    const sent: SheetRow[] = [
      ["OSIER", "FALLS", "2026-02", 4, 700],
      ["OSIER", "HARM", "2026-02", 1, 700],
    ];
    await commit((await hospital.check(sent)).id, { accept: true });
    const { id } = await hospital.check([["OSIER", "FALLS", "2026-02", 9, 650]]);
    await commit(id, { reason: "Recounted" });
    expect(await hospital.tallyOf(hospital.harm.id, "2026-02")).toMatchObject({ chartedDenominator: 650 });
    await takeBack(id);
    const expected = { chartedDenominator: 700, charted: true, corrected: false };
    expect(await hospital.tallyOf(hospital.falls.id, "2026-02")).toMatchObject({ ...expected, numerator: 4 });
    expect(await hospital.tallyOf(hospital.harm.id, "2026-02")).toMatchObject({ ...expected, numerator: 1 });
    expect((await hospital.returnOf("2026-02"))?.status).toBe("accepted");
  });

  it("is refused with the list where a later change stands on top", async () => {
    const { id } = await hospital.check([
      ["OSIER", "OBS", "2025-01", 1, 20],
      ["OSIER", "OBS", "2025-02", 1, 20],
    ]);
    await commit(id);
    const input = { ward: "OSIER", month: asMonth("2025-02"), indicator: "OBS", numerator: 2, version: 1 };
    await saveTally({ ctx: hospital.ctxFor(hospital.lead, LATER), input });
    const refused = await refusal(takeBack(id));
    expect(refused.code).toBe("conflict");
    expect(refused.errors).toEqual([{ path: "rows.3", message: "Row 3: OSIER, OBS, Feb 2025" }]);
    expect(await hospital.tallyOf(hospital.obs.id, "2025-01")).toMatchObject({ numerator: 1 });
  });

  it("is refused where an accepted return was reopened since", async () => {
    const { id } = await hospital.check([["OSIER", "OBS", "2025-03", 1, 20]]);
    await commit(id, { accept: true });
    const input = { ward: "OSIER", month: asMonth("2025-03"), reason: "A count was missed" };
    await reopenReturn({ ctx: hospital.ctxFor(hospital.lead, LATER), input });
    expect((await refusal(takeBack(id))).code).toBe("conflict");

    await hospital.check([["OSIER", "OBS", "2025-05", 1, 20]]).then((reply) => commit(reply.id));
    const onlyAccepts = await hospital.check([["OSIER", "OBS", "2025-05", 1, 20]]);
    expect(onlyAccepts.counts.same).toBe(1);
    await commit(onlyAccepts.id, { accept: true });
    const later = { ward: "OSIER", month: asMonth("2025-05"), reason: "A count was missed" };
    await reopenReturn({ ctx: hospital.ctxFor(hospital.lead, LATER), input: later });
    expect((await refusal(takeBack(onlyAccepts.id))).errors).toHaveLength(1);
  });

  it("leaves what a lead brought in to a lead, and a checked sheet alone", async () => {
    const { id } = await hospital.check([["OSIER", "OBS", "2025-04", 1, 20]], hospital.nurse);
    expect((await refusal(takeBack(id))).code).toBe("precondition");
    await commit(id, { accept: true });
    expect((await refusal(takeBack(id, hospital.nurse))).code).toBe("forbidden");
    expect((await refusal(takeBack(id, hospital.nurseOf(hospital.osier.id)))).code).toBe("not-found");
    expect((await refusal(takeBack(id, hospital.infection))).code).toBe("forbidden");
    expect(await takeBack(id)).toMatchObject({ state: "taken-back" });
  });
});
