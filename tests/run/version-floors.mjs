// Fails when a locked package is older than the first version without a published hole. A registry's audit may not
// answer, so the floors that we know of stand here (noted from the packages' own advisories, partly from memory);
// raise them when an advisory appears.
import { readFileSync } from "node:fs";
import path from "node:path";
import { root } from "./steps.mjs";

/** @type {Record<string, string>} */
const floors = {
  next: "16.4.6",
  "next-auth": "4.24.12",
  nodemailer: "8.0.9",
  postcss: "8.4.31",
  ws: "8.17.1",
};

const lock = JSON.parse(readFileSync(path.join(root, "package-lock.json"), "utf8"));
const failures = [];
for (const [location, entry] of Object.entries(lock.packages)) {
  const name = location.split("node_modules/").at(-1) ?? "";
  const floor = floors[name];
  if (floor && isOlder(entry.version, floor))
    failures.push(`${location} is ${entry.version}, at least ${floor} is needed`);
  if (entry.resolved?.startsWith("http")) failures.push(`${location} names a registry's host`);
}
if (failures.length > 0) {
  console.error(failures.join("\n"));
  process.exit(1);
}
console.log("No locked package is below its floor.");

/** @param {string} version @param {string} floor */
function isOlder(version, floor) {
  const left = version.split(/[.-]/).map(Number);
  const right = floor.split(".").map(Number);
  for (let index = 0; index < 3; index += 1) {
    const difference = (left[index] ?? 0) - (right[index] ?? 0);
    if (difference !== 0) return difference < 0;
  }
  return false;
}
