// Says whether packages or the build are older than the files they were made from.
import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from "node:fs";
import path from "node:path";
import { root } from "./settings.mjs";

const LOCKFILE = "package-lock.json";
const PACKAGES_STAMP = "node_modules/.ebbline-lock";
const BUILD_STAMP = ".next/ebbline-build";

/** What the build is made from. */
const SOURCES = [
  "app",
  "db",
  "lib",
  "public",
  "instrumentation.ts",
  "next.config.mjs",
  "package.json",
  LOCKFILE,
  "postcss.config.mjs",
  "proxy.ts",
  "tailwind.config.ts",
  "tsconfig.json",
];

/** @param {string} name */
const at = (name) => path.join(root, name);

/** @param {string} name @returns {string[]} files under it, in a fixed order */
function filesUnder(name) {
  if (!existsSync(at(name))) return [];
  if (!statSync(at(name)).isDirectory()) return [name];
  return readdirSync(at(name))
    .sort()
    .flatMap((entry) => filesUnder(`${name}/${entry}`));
}

/** @param {readonly string[]} names */
function fingerprint(names) {
  const hash = createHash("sha256");
  for (const file of names.flatMap(filesUnder)) {
    const bytes = readFileSync(at(file));
    hash.update(`${file}\0${bytes.byteLength}\0`).update(bytes);
  }
  return hash.digest("hex");
}

/** @param {string} stamp @param {string} value */
const stampSays = (stamp, value) => existsSync(at(stamp)) && readFileSync(at(stamp), "utf8") === value;

/** The packages that npm noted as installed are those of the lockfile: somebody ran `npm ci` by hand. */
function npmAgrees() {
  const note = at("node_modules/.package-lock.json");
  if (!existsSync(note)) return false;
  const wanted = JSON.parse(readFileSync(at(LOCKFILE), "utf8")).packages;
  const there = JSON.parse(readFileSync(note, "utf8")).packages;
  return Object.entries(wanted).every(([name, entry]) => {
    if (name === "" || entry.optional || entry.devOptional || entry.peer) return true;
    return there[name]?.version === entry.version;
  });
}

export function packagesAreCurrent() {
  if (!existsSync(at("node_modules"))) return false;
  if (stampSays(PACKAGES_STAMP, fingerprint([LOCKFILE]))) return true;
  return !existsSync(at(PACKAGES_STAMP)) && npmAgrees();
}

export function stampPackages() {
  writeFileSync(at(PACKAGES_STAMP), fingerprint([LOCKFILE]));
}

export function hasBuild() {
  return existsSync(at(".next/BUILD_ID"));
}

export function buildIsCurrent() {
  return hasBuild() && stampSays(BUILD_STAMP, fingerprint(SOURCES));
}

export function stampBuild() {
  writeFileSync(at(BUILD_STAMP), fingerprint(SOURCES));
}
