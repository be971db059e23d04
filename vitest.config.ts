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
        test: { name: "unit", include: ["tests/unit/**/*.test.{ts,tsx}", "tests/reference/**/*.test.ts"] },
      },
      {
        extends: true,
        test: {
          name: "integration",
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
          include: ["tests/integration/large/**/*.test.ts"],
          pool: "forks",
          fileParallelism: false,
        },
      },
      {
        extends: true,
        test: {
          name: "endurance",
          include: ["tests/endurance/**/*.test.ts"],
          pool: "forks",
          fileParallelism: false,
        },
      },
      {
        extends: true,
        test: { name: "api", include: ["tests/api/**/*.test.ts"], pool: "forks", fileParallelism: false },
      },
      {
        extends: true,
        test: {
          name: "browser",
          include: ["tests/browser/**/*.test.ts"],
          pool: "forks",
          fileParallelism: false,
        },
      },
    ],
    coverage: { provider: "v8", include: ["lib/limits/**", "lib/indicators/**", "lib/policy/**"] },
  },
});
