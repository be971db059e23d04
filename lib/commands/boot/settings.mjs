// What the start commands need of the environment before anything is installed; the server checks it all again.
import { existsSync } from "node:fs";
import path from "node:path";
import { fileURLToPath } from "node:url";

export const root = fileURLToPath(new URL("../../..", import.meta.url)).replace(/[\\/]$/, "");

/**
 * @typedef {object} Settings
 * @property {string} host
 * @property {number} port
 * @property {string} folder data folder, absolute
 * @property {string} url the address that people type
 */

/** Ends the command with one line. @param {string} message @returns {never} */
export function giveUp(message) {
  console.error(message);
  process.exit(1);
}

/** Reads `.env` as the server will; what the environment says already stands. */
export function readEnvFile() {
  const file = path.join(root, ".env");
  if (!existsSync(file)) return;
  if (typeof process.loadEnvFile !== "function") giveUp("Reading .env needs Node 20.12 or newer.");
  process.loadEnvFile(file);
}

/** @param {{ host: string }} defaults @returns {Settings} */
export function readSettings(defaults) {
  const host = process.env.HOST || defaults.host;
  const port = Number(process.env.PORT || "3000");
  if (!Number.isInteger(port) || port < 1 || port > 65_535) giveUp("PORT is a number from 1 to 65535.");
  const folder = path.resolve(root, process.env.EBBLINE_DATA || ".data");
  const shown = ["0.0.0.0", "::"].includes(host) ? "localhost" : host.includes(":") ? `[${host}]` : host;
  return { host, port, folder, url: process.env.NEXTAUTH_URL || `http://${shown}:${port}` };
}
