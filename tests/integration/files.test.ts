import { readdir, writeFile } from "node:fs/promises";
import path from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { dataFolder } from "@/db/client";
import { checksumOf, getFile, putFile } from "@/lib/files";
import { makeDataFolder } from "../support/sheets";

let dropFolder: () => Promise<void>;
beforeAll(async () => {
  dropFolder = await makeDataFolder();
});
afterAll(() => dropFolder());

const bytes = new TextEncoder().encode("Ward,Indicator,Month");

describe("the store of files", () => {
  it("keeps the same bytes once, under their checksum", async () => {
    const [left, right] = await Promise.all([putFile(bytes), putFile(bytes)]);
    expect(left).toBe(checksumOf(bytes));
    expect(right).toBe(left);
    expect(await getFile(left)).toEqual(bytes);
    const folder = path.join(dataFolder(), "files", left.slice(0, 2));
    expect(await readdir(folder)).toEqual([left]);
  });

  it("has nothing for what was never put, for what is no checksum, and for what was altered", async () => {
    expect(await getFile("0".repeat(64))).toBeNull();
    expect(await getFile("../../database")).toBeNull();
    const checksum = await putFile(new Uint8Array([1, 2, 3]));
    await writeFile(path.join(dataFolder(), "files", checksum.slice(0, 2), checksum), "altered");
    expect(await getFile(checksum)).toBeNull();
    await putFile(new Uint8Array([1, 2, 3]));
    expect(await getFile(checksum)).toEqual(new Uint8Array([1, 2, 3]));
  });
});
