import { strToU8 } from "fflate";
import { describe, expect, it } from "vitest";
import { readUpload } from "@/lib/workbook/read-upload";
import { readBytes } from "@/lib/workbook/read-bytes";
import { buildXlsx, headingRow, refusalOf } from "./fixtures";

const generous = { seconds: 60, memoryMegabytes: 256 };
const csv = (rows: number) =>
  strToU8(`Ward,Indicator,Month,Numerator,Denominator\n${"OSI,FALLS,2026-11,6,804\n".repeat(rows)}`);

describe("reading in a worker", () => {
  it("gives what the reader gives, over several messages", async () => {
    const bytes = csv(1_201);
    expect(await readUpload({ bytes, fileName: "a.csv" }, generous)).toEqual(readBytes(bytes, "a.csv"));
  });

  it("reads a view of a larger buffer and leaves the caller's bytes alone", async () => {
    const content = buildXlsx({ rows: `${headingRow}<row><c><v>1</v></c></row>` });
    const buffer = new Uint8Array(content.length + 20);
    buffer.set(content, 10);
    const view = buffer.subarray(10, 10 + content.length);
    const sheet = await readUpload({ bytes: view, fileName: "a.xlsx" }, generous);
    expect(sheet.rows).toHaveLength(1);
    expect(view).toEqual(content);
  });

  it("hands on refusals with their messages", async () => {
    const error = await refusalOf(() =>
      readUpload({ bytes: strToU8("Ward,Month"), fileName: "a.csv" }, generous),
    );
    expect(error.code).toBe("invalid");
    expect(error.errors).toHaveLength(3);
  });

  it("reads several uploads at once, each with its own answer", async () => {
    const uploads = [1, 2, 3, 4].map((rows) => readUpload({ bytes: csv(rows), fileName: "a.csv" }, generous));
    expect((await Promise.all(uploads)).map(({ rows }) => rows.length)).toEqual([1, 2, 3, 4]);
  });
});

describe("limits of a reading", () => {
  it("refuses more than 5 MB unread", async () => {
    const bytes = new Uint8Array(5 * 1024 * 1024 + 1);
    expect((await refusalOf(() => readUpload({ bytes, fileName: "a.xlsx" }))).code).toBe("too-large");
  });

  it("ends when its time is over", async () => {
    const error = await refusalOf(() =>
      readUpload({ bytes: csv(50_000), fileName: "a.csv" }, { ...generous, seconds: 0 }),
    );
    expect(error.code).toBe("too-large");
    expect(error.message).toContain("took longer");
  });

  it("ends when its memory is used up, and the next reading works", async () => {
    const bytes = csv(50_000);
    const error = await refusalOf(() =>
      readUpload({ bytes, fileName: "a.csv" }, { ...generous, memoryMegabytes: 24 }),
    );
    expect(error.code).toBe("too-large");
    expect(error.message).toContain("memory");
    expect((await readUpload({ bytes: csv(1), fileName: "a.csv" }, generous)).rows).toHaveLength(1);
  });

  it("ends when the caller gives up, before or during the reading", async () => {
    const upload = { bytes: csv(50_000), fileName: "a.csv" };
    const gone = new Error("gone");
    await expect(readUpload({ ...upload, signal: AbortSignal.abort(gone) }, generous)).rejects.toBe(gone);
    const controller = new AbortController();
    const reading = readUpload({ ...upload, signal: controller.signal }, generous);
    setImmediate(() => controller.abort(gone));
    await expect(reading).rejects.toBe(gone);
  });
});
