// Plain JavaScript without packages: it also runs in a clone where nothing is installed yet.
import { spawnSync } from "node:child_process";
import { existsSync, mkdirSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";

export const root = path.resolve(import.meta.dirname, "../..");

/** Runs a command with its output shown; true when it ended well. @param {string} command @param {string[]} args @param {Record<string, string>} [env] */
export function run(command, args, env = {}) {
  const result = spawnSync(command, args, { cwd: root, stdio: "inherit", env: { ...process.env, ...env } });
  return result.status === 0;
}

/** Installs what the lockfile says where nothing is installed. */
export function ensureInstalled() {
  if (existsSync(path.join(root, "node_modules/.package-lock.json"))) return true;
  console.log("Installing the packages of the lockfile …");
  return run("npm", ["ci", "--no-audit", "--no-fund"]);
}

/** A Debian package for a program: installed where we may, named where we may not. @param {string} program @param {string} debianPackage */
export function ensureProgram(program, debianPackage) {
  if (isThere(program)) return true;
  const mayInstall = process.getuid?.() === 0 && existsSync("/usr/bin/apt-get");
  if (mayInstall) {
    console.log(`Installing ${debianPackage} …`);
    const env = { DEBIAN_FRONTEND: "noninteractive" };
    run("apt-get", ["update", "-q"], env);
    run("apt-get", ["install", "-y", "-q", "--no-install-recommends", debianPackage], env);
  }
  if (isThere(program)) return true;
  console.error(`Install ${debianPackage} first: apt-get install ${debianPackage}`);
  return false;
}

/** @param {string} program */
function isThere(program) {
  if (program.startsWith("/")) return spawnSync("sh", ["-c", `ls ${program}`]).status === 0;
  return spawnSync("sh", ["-c", `command -v ${program}`]).status === 0;
}

/** @typedef {{ name: string, passed: number, failed: number }} Outcome */

/** Where each step leaves its counts. */
function resultsFolder() {
  const folder = process.env.EBBLINE_TEST_RESULTS ?? path.join(root, "tests/.tmp/results");
  mkdirSync(folder, { recursive: true });
  return folder;
}

/** A step that is one check: passed or failed as a whole. @param {string} name @param {() => boolean} work @returns {Outcome} */
export function step(name, work) {
  console.log(`\n== ${name}`);
  const passed = work();
  return keep({ name, passed: passed ? 1 : 0, failed: passed ? 0 : 1 });
}

/** A vitest run; its own report gives the counts. @param {string} name @param {string[]} args @param {Record<string, string>} [env] @returns {Outcome} */
export function vitest(name, args, env = {}) {
  console.log(`\n== ${name}`);
  const report = path.join(resultsFolder(), `${name.replace(/\W+/g, "-")}.vitest.json`);
  const reporters = ["--reporter=default", "--reporter=json", `--outputFile.json=${report}`];
  const isOk = run("npx", ["vitest", "run", ...args, ...reporters], env);
  if (!existsSync(report)) return keep({ name, passed: 0, failed: 1 });
  const counts = JSON.parse(readFileSync(report, "utf8"));
  const failed = counts.numFailedTests + (isOk || counts.numFailedTests > 0 ? 0 : 1);
  return keep({ name, passed: counts.numPassedTests, failed });
}

/** @param {Outcome} outcome */
function keep(outcome) {
  const file = path.join(resultsFolder(), `${outcome.name.replace(/\W+/g, "-")}.outcome.json`);
  writeFileSync(file, JSON.stringify(outcome));
  return outcome;
}

/** Prints a table and ends the process. @param {Outcome[]} outcomes */
export function finish(outcomes) {
  console.log("");
  for (const { name, passed, failed } of outcomes) {
    console.log(`${failed === 0 ? "ok  " : "FAIL"} ${name}: ${passed} passed, ${failed} failed`);
  }
  const failed = outcomes.reduce((sum, outcome) => sum + outcome.failed, 0);
  const passed = outcomes.reduce((sum, outcome) => sum + outcome.passed, 0);
  console.log(`\n${passed} passed, ${failed} failed`);
  process.exit(failed === 0 ? 0 : 1);
}
