// Plain JavaScript: the start commands use it before anything is installed or built.
import { randomBytes } from "node:crypto";
import { existsSync, mkdirSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";

const DEMO_MARK = ".ebbline-demo";
const SEED_MARK = ".ebbline-demo-begun";
const SECRET_FILE = "session-secret";
const DATABASE = "database";
const SECRET_LENGTH = 32;

/**
 * True where the folder was made by the demo or a test, so invented people and a fixed clock are allowed in it.
 * @param {string} folder
 */
export function isDemoFolder(folder) {
  return existsSync(path.join(folder, DEMO_MARK));
}

/**
 * True where Ebbline has already kept something in the folder.
 * @param {string} folder
 */
export function holdsData(folder) {
  return [DEMO_MARK, SECRET_FILE, DATABASE].some((name) => existsSync(path.join(folder, name)));
}

/** @param {string} folder */
export function markDemoFolder(folder) {
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  if (!isDemoFolder(folder)) {
    writeFileSync(path.join(folder, DEMO_MARK), "This folder holds invented data.\n", { mode: 0o600 });
  }
}

/**
 * How far the demo's data got: "none", "begun" where filling it was cut short, or "whole".
 * @param {string} folder
 * @returns {"none" | "begun" | "whole"}
 */
export function seedState(folder) {
  if (existsSync(seedMarkPath(folder))) return "begun";
  return existsSync(databasePath(folder)) ? "whole" : "none";
}

/** There while the demo is being filled. @param {string} folder */
export const seedMarkPath = (folder) => path.join(folder, SEED_MARK);

/** Where the embedded database lies. @param {string} folder */
export const databasePath = (folder) => path.join(folder, DATABASE);

/**
 * Why the folder can't be used this way, or null. Real and invented data never share a folder.
 * @param {string} folder
 * @param {boolean} demo
 */
export function folderRefusal(folder, demo) {
  if (!demo && isDemoFolder(folder)) {
    return `The data folder ${folder} belongs to the demo. Choose another one with EBBLINE_DATA.`;
  }
  if (demo && !isDemoFolder(folder) && holdsData(folder)) {
    return `The data folder ${folder} is not the demo's and stays untouched. Choose another one with EBBLINE_DATA.`;
  }
  return null;
}

/**
 * The secret that signs sessions: made once and kept in the data folder, readable by its owner alone.
 * @param {string} folder
 */
export function keptSecret(folder) {
  const file = path.join(folder, SECRET_FILE);
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  try {
    // "wx": of two processes that start at once, one makes the secret and both use it.
    writeFileSync(file, randomBytes(SECRET_LENGTH).toString("hex"), { mode: 0o600, flag: "wx" });
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code !== "EEXIST") throw error;
  }
  const secret = readFileSync(file, "utf8").trim();
  if (secret.length < SECRET_LENGTH) throw new Error(`The secret in ${file} is too short; remove the file.`);
  return secret;
}
