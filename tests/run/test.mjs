// What a newcomer runs: everything but the long and the server-bound checks (see test-full.mjs).
import { ensureInstalled, ensureProgram, finish, run, step, vitest } from "./steps.mjs";

const outcomes = [step("packages installed", ensureInstalled)];
if (outcomes[0]?.failed) finish(outcomes);

outcomes.push(
  step("formatting", () => run("npm", ["run", "-s", "format:check"])),
  step("lint", () => run("npm", ["run", "-s", "lint"])),
  step("types", () => run("npm", ["run", "-s", "types"])),
  step("versions in the lockfile", () => run("node", ["tests/run/version-floors.mjs"])),
  step("migrations match the schema", () => run("node", ["tests/run/migration-drift.mjs"])),
  vitest("unit and reference", ["--project", "unit", "--coverage"]),
  vitest("integration on the embedded database", ["--project", "integration"]),
);
const built = step("build", () => run("npm", ["run", "-s", "build"]));
outcomes.push(built);
if (!built.failed) {
  outcomes.push(vitest("API over HTTP", ["--project", "api"]));
  const chromium = step("chromium is there", () => ensureProgram("chromium", "chromium"));
  outcomes.push(chromium);
  if (!chromium.failed) outcomes.push(vitest("browser", ["--project", "browser"]));
}
finish(outcomes);
