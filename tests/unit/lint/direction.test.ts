import { ESLint } from "eslint";
import { describe, expect, it } from "vitest";
import { directionZones } from "@/lib/config/lint/direction.mjs";
import { houseRules } from "@/lib/config/lint/house-rules.mjs";

const root = process.cwd();

/** The house rules alone, so that a made-up file needs no types. */
const eslint = new ESLint({
  cwd: root,
  overrideConfigFile: true,
  overrideConfig: [
    {
      files: ["**/*.ts", "**/*.tsx"],
      languageOptions: { sourceType: "module" },
      plugins: { house: houseRules },
      rules: {
        "house/direction": ["error", directionZones],
        "house/guarded-transaction": "error",
        "house/where-on-write": "error",
      },
    },
  ],
});

async function complaints(filePath: string, code: string): Promise<string[]> {
  const [result] = await eslint.lintText(code, { filePath });
  return (result?.messages ?? []).map((message) => message.message);
}

const forbidden: [file: string, code: string][] = [
  ["lib/limits/x.ts", `import "@/lib/indicators/month";`],
  ["lib/limits/x.ts", `import "node:fs";`],
  ["lib/limits/x.ts", `import "zod";`],
  ["lib/errors/x.ts", `import "@/lib/limits";`],
  ["lib/strings/x.ts", `import "@/lib/errors";`],
  ["lib/indicators/x.ts", `import "@/lib/policy";`],
  ["lib/indicators/x.ts", `import "@/db/client";`],
  ["lib/indicators/x.ts", `import "drizzle-orm";`],
  ["lib/policy/x.ts", `import "@/lib/schemas/common";`],
  ["lib/policy/x.ts", `import "@/db/schema";`],
  ["lib/schemas/x.ts", `import "@/db/schema";`],
  ["lib/schemas/x.ts", `import "@/lib/services/series";`],
  ["lib/scene/x.ts", `import "react";`],
  ["db/x.ts", `import "@/lib/services/audit";`],
  ["lib/workbook/x.ts", `import "@/db/client";`],
  ["lib/services/x.ts", `import "@/lib/auth/current-actor";`],
  ["lib/services/x.ts", `import "@/lib/http";`],
  ["lib/services/x.ts", `import "@/app/x";`],
  ["lib/auth/x.ts", `import "@/lib/http";`],
  ["lib/http/x.ts", `import "@/lib/commands/x";`],
  ["lib/http/x.ts", `import "@/app/x";`],
  ["lib/commands/x.ts", `import "@/app/x";`],
  ["app/x.ts", `import "@/db/client";`],
  ["app/x.ts", `import "drizzle-orm";`],
  ["app/x.ts", `import "@electric-sql/pglite";`],
  ["app/x.ts", `export * from "@/db/schema";`],
  ["app/x.ts", `const later = () => import("@/db/client");`],
  ["app/x.ts", `"use client"; import "@/lib/services/series";`],
  ["app/x.ts", `"use client"; import "@/lib/config/env";`],
  ["app/deep/folder/x.ts", `import "../../../db/client";`],
];

const allowed: [file: string, code: string][] = [
  ["lib/limits/x.ts", `import "./types";`],
  ["lib/indicators/x.ts", `import "@/lib/limits/types";`],
  ["lib/schemas/x.ts", `import "zod"; import "@/lib/policy";`],
  ["db/x.ts", `import "@/lib/policy"; import "drizzle-orm";`],
  ["lib/services/x.ts", `import "@/db/client";`],
  ["lib/http/x.ts", `import "@/lib/auth/current-actor";`],
  ["app/x.ts", `import "@/lib/services/series"; import "@/lib/http";`],
  ["app/x.ts", `"use client"; import "@/lib/schemas/common"; import "./y";`],
];

describe("import direction", () => {
  it.each(forbidden)("%s may not hold %s", async (file, code) => {
    expect(await complaints(file, code)).toHaveLength(1);
  });

  it.each(allowed)("%s may hold %s", async (file, code) => {
    expect(await complaints(file, code)).toEqual([]);
  });

  it("gives every folder under lib a rank", async () => {
    const { readdir } = await import("node:fs/promises");
    const folders = (await readdir("lib", { withFileTypes: true })).filter((entry) => entry.isDirectory());
    const ranked = new Set(directionZones.map((zone) => zone.path));
    expect(folders.map((folder) => `lib/${folder.name}`).filter((path) => !ranked.has(path))).toEqual([]);
  });
});

describe("the project's configuration", () => {
  const project = new ESLint({ cwd: root });

  it.each([
    "lib/limits/types.ts",
    "lib/services/series/index.ts",
    "db/client.ts",
    "lib/http/route.ts",
    "app/page.tsx",
  ])("enforces the direction in %s", async (file) => {
    const config = (await project.calculateConfigForFile(file)) as { rules: Record<string, [number]> };
    expect(config.rules["house/direction"]?.[0]).toBe(2);
    expect(config.rules["import-x/no-cycle"]?.[0]).toBe(2);
  });

  it("demands guarded transactions in services", async () => {
    const config = (await project.calculateConfigForFile("lib/services/series/index.ts")) as {
      rules: Record<string, [number]>;
    };
    expect(config.rules["house/guarded-transaction"]?.[0]).toBe(2);
    expect(config.rules["house/where-on-write"]?.[0]).toBe(2);
  });
});

describe("guarded transactions and writes", () => {
  const verb = "lib/services/x.ts";

  it("refuses a transaction without a check and an audit entry", async () => {
    expect(await complaints(verb, "withTransaction(ctx, work);")).toHaveLength(1);
    expect(await complaints(verb, "authorize(a, b, c); withTransaction(ctx, work);")).toHaveLength(1);
    expect(
      await complaints(verb, "authorize(a, b, c); withTransaction(ctx, work); writeAudit(tx, d);"),
    ).toEqual([]);
  });

  it("refuses an update or delete of every row", async () => {
    expect(await complaints(verb, "tx.db.update(wards).set({ name });")).toHaveLength(1);
    expect(await complaints(verb, "tx.db.delete(wards);")).toHaveLength(1);
    expect(await complaints(verb, "tx.db.update(wards).set({ name }).where(own);")).toEqual([]);
    expect(await complaints(verb, "tx.db.delete(wards).where(own);")).toEqual([]);
  });
});
