import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { sql } from "drizzle-orm";
import { importRuns, tallies, wardReturns } from "@/db/schema";
import { getFile } from "@/lib/files";
import { asMonth } from "@/lib/indicators/month";
import { checkImport, getImport, listImports } from "@/lib/services/imports";
import { submitReturn } from "@/lib/services/returns";
import { saveTally } from "@/lib/services/tallies";
import { writeTalliesWorkbook } from "@/lib/workbook";
import { makeImportHospital, refusal, type ImportHospital } from "../support/import-hospital";
import { csvUpload, type SheetRow } from "../support/sheets";

let hospital: ImportHospital;
beforeAll(async () => {
  hospital = await makeImportHospital();
});
afterAll(() => hospital.close());

const outcomes = (reply: { rows: { row: number; outcome: string }[] }) =>
  Object.fromEntries(reply.rows.map((row) => [row.row, row.outcome]));

describe("checking a sheet", () => {
  it("says what each row would do and changes nothing", async () => {
    const reply = await hospital.check(
      [
        ["OSIER", "FALLS", "2026-11", 6, 804],
        ["osier", "harm", "2026-11", 0, 804],
        ["OSIER", "OBS", "2026-11", 118, 19],
        ["TERN", "FALLS", "2026-11", 1, 900],
        ["OSEIR", "FALLS", "2026-11", 1, 900],
        ["OSIER", "FALS", "2026-11", 1, 900],
        ["OSIER", "OBS", "2027-01", 1, 900],
        ["OSIER", "OBS", "2023-12", 1, 900],
        ["OSIER", "CATH", "2026-11", "", 268],
        ["OSIER", "CATH", "2026-10", 2, 268],
        ["OSIER", "OBS", "2026-09", "", ""],
        ["OSIER", "OBS", "2026-08", "n/a", 12],
        ["OSIER", "OBS", "2026-07", 3, 0],
        ["OSIER", "OBS", "2026-06", "", 30],
        ["OSIER", "OBS", "2026-05", "", "", "No computer on the ward"],
      ],
      hospital.nurse,
    );
    expect(reply.counts).toEqual({ new: 4, changed: 0, same: 0, rejected: 10, skipped: 1 });
    expect(reply.skippedRows).toEqual([12]);
    const messages = Object.fromEntries(reply.rows.map((row) => [row.row, row.messages]));
    expect(messages).toMatchObject({
      2: [],
      4: ["D4, E4: Numerator 118 is more than denominator 19. The two may be the wrong way round."],
      5: ["A5: No ward has the code “TERN”. You can send for OSIER."],
      6: ["A6: No ward has the code “OSEIR”. Did you mean OSIER? You can send for OSIER."],
      7: ["B7: No indicator has the code “FALS”. Did you mean FALLS?"],
      8: ["C8: Jan 2027 is still to come."],
      9: ["C9: Osier reports Late observations from Jan 2024 on."],
      10: ["D10: Denominator only: the numerator is counted by infection control."],
      11: ["D11: Catheter infections is counted by infection control. Leave the numerator blank."],
      14: ["D14, E14: 3 counted out of 0. With nothing to count, the numerator is 0 too."],
    });
    expect(messages[13]?.[0]).toMatch(/^D13: “n\/a” isn't a whole number/);
    expect(messages[15]?.[0]).toMatch(/blank is not zero/);
    expect(reply.totals.find((each) => each.indicator === "FALLS")).toMatchObject({
      rows: 1,
      before: { numerator: 0, denominator: 0 },
      after: { numerator: 6, denominator: 804 },
    });
    expect(await hospital.db.select().from(tallies)).toHaveLength(0);
    expect(await hospital.db.select().from(wardReturns)).toHaveLength(0);
    const [entry] = await hospital.auditsOf("import.check");
    expect(entry?.actorName).toBe(hospital.nurse.name);
    expect(entry?.after).toContain(reply.checksum);
    expect(await getFile(reply.checksum)).not.toBeNull();
  });

  it("gives somebody else's ward the words of a ward that doesn't exist", async () => {
    const [others, none] = (
      await hospital.check(
        [
          ["TERN", "FALLS", "2026-11", 1, 900],
          ["XYZQW", "FALLS", "2026-11", 1, 900],
        ],
        hospital.nurse,
      )
    ).rows;
    expect(others?.messages[0]?.replace("TERN", "…").replace("A2", "")).toBe(
      none?.messages[0]?.replace("XYZQW", "…").replace("A3", ""),
    );
  });

  it("rejects both of two rows for one line, identical or not", async () => {
    const reply = await hospital.check([
      ["OSIER", "OBS", "2026-11", 1, 30],
      ["OSIER", "OBS", "2026-11", 1, 30],
      ["TERN", "OBS", "2026-11", 1, 30],
    ]);
    expect(outcomes(reply)).toEqual({ 2: "rejected", 3: "rejected", 4: "new" });
    expect(reply.rows[0]?.messages).toEqual([
      "A2, B2, C2: Row 3 is for the same ward, indicator and month. Keep one.",
    ]);
  });

  it("rejects two values for one shared denominator", async () => {
    const reply = await hospital.check([
      ["OSIER", "FALLS", "2026-11", 1, 800],
      ["OSIER", "HARM", "2026-11", 0, 801],
      ["TERN", "FALLS", "2026-11", 1, 800],
    ]);
    expect(outcomes(reply)).toEqual({ 2: "rejected", 3: "rejected", 4: "new" });
    expect(reply.rows[0]?.messages[0]).toContain("Row 3 gives another value");
  });

  it("rejects a shared denominator that an unlisted line can't be counted out of", async () => {
    const ctx = hospital.ctxFor(hospital.lead);
    const line = { ward: "TERN", month: asMonth("2026-10"), indicator: "HARM" };
    await saveTally({
      ctx,
      input: { ...line, numerator: 40, denominator: 500, version: 0, denominatorVersion: 0 },
    });
    const alone = await hospital.check([["TERN", "FALLS", "2026-10", 2, 30]]);
    expect(outcomes(alone)).toEqual({ 2: "rejected" });
    expect(alone.rows[0]?.messages[0]).toContain("Patients harmed counts out of the same denominator");
    const both: SheetRow[] = [
      ["TERN", "FALLS", "2026-10", 2, 30],
      ["TERN", "HARM", "2026-10", 10, 30],
    ];
    expect(outcomes(await hospital.check(both))).toEqual({ 2: "new", 3: "changed" });
  });

  it("rejects changes of a sent month for a nurse and asks a lead for a reason", async () => {
    const ctx = hospital.ctxFor(hospital.lead);
    const month = asMonth("2026-09");
    for (const [indicator, numerator, denominator] of [
      ["FALLS", 3, 700],
      ["HARM", 1, 700],
      ["OBS", 4, 90],
    ] as const) {
      const denominatorVersion = indicator === "HARM" ? 1 : 0;
      const figures = { numerator, denominator, version: 0, denominatorVersion };
      await saveTally({ ctx, input: { ward: "OSIER", month, indicator, ...figures } });
    }
    await submitReturn({ ctx, input: { ward: "OSIER", month } });
    const rows: SheetRow[] = [
      ["OSIER", "FALLS", "2026-09", 3, 700],
      ["OSIER", "OBS", "2026-09", 5, 90],
    ];
    const nurses = await hospital.check(rows, hospital.nurse);
    expect(outcomes(nurses)).toEqual({ 2: "same", 3: "rejected" });
    expect(nurses.rows[1]?.messages).toEqual([
      "C3: Sep 2026 was sent already. Ask for a correction instead.",
    ]);
    const leads = await hospital.check(rows);
    expect(outcomes(leads)).toEqual({ 2: "same", 3: "changed" });
    expect(leads.rows[1]?.messages).toEqual(["C3: Sep 2026 was sent already, so this needs a reason."]);
    expect(leads.needsReason).toBe(true);
  });

  it("reads a workbook of 25 rows", async () => {
    const months = ["2025-01", "2025-02", "2025-03", "2025-04", "2025-05"];
    const lines = ["OSIER", "TERN"].flatMap((ward) => months.map((month) => ({ ward, month })));
    const tallies = lines.flatMap(({ ward, month }, index) =>
      [
        { indicator: "OBS", numerator: index, denominator: 40 },
        { indicator: "FALLS", numerator: 1, denominator: 650 },
        { indicator: "HARM", numerator: 0, denominator: 650 },
      ].map((line) => ({ ward, month: asMonth(month), ...line, notCollected: null, note: "=1+1" })),
    );
    const table = { columns: [{ title: "Indicator" }], rows: [["OBS"]] };
    const bytes = await writeTalliesWorkbook({
      tallies: tallies.slice(0, 25),
      definitions: table,
      cautions: ["Care"],
    });
    const input = { fileName: "history.xlsx", bytes };
    const reply = await checkImport({ ctx: hospital.ctxFor(hospital.lead), input });
    expect(reply.sheetName).toBe("Tallies");
    expect(reply.counts.new).toBe(25);
    expect(reply.columns.map((column) => column.readAs)).toContain("notCollected");
    expect(reply.rows[0]?.note).toBe("=1+1");
  });

  it("sends at most 200 messages and says how many there are", async () => {
    const rows = Array.from({ length: 260 }, (): SheetRow => ["NOBODY", "OBS", "2026-11", 1, 30]);
    const reply = await hospital.check(rows);
    expect(reply.rows).toHaveLength(260);
    expect(reply.rows.flatMap((row) => row.messages)).toHaveLength(200);
    expect(reply.messageCount).toBe(260);
  });

  it("pages the rows of one outcome", async () => {
    const rows: SheetRow[] = [
      ["OSIER", "OBS", "2026-01", 1, 30],
      ["OSIER", "NOTHING", "2026-01", 1, 30],
      ["OSIER", "OBS", "2026-02", 1, 30],
      ["OSIER", "OBS", "2026-03", 1, 30],
    ];
    const { id } = await hospital.check(rows);
    const ctx = hospital.ctxFor(hospital.lead);
    const first = await getImport({ ctx, input: { id, show: "new", limit: 2 } });
    expect(first.rows.map((row) => row.row)).toEqual([2, 4]);
    const second = await getImport({
      ctx,
      input: { id, show: "new", limit: 2, cursor: first.nextCursor ?? "" },
    });
    expect(second.rows.map((row) => row.row)).toEqual([5]);
    expect(second.nextCursor).toBeNull();
  });
});

describe("who may check and see imports", () => {
  const file = csvUpload([["OSIER", "OBS", "2026-11", 1, 30]]);

  it("refuses infection control and the board", async () => {
    for (const actor of [hospital.infection, hospital.board]) {
      const ctx = hospital.ctxFor(actor);
      expect((await refusal(checkImport({ ctx, input: file }))).code).toBe("forbidden");
      expect((await refusal(listImports({ ctx, input: {} }))).code).toBe("forbidden");
    }
  });

  it("shows one's own to a nurse, all to a lead", async () => {
    const own = await checkImport({ ctx: hospital.ctxFor(hospital.nurse), input: file });
    const other = hospital.ctxFor(hospital.nurseOf(hospital.osier.id));
    expect((await refusal(getImport({ ctx: other, input: { id: own.id } }))).code).toBe("not-found");
    expect((await listImports({ ctx: other, input: {} })).items).toEqual([]);
    const seen = await listImports({ ctx: hospital.ctxFor(hospital.lead), input: {} });
    expect(seen.items[0]).toMatchObject({ id: own.id, state: "checked", broughtIn: 0 });
    const first = await listImports({ ctx: hospital.ctxFor(hospital.lead), input: { limit: 1 } });
    const next = { cursor: first.nextCursor ?? "", limit: 1 };
    const second = await listImports({ ctx: hospital.ctxFor(hospital.lead), input: next });
    expect(second.items[0]?.id).toBe(seen.items[1]?.id);
  });

  it("leaves nothing behind where the audit can't be written", async () => {
    const before = await hospital.db.select({ id: importRuns.id }).from(importRuns);
    await hospital.db.execute(sql`create function refuse_audit() returns trigger language plpgsql as
      $$ begin raise exception 'no audit today'; end $$`);
    await hospital.db.execute(sql`create trigger no_audit before insert on audit_entries
      for each row execute function refuse_audit()`);
    await expect(checkImport({ ctx: hospital.ctxFor(hospital.lead), input: file })).rejects.toThrow();
    await hospital.db.execute(sql`drop trigger no_audit on audit_entries`);
    expect(await hospital.db.select({ id: importRuns.id }).from(importRuns)).toHaveLength(before.length);
  });
});
