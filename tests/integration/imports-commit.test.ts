import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { and, eq, sql } from "drizzle-orm";
import { tallies, tallyRevisions } from "@/db/schema";
import { asMonth } from "@/lib/indicators/month";
import { commitImport } from "@/lib/services/imports";
import { submitReturn } from "@/lib/services/returns";
import { saveTally } from "@/lib/services/tallies";
import { updateWard } from "@/lib/services/wards";
import { makeImportHospital, refusal, type ImportHospital } from "../support/import-hospital";
import type { SheetRow } from "../support/sheets";

let hospital: ImportHospital;
beforeAll(async () => {
  hospital = await makeImportHospital();
});
afterAll(() => hospital.close());

const commit = (id: string, input: object = {}, actor = hospital.lead) =>
  commitImport({ ctx: hospital.ctxFor(actor), input: { id, ...input } });

const revisionsOf = (indicatorId: string, month: string) =>
  hospital.db
    .select()
    .from(tallyRevisions)
    .where(and(eq(tallyRevisions.indicatorId, indicatorId), eq(tallyRevisions.month, asMonth(month))))
    .orderBy(tallyRevisions.id);

describe("bringing a sheet in", () => {
  it("wants rejected rows left out by name, then fills open returns without sending them", async () => {
    const { id } = await hospital.check(
      [
        ["OSIER", "FALLS", "2026-11", 6, 804],
        ["OSIER", "HARM", "2026-11", 0, 804, "", "Quiet month"],
        ["OSIER", "OBS", "2026-11", 118, 19],
      ],
      hospital.nurse,
    );
    const refused = await refusal(commit(id, {}, hospital.nurse));
    expect(refused.code).toBe("invalid");
    expect(refused.message).toContain("leave out 1 row, bring in 2");
    expect(await hospital.tallyOf(hospital.falls.id, "2026-11")).toBeNull();

    const summary = await commit(id, { leaveOutRejected: true }, hospital.nurse);
    expect(summary).toMatchObject({ state: "committed", broughtIn: 2, accepted: false });
    expect(await hospital.tallyOf(hospital.harm.id, "2026-11")).toMatchObject({
      numerator: 0,
      denominator: null,
      note: "Quiet month",
      charted: false,
      version: 1,
      updatedBy: hospital.nurse.name,
    });
    expect(await hospital.returnOf("2026-11")).toMatchObject({ status: "open", dueOn: "2026-12-07" });
    const [revision] = await revisionsOf(hospital.falls.id, "2026-11");
    expect(revision).toMatchObject({
      event: "saved",
      charted: null,
      numerator: 6,
      denominator: 804,
      source: "import",
      importRunId: id,
      actorId: hospital.nurse.personId,
    });
    const [entry] = await hospital.auditsOf("import.commit");
    expect(JSON.parse(entry?.after ?? "{}")).toMatchObject({ state: "committed", rows: 2 });
  });

  it("changes nothing more when it is committed twice and answers as the first time", async () => {
    const { id } = await hospital.check([["TERN", "OBS", "2026-11", 2, 60]]);
    const first = await commit(id);
    const versions = await hospital.db.select({ version: tallies.version }).from(tallies);
    const audits = await hospital.auditsOf("import.commit");
    expect(await commit(id, { reason: "Again" })).toEqual(first);
    expect(await hospital.db.select({ version: tallies.version }).from(tallies)).toEqual(versions);
    expect(await hospital.auditsOf("import.commit")).toHaveLength(audits.length);
  });

  it("makes one of two commits at once", async () => {
    const { id } = await hospital.check([["TERN", "OBS", "2026-10", 2, 60]]);
    const audits = await hospital.auditsOf("import.commit");
    const [left, right] = await Promise.all([commit(id), commit(id)]);
    expect(left).toEqual(right);
    expect(await hospital.auditsOf("import.commit")).toHaveLength(audits.length + 1);
  });

  it("answers 409 with the rows where a tally, a shared denominator or a return has moved", async () => {
    const rows: SheetRow[] = [
      ["TERN", "FALLS", "2026-06", 2, 600],
      ["TERN", "OBS", "2026-06", 2, 60],
      ["TERN", "OBS", "2026-05", 2, 60],
    ];
    const ctx = hospital.ctxFor(hospital.lead);
    const one = await hospital.check(rows);
    const line = { ward: "TERN", month: asMonth("2026-06"), version: 0 };
    await saveTally({ ctx, input: { ...line, indicator: "OBS", numerator: 9 } });
    const tallyMoved = await refusal(commit(one.id));
    expect(tallyMoved.code).toBe("conflict");
    expect(tallyMoved.errors).toEqual([{ path: "rows.3", message: "Row 3: TERN, OBS, Jun 2026" }]);

    const two = await hospital.check(rows);
    await saveTally({ ctx, input: { ...line, indicator: "HARM", denominator: 610, denominatorVersion: 0 } });
    expect((await refusal(commit(two.id))).errors.map((error) => error.path)).toEqual(["rows.2"]);

    const three = await hospital.check([["TERN", "OBS", "2026-05", 2, 60]]);
    for (const indicator of ["FALLS", "HARM", "OBS"]) {
      const denominatorVersion = indicator === "HARM" ? 1 : 0;
      const figures = { numerator: 1, denominator: 20, version: 0, denominatorVersion };
      await saveTally({ ctx, input: { ward: "TERN", month: asMonth("2026-05"), indicator, ...figures } });
    }
    await submitReturn({ ctx, input: { ward: "TERN", month: asMonth("2026-05") } });
    expect((await refusal(commit(three.id, { reason: "Recount" }))).code).toBe("conflict");
    expect(await hospital.tallyOf(hospital.obs.id, "2026-05", hospital.tern.id)).toMatchObject({
      numerator: 1,
    });
  });

  it("answers 409 where the ward has been closed for a month meanwhile", async () => {
    const { id } = await hospital.check([["TERN", "OBS", "2024-01", 2, 60]]);
    const input = { code: "TERN", openFrom: asMonth("2024-02"), version: 1 };
    await updateWard({ ctx: hospital.ctxFor(hospital.lead), input });
    expect((await refusal(commit(id))).code).toBe("conflict");
  });

  it("corrects a sent month for a lead with a reason, the lines that share its denominator too", async () => {
    const ctx = hospital.ctxFor(hospital.lead);
    const rows: SheetRow[] = [
      ["OSIER", "FALLS", "2026-03", 4, 700],
      ["OSIER", "HARM", "2026-03", 1, 700],
      ["OSIER", "OBS", "2026-03", 5, 50],
    ];
    await commit((await hospital.check(rows)).id);
    await submitReturn({ ctx, input: { ward: "OSIER", month: asMonth("2026-03") } });

    const { id } = await hospital.check([["OSIER", "FALLS", "2026-03", 5, 720]]);
    expect((await refusal(commit(id))).errors[0]?.path).toBe("reason");
    await commit(id, { reason: "Bed days were counted twice" });
    expect(await hospital.tallyOf(hospital.falls.id, "2026-03")).toMatchObject({
      numerator: 5,
      chartedNumerator: 5,
      chartedDenominator: 720,
      corrected: true,
    });
    const sibling = await hospital.tallyOf(hospital.harm.id, "2026-03");
    expect(sibling).toMatchObject({
      chartedNumerator: 1,
      chartedDenominator: 720,
      corrected: true,
      version: 1,
    });
    expect(await hospital.tallyOf(hospital.obs.id, "2026-03")).toMatchObject({ corrected: false });
    expect((await revisionsOf(hospital.harm.id, "2026-03")).at(-1)).toMatchObject({
      event: "corrected",
      charted: true,
      denominator: 720,
      reason: "Bed days were counted twice",
    });
  });

  it("accepts the returns that it fills for a lead alone, blank lines left off the charts", async () => {
    const { id } = await hospital.check([["OSIER", "OBS", "2025-06", 5, 50]], hospital.nurse);
    expect((await refusal(commit(id, { accept: true }, hospital.nurse))).code).toBe("forbidden");
    await commit(id, { accept: true });
    expect(await hospital.returnOf("2025-06")).toMatchObject({
      status: "accepted",
      acceptedBy: hospital.lead.name,
    });
    expect(await hospital.tallyOf(hospital.obs.id, "2025-06")).toMatchObject({
      charted: true,
      chartedNumerator: 5,
      chartedDenominator: 50,
      corrected: false,
    });
    expect(await hospital.tallyOf(hospital.falls.id, "2025-06")).toBeNull();
  });

  it("keeps the running month open when it accepts", async () => {
    const rows: SheetRow[] = [
      ["OSIER", "OBS", "2026-12", 1, 20],
      ["OSIER", "OBS", "2025-07", 1, 20],
    ];
    await commit((await hospital.check(rows)).id, { accept: true });
    expect((await hospital.returnOf("2026-12"))?.status).toBe("open");
    expect((await hospital.returnOf("2025-07"))?.status).toBe("accepted");
  });

  it("is refused to whoever may not see it, and to a nurse who no longer sends for the ward", async () => {
    const { id } = await hospital.check([["OSIER", "OBS", "2025-01", 1, 20]], hospital.nurse);
    const other = hospital.nurseOf(hospital.osier.id);
    expect((await refusal(commit(id, {}, other))).code).toBe("not-found");
    expect((await refusal(commit(id, {}, hospital.infection))).code).toBe("forbidden");
    expect((await refusal(commit(id, {}, hospital.board))).code).toBe("forbidden");
    const moved = { ...hospital.nurse, wardIds: [hospital.tern.id] };
    expect((await refusal(commit(id, {}, moved))).code).toBe("forbidden");
  });

  it("keeps nothing where the audit entry can't be written", async () => {
    const { id } = await hospital.check([["OSIER", "FALLS", "2025-02", 1, 500]]);
    await hospital.db.execute(sql`create function refuse_audit() returns trigger language plpgsql as
      $$ begin raise exception 'no audit today'; end $$`);
    await hospital.db.execute(sql`create trigger no_audit before insert on audit_entries
      for each row execute function refuse_audit()`);
    await expect(commit(id, { accept: true })).rejects.toThrow();
    await hospital.db.execute(sql`drop trigger no_audit on audit_entries`);
    expect(await hospital.tallyOf(hospital.falls.id, "2025-02")).toBeNull();
    expect(await hospital.returnOf("2025-02")).toBeNull();
    expect(await commit(id)).toMatchObject({ state: "committed", broughtIn: 1 });
  });
});
