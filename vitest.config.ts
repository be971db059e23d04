import path from "node:path";
import { defineConfig } from "vitest/config";

const root = import.meta.dirname;

export default defineConfig({
  resolve: {
    alias: {
      "@": root,
      // Outside a server bundle the guard package throws; tests call the services directly.
      "server-only": path.join(root, "tests/support/empty-module.ts"),
    },
  },
  oxc: { jsx: { runtime: "automatic" } },
  test: {
    testTimeout: 60_000,
    hookTimeout: 120_000,
    globalSetup: "tests/support/global-setup.ts",
    projects: [
      {
        extends: true,
        test: {
          name: "unit",
          sequence: { groupOrder: 0 },
          include: ["tests/unit/**/*.test.{ts,tsx}", "tests/reference/**/*.test.ts"],
        },
      },
      {
        extends: true,
        test: {
          name: "integration",
          sequence: { groupOrder: 1 },
          include: ["tests/integration/**/*.test.ts"],
          exclude: ["tests/integration/large/**"],
          pool: "forks",
          maxWorkers: 2,
        },
      },
      {
        extends: true,
        test: {
          name: "large",
          sequence: { groupOrder: 2 },
          include: ["tests/integration/large/**/*.test.ts"],
          pool: "forks",
          fileParallelism: false,
        },
      },
      {
        extends: true,
        test: {
          name: "endurance",
          sequence: { groupOrder: 3 },
          include: ["tests/endurance/**/*.test.ts"],
          pool: "forks",
          fileParallelism: false,
        },
      },
      {
        extends: true,
        test: {
          name: "api",
          sequence: { groupOrder: 4 },
          include: ["tests/api/**/*.test.ts"],
          pool: "forks",
          fileParallelism: false,
        },
      },
      {
        extends: true,
        test: {
          name: "browser",
          sequence: { groupOrder: 5 },
          include: ["tests/browser/**/*.test.ts"],
          pool: "forks",
          fileParallelism: false,
        },
      },
    ],
    coverage: {
      provider: "v8",
      include: ["lib/limits/**", "lib/indicators/**", "lib/policy/**"],
      thresholds: { branches: 95 },
    },
  },
});
