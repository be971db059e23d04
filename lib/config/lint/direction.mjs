/**
 * Ranks of the folders: a file imports from lower ranks and from its own folder, never upwards. `beside` names the
 * folders of the same rank that it may use as well. Longer paths are matched first.
 * @typedef {{ path: string, rank: number, beside?: string[], packages?: string[] | "any" }} Zone
 */

/** @type {Zone[]} */
export const directionZones = [
  { path: "lib/limits", rank: 0, packages: [] },
  { path: "lib/errors", rank: 0, packages: [] },
  { path: "lib/config", rank: 0, packages: "any" },
  { path: "lib/strings", rank: 0, packages: [] },
  { path: "lib/indicators", rank: 1, packages: [] },
  { path: "lib/policy", rank: 2, packages: [] },
  { path: "lib/schemas", rank: 2, beside: ["lib/policy"], packages: ["zod"] },
  { path: "lib/scene", rank: 2, packages: [] },
  { path: "db", rank: 3, packages: "any" },
  { path: "lib/workbook", rank: 3, packages: "any" },
  { path: "lib/files", rank: 4, packages: "any" },
  { path: "lib/services", rank: 4, beside: ["lib/files"], packages: "any" },
  { path: "lib/demo", rank: 4, beside: ["lib/services"], packages: "any" },
  { path: "lib/auth", rank: 5, packages: "any" },
  { path: "lib/http", rank: 5, beside: ["lib/auth"], packages: "any" },
  { path: "lib/commands", rank: 5, beside: ["lib/auth", "lib/http"], packages: "any" },
  { path: "app", rank: 6, packages: "any" },
];

/** Packages that only the database's rank, services and tools touch; the app never does. */
export const DATABASE_PACKAGES = ["drizzle-orm", "@electric-sql/pglite", "pg"];

/** What a `"use client"` file may import of ours. */
export const CLIENT_FOLDERS = [
  "lib/limits",
  "lib/errors",
  "lib/strings",
  "lib/indicators",
  "lib/policy",
  "lib/schemas",
  "lib/scene",
  "app",
];
