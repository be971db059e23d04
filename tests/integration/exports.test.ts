import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { asMonth, monthRange } from "@/lib/indicators/month";
import type { Actor } from "@/lib/policy";
import { exportTallies, type ExportFormat } from "@/lib/services/exports";
import { checkImport, commitImport, makeTemplate } from "@/lib/services/imports";
import { saveTally } from "@/lib/services/tallies";
import { readTallyRow, readUpload } from "@/lib/workbook";
import { makeImportHospital, refusal, type ImportHospital } from "../support/import-hospital";
import type { SheetRow } from "../support/sheets";

let hospital: ImportHospital;

beforeAll(async () => {
  hospital = await makeImportHospital();
  const months = monthRange(asMonth("2026-05"), asMonth("2026-10"));
  const rows = ["OSIER", "TERN"].flatMap((ward) =>
    months.flatMap((month, index): SheetRow[] => [
      [ward, "FALLS", month, index, 700 + index, "", index === 2 ? "=HYPERLINK(1)" : ""],
      [ward, "HARM", month, 0, 700 + index],
      index === 4 ? [ward, "OBS", month, "", "", "-No computer"] : [ward, "OBS", month, index, 40],
      [ward, "CATH", month, 0, index === 5 ? 0 : 200],
    ]),
  );
  const ctx = hospital.ctxFor(hospital.lead);
  const { id } = await hospital.check(rows);
  await commitImport({ ctx, input: { id, accept: true } });
  const open = { ward: "OSIER", month: asMonth("2026-11"), version: 0 };
  await saveTally({ ctx, input: { ...open, indicator: "OBS", numerator: 2, denominator: 30 } });
  await saveTally({ ctx, input: { ...open, indicator: "FALLS", numerator: 2 } });
  await saveTally({ ctx, input: { ...open, indicator: "CATH", denominator: 0 } });
  const awaited = { numerator: 1, awaited: "Pharmacy", version: 0 };
  await saveTally({ ctx, input: { ward: "TERN", month: asMonth("2026-11"), indicator: "OBS", ...awaited } });
});
afterAll(() => hospital.close());

const take = async (actor: Actor, format: ExportFormat, query: object = {}) => ({
  fileName: `tallies.${format}`,
  bytes: await exportTallies({ ctx: hospital.ctxFor(actor), input: { ...query, format } }),
});

describe("exporting tallies", () => {
  for (const format of ["xlsx", "csv"] as const) {
    it(`brings every row of its ${format} in again as the same`, async () => {
      const file = await take(hospital.lead, format);
      const reply = await checkImport({ ctx: hospital.ctxFor(hospital.lead), input: file });
      expect(reply.counts).toEqual({ new: 0, changed: 0, same: 50, rejected: 0, skipped: 0 });
    });

    it(`is the same to the ward's nurse as ${format}, with own wards only`, async () => {
      const file = await take(hospital.nurse, format);
      const reply = await checkImport({ ctx: hospital.ctxFor(hospital.nurse), input: file });
      expect(reply.counts).toMatchObject({ same: 26, rejected: 0, changed: 0, new: 0 });
      expect(new Set(reply.rows.map((row) => row.ward))).toEqual(new Set(["OSIER"]));
    });
  }

  it("leaves out what is half filled or awaited and keeps reasons and notes as text", async () => {
    const { bytes, fileName } = await take(hospital.infection, "xlsx");
    const rows = (await readUpload({ bytes, fileName })).rows.map(readTallyRow);
    const november = rows.filter((row) => row.month === "2026-11");
    expect(november.map((row) => [row.ward, row.indicator, row.numerator, row.denominator])).toEqual([
      ["OSIER", "CATH", 0, 0],
      ["OSIER", "OBS", 2, 30],
    ]);
    expect(rows.filter((row) => row.notCollected === "-No computer")).toHaveLength(2);
    expect(rows.filter((row) => row.note === "=HYPERLINK(1)")).toHaveLength(2);
  });

  it("keeps to ward, indicator and months, and notes who took it", async () => {
    const query = { from: asMonth("2026-06"), to: asMonth("2026-07"), ward: "TERN", indicator: "OBS" };
    const file = await take(hospital.lead, "csv", query);
    const sheet = await readUpload(file);
    expect(sheet.rows.map((row) => readTallyRow(row).month)).toEqual(["2026-06", "2026-07"]);
    const entry = (await hospital.auditsOf("export.tallies")).at(-1);
    expect(JSON.parse(entry?.after ?? "{}")).toMatchObject({ ward: "TERN", indicator: "OBS", rows: 2 });
  });

  it("hides other wards and refuses the board", async () => {
    expect((await refusal(take(hospital.nurse, "csv", { ward: "TERN" }))).code).toBe("not-found");
    expect((await refusal(take(hospital.lead, "csv", { ward: "NOBODY" }))).code).toBe("not-found");
    expect((await refusal(take(hospital.lead, "csv", { indicator: "NOTHING" }))).code).toBe("not-found");
    expect((await refusal(take(hospital.board, "csv"))).code).toBe("forbidden");
  });
});

describe("the template", () => {
  const template = async (actor: Actor, query: { month: string; ward?: string }) => {
    const input = { ...query, month: asMonth(query.month) };
    const bytes = await makeTemplate({ ctx: hospital.ctxFor(actor), input });
    return (await readUpload({ bytes, fileName: "template.xlsx" })).rows.map(readTallyRow);
  };

  it("has a blank row for every line of one's wards", async () => {
    const rows = await template(hospital.nurse, { month: "2026-11" });
    expect(rows.map((row) => [row.ward, row.indicator, row.month, row.blank])).toEqual([
      ["OSIER", "CATH", "2026-11", true],
      ["OSIER", "FALLS", "2026-11", true],
      ["OSIER", "OBS", "2026-11", true],
      ["OSIER", "HARM", "2026-11", true],
    ]);
    expect(await template(hospital.lead, { month: "2026-11", ward: "TERN" })).toHaveLength(4);
    expect(await template(hospital.lead, { month: "2026-11" })).toHaveLength(8);
  });

  it("hides other wards and refuses whoever sends nothing", async () => {
    expect((await refusal(template(hospital.nurse, { month: "2026-11", ward: "TERN" }))).code).toBe(
      "not-found",
    );
    expect((await refusal(template(hospital.infection, { month: "2026-11" }))).code).toBe("forbidden");
    expect((await refusal(template(hospital.board, { month: "2026-11" }))).code).toBe("forbidden");
  });
});
