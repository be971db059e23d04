import { readFileSync } from "node:fs";
import path from "node:path";
import ExcelJS from "exceljs";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { z } from "zod";
import { addMonths, asMonth } from "@/lib/indicators/month";
import { chartSchema } from "@/lib/schemas/chart";
import { importSchema, importSummarySchema, type ImportReply } from "@/lib/schemas/import";
import { signedIn, type HttpClient, type Reply } from "@/tests/support/http-client";
import { START_LIMIT, startServer, type TestServer } from "@/tests/support/server";

/**
 * The published example of a p chart whose subgroups differ in size (25 weeks of purchase orders), told as 25 months
 * of a ward: Montgomery DC, Introduction to Statistical Quality Control, Wiley. Case a-mont-variable of the
 * reference cases, which gives the limits in full precision.
 */
const numbers = z.array(z.number());
const referenceCase = z.object({
  input: z.object({ x: numbers, n: numbers }),
  expected: z.object({
    center: z.number(),
    sum_x: z.number(),
    sum_n: z.number(),
    ucl: numbers,
    lcl: numbers,
    upper_warning: numbers,
    lower_warning: numbers,
    /** Counted from 1. */
    beyond_action: numbers,
  }),
});
const file = path.resolve(import.meta.dirname, "../reference/cases/a-proportions.json");
const { cases } = z
  .object({ cases: z.array(z.looseObject({ id: z.string() })) })
  .parse(JSON.parse(readFileSync(file, "utf8")));
const { input, expected } = referenceCase.parse(cases.find(({ id }) => id === "a-mont-variable"));

const FIRST = asMonth("2024-10");
const rows = input.x.map((numerator, index) => ({
  month: addMonths(FIRST, index),
  numerator,
  denominator: input.n[index] ?? 0,
}));

let server: TestServer;
let lead: HttpClient;
beforeAll(async () => {
  server = await startServer();
  lead = await signedIn(server.url, "lead");
  const definition = {
    code: "ORDERS",
    name: "Orders with an error",
    numeratorLabel: "Orders with an error",
    denominatorLabel: "Orders looked at",
    kind: "proportion",
    per: 100,
    betterWhen: "lower",
    team: "quality",
  };
  mustBe(201, await lead.post("/api/indicators", definition));
}, START_LIMIT);
afterAll(() => server?.stop());

function mustBe(status: number, reply: Reply): Reply {
  expect(reply.status, JSON.stringify(reply.body).slice(0, 500)).toBe(status);
  return reply;
}

/** A ward that is to report the indicator from the first of the months on. */
async function makeWard(code: string): Promise<void> {
  const ward = { code, name: `${code} ward`, division: "Surgery", openFrom: FIRST };
  mustBe(201, await lead.post("/api/wards", ward));
  mustBe(200, await lead.put(`/api/assignments/${code}/ORDERS`, { from: FIRST }));
}

async function workbookFor(ward: string): Promise<Uint8Array> {
  const book = new ExcelJS.Workbook();
  const sheet = book.addWorksheet("Tallies");
  // In another order than the export's, with a column that nobody asked for.
  sheet.addRow(["Month", "Counted by", "Ward", "Indicator", "Denominator", "Numerator"]);
  for (const { month, numerator, denominator } of rows) {
    const date = new Date(`${month}-15T00:00:00Z`);
    sheet.addRow([date, "pharmacy", ward, "ORDERS", denominator, numerator]);
  }
  return new Uint8Array(await book.xlsx.writeBuffer());
}

function csvFor(ward: string): string {
  const lines = rows.map((row) => `${ward};ORDERS;${row.month};${row.numerator};${row.denominator}`);
  return ["ward;indicator;month;numerator;denominator", ...lines].join("\n");
}

async function check(bytes: Uint8Array | string, fileName: string): Promise<ImportReply> {
  return importSchema.parse(mustBe(200, await lead.upload("/api/imports", bytes, fileName)).body);
}

async function chartOf(ward: string, query = "") {
  return chartSchema.parse(mustBe(200, await lead.get(`/api/charts/${ward}/ORDERS${query}`)).body);
}

describe.each([
  { ward: "XLSX", fileName: "orders.xlsx", make: workbookFor },
  { ward: "CSV", fileName: "orders.csv", make: async (ward: string) => csvFor(ward) },
])("25 months from $fileName", ({ ward, fileName, make }) => {
  it("come in by one upload and one commit, which changes nothing when said twice", async () => {
    await makeWard(ward);
    const checked = await check(await make(ward), fileName);
    expect(checked.counts).toMatchObject({ new: 25, changed: 0, same: 0, rejected: 0 });
    expect(
      checked.rows.map(({ month, numerator, denominator }) => ({ month, numerator, denominator })),
    ).toEqual(rows);
    expect((await chartOf(ward)).points.every((point) => point.numerator === null)).toBe(true);

    const commit = () => lead.post(`/api/imports/${checked.id}/commit`, { accept: true });
    const first = importSummarySchema.parse(mustBe(200, await commit()).body);
    expect(first).toMatchObject({ state: "committed", broughtIn: 25, accepted: true });
    const entries = async () =>
      z
        .object({ chain: z.object({ entries: z.number() }) })
        .parse((await lead.get("/api/audit?limit=1")).body);
    const before = await entries();
    expect(importSummarySchema.parse(mustBe(200, await commit()).body)).toEqual(first);
    expect(await entries()).toEqual(before);
    expect((await lead.get(`/api/returns/${ward}/${FIRST}`)).body).toMatchObject({
      status: "accepted",
      late: false,
    });
  });

  it("draw the published centre line and limits", async () => {
    const chart = await chartOf(ward);
    expect([expected.sum_x, expected.sum_n]).toEqual([234, 2450]);
    expect(chart.centre).toBeCloseTo(234 / 2450, 12);
    expect(chart.centre).toBeCloseTo(expected.center, 12);
    expect(chart).toMatchObject({ kind: "proportion", limits: "three-sigma", limitsChosen: "auto" });
    const counted = chart.points.filter(({ state }) => state === "counted");
    expect(counted.map(({ month }) => month)).toEqual(rows.map(({ month }) => month));
    counted.forEach((point, index) => {
      const limits = [point.upperAction, point.lowerAction, point.upperWarning, point.lowerWarning];
      const { ucl, lcl, upper_warning: upper, lower_warning: lower } = expected;
      [ucl, lcl, upper, lower].forEach((wanted, side) => {
        const difference = Math.abs((limits[side] ?? NaN) - (wanted[index] ?? NaN));
        expect(difference, `${point.month}, limit ${side}`).toBeLessThan(1e-9);
      });
    });
  });

  it("flag the one month beyond, and no other", async () => {
    const chart = await chartOf(ward);
    const beyond = chart.points.filter((point) => point.beyond !== null);
    expect(expected.beyond_action).toEqual([11]);
    expect(beyond.map(({ month, beyond: side }) => [month, side])).toEqual([[addMonths(FIRST, 10), "upper"]]);
    expect(chart.signals.filter(({ rule }) => rule === "beyond-action")).toMatchObject([
      {
        from: addMonths(FIRST, 10),
        to: addMonths(FIRST, 10),
        side: "upper",
        towards: "adverse",
        status: "new",
      },
    ]);
  });

  it.each(["xlsx", "csv"])("go out as %s and come back the same", async (format) => {
    const exported = await lead.download(`/api/exports/tallies.${format}?ward=${ward}&indicator=ORDERS`);
    expect(exported.status).toBe(200);
    expect(exported.headers.get("content-disposition")).toMatch(/^attachment; filename="[\w.-]+"$/);
    const again = await check(exported.bytes, `again.${format}`);
    expect(again.counts).toMatchObject({ same: 25, new: 0, changed: 0, rejected: 0 });
    expect(again.rows.map(({ outcome }) => outcome)).toEqual(Array(25).fill("same"));
  });
});

it("refuses a sheet with one bad row as a whole, and says where", async () => {
  const bad = csvFor("CSV").replace(";12;100", ";101;100");
  const checked = await check(bad, "bad.csv");
  expect(checked.counts.rejected).toBe(1);
  expect(checked.rows.find(({ outcome }) => outcome === "rejected")?.messages.join(" ")).toMatch(/^[A-Z]+2/);
  const before = await chartOf("CSV");
  mustBe(
    422,
    await lead.post(`/api/imports/${checked.id}/commit`, { accept: true, reason: "Counted again." }),
  );
  expect(await chartOf("CSV")).toEqual(before);
});

it("takes an import back, and the chart with it", async () => {
  await makeWard("BACK");
  const checked = await check(csvFor("BACK"), "back.csv");
  mustBe(200, await lead.post(`/api/imports/${checked.id}/commit`, { accept: true }));
  expect((await chartOf("BACK")).centre).toBeCloseTo(234 / 2450, 12);
  mustBe(200, await lead.delete(`/api/imports/${checked.id}`));
  expect(await chartOf("BACK")).toMatchObject({ centre: null, signals: [] });
});
