// What takes longer than a newcomer should wait: the same suites on a PostgreSQL server, large imports, kill rounds.
import { existsSync } from "node:fs";
import path from "node:path";
import { startPostgres } from "./postgres-server.mjs";
import { ensureInstalled, ensureProgram, finish, root, run, step, vitest } from "./steps.mjs";

const outcomes = [step("packages installed for the full run", ensureInstalled)];
if (outcomes[0]?.failed) finish(outcomes);

const server = step("postgresql is there", () =>
  ensureProgram("/usr/lib/postgresql/*/bin/initdb", "postgresql"),
);
outcomes.push(server);
if (!server.failed) {
  const postgres = await startPostgres();
  try {
    outcomes.push(
      vitest("integration on a PostgreSQL server", ["--project", "integration"], {
        TEST_DATABASE_URL: postgres.url,
      }),
    );
  } finally {
    postgres.stop();
  }
}
outcomes.push(vitest("large", ["--project", "large"]));
if (!existsSync(path.join(root, ".next/BUILD_ID")))
  outcomes.push(step("build for the full run", () => run("npm", ["run", "-s", "build"])));
outcomes.push(vitest("endurance", ["--project", "endurance"]));
finish(outcomes);
