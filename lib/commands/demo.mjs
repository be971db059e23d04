// `npm run demo`: from a clean clone to the invented hospital, with nothing but Node and npm.
import "./boot/node-version.mjs";
import { folderRefusal, keptSecret, markDemoFolder, seedState } from "../config/data-folder.mjs";
import * as fingerprints from "./boot/fingerprints.mjs";
import { answers, isPortFree, run, serve } from "./boot/serve.mjs";
import { giveUp, readSettings } from "./boot/settings.mjs";

const PASSWORD = "ebbline-demo";
const ACCOUNTS = [
  ["nurse@harrowmere.example", "ward nurse, two wards"],
  ["nurse2@harrowmere.example", "ward nurse, one other ward"],
  ["infection@harrowmere.example", "infection control"],
  ["board@harrowmere.example", "board member"],
  ["lead@harrowmere.example", "quality lead"],
];

// A file for production may lie beside: its database, address and secret are not the demo's. Empty counts as unset
// and keeps the server from reading them there.
const env = {
  ...process.env,
  EBBLINE_DEMO: "1",
  DATABASE_URL: process.env.DATABASE_URL ?? "",
  NEXTAUTH_URL: "",
  NEXTAUTH_SECRET: "",
  EBBLINE_CLOCK: process.env.EBBLINE_CLOCK ?? "",
  EBBLINE_TRUST_PROXY: "0",
  HOSPITAL_NAME: "",
  HOSPITAL_TIME_ZONE: "",
};
delete process.env.NEXTAUTH_URL;

/** @param {string[]} args @param {Partial<NodeJS.ProcessEnv>} [more] */
function npm(args, more = {}) {
  const own = process.env.npm_execpath;
  const runEnv = { ...process.env, NEXT_TELEMETRY_DISABLED: "1", ...more };
  return own ? run(process.execPath, [own, ...args], runEnv) : run("npm", args, runEnv);
}

/** @param {string} what @param {Promise<number>} step */
async function must(what, step) {
  const code = await step;
  if (code !== 0) {
    console.error(`${what} didn't work out; see above.`);
    process.exit(code);
  }
}

async function prepare() {
  if (!fingerprints.packagesAreCurrent()) {
    console.log("Getting the packages (npm ci). The first time this takes a few minutes.");
    await must("Getting the packages", npm(["ci", "--include=dev"]));
  }
  fingerprints.stampPackages();
  if (!fingerprints.buildIsCurrent()) {
    console.log("Building. This takes about a minute, and again only when something changes.");
    await must("The build", npm(["run", "build"], { NODE_ENV: "production" }));
    fingerprints.stampBuild();
  }
}

/** @param {import("./boot/settings.mjs").Settings} settings */
function seed(settings) {
  const args = ["--conditions=react-server", "--import", "tsx", "lib/commands/seed-demo.ts"];
  return run(process.execPath, args, { ...env, NODE_ENV: "production", EBBLINE_DATA: settings.folder });
}

/** @param {string} url */
function showAccounts(url) {
  const width = Math.max(...ACCOUNTS.map(([email = ""]) => email.length));
  const lines = ACCOUNTS.map(([email = "", role]) => `  ${email.padEnd(width)}  ${role}`);
  console.log(
    `\nEbbline with the invented Harrowmere District Hospital: ${url}\n\n${lines.join("\n")}\n\n` +
      `  The password of each is ${PASSWORD}. Ctrl-C stops; what you enter is kept.\n`,
  );
}

const settings = readSettings({ host: "127.0.0.1" });
// Accounts with a published password are for this computer alone.
settings.host = "127.0.0.1";
settings.url = `http://127.0.0.1:${settings.port}`;
const inUse = `Port ${settings.port} is in use. Choose another one, such as PORT=${settings.port + 1} npm run demo.`;
const refusal = folderRefusal(settings.folder, true);
if (refusal) giveUp(refusal);
if (!(await isPortFree(settings))) giveUp(inUse);

await prepare();
markDemoFolder(settings.folder);
if (seedState(settings.folder) !== "whole" || env.DATABASE_URL !== "")
  await must("Filling the demo", seed(settings));
if (!(await isPortFree(settings))) giveUp(inUse);

let hasEnded = false;
const serving = serve(settings, { ...env, NEXTAUTH_SECRET: keptSecret(settings.folder) }).finally(() => {
  hasEnded = true;
});
if (await answers(settings, () => hasEnded)) showAccounts(settings.url);
process.exitCode = await serving;
