import { mkdir, mkdtemp, readFile, rm, stat, writeFile } from "node:fs/promises";
import os from "node:os";
import path from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { fixedClock } from "@/lib/config/clock";
import { folderRefusal, isDemoFolder, keptSecret, markDemoFolder } from "@/lib/config/data-folder.mjs";
import { supplyEnv } from "@/lib/config/env";

let folder: string;

beforeEach(async () => {
  folder = await mkdtemp(path.join(os.tmpdir(), "ebbline-folder-"));
});
afterEach(() => rm(folder, { recursive: true }));

describe("the kept secret", () => {
  it("is made once, long enough, for its owner alone", async () => {
    const made = keptSecret(folder);
    expect(made).toMatch(/^[0-9a-f]{64}$/);
    expect(keptSecret(folder)).toBe(made);
    expect((await stat(path.join(folder, "session-secret"))).mode & 0o777).toBe(0o600);
  });

  it("isn't used where somebody shortened it", async () => {
    await writeFile(path.join(folder, "session-secret"), "short");
    expect(() => keptSecret(folder)).toThrow("too short");
  });
});

describe("real and invented data", () => {
  it("never share a folder", async () => {
    expect([folderRefusal(folder, true), folderRefusal(folder, false)]).toEqual([null, null]);
    await mkdir(path.join(folder, "database"));
    expect(folderRefusal(folder, true)).toContain("not the demo's");
    expect(folderRefusal(folder, false)).toBeNull();

    markDemoFolder(folder);
    expect(isDemoFolder(folder)).toBe(true);
    expect(folderRefusal(folder, true)).toBeNull();
    expect(folderRefusal(folder, false)).toContain("belongs to the demo");
    const before = await readFile(path.join(folder, ".ebbline-demo"), "utf8");
    markDemoFolder(folder);
    expect(await readFile(path.join(folder, ".ebbline-demo"), "utf8")).toBe(before);
  });
});

describe("a fixed clock", () => {
  afterEach(() => supplyEnv({ EBBLINE_CLOCK: "", EBBLINE_DATA: "" }));

  it("is refused with real data and kept with invented", () => {
    supplyEnv({ EBBLINE_CLOCK: "2026-12-01T08:00:00Z", EBBLINE_DATA: folder });
    expect(() => fixedClock()).toThrow("EBBLINE_CLOCK");
    markDemoFolder(folder);
    expect(fixedClock()).toEqual(new Date("2026-12-01T08:00:00Z"));
  });
});
