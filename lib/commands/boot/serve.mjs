import { spawn } from "node:child_process";
import net from "node:net";
import path from "node:path";
import { root } from "./settings.mjs";

/** @typedef {import("./settings.mjs").Settings} Settings */

const NEXT = path.join(root, "node_modules/next/dist/bin/next");

/** True where nobody listens on the port yet. @param {Settings} settings @returns {Promise<boolean>} */
export function isPortFree({ host, port }) {
  return new Promise((resolve) => {
    const probe = net.createServer();
    probe.once("error", () => resolve(false));
    probe.listen(port, host, () => probe.close(() => resolve(true)));
  });
}

/**
 * Runs a program in the project's folder with this console. Signals that this command gets are passed on, so that
 * nothing stays behind. Resolves to the exit code, also where a signal ended it.
 * @param {string} file
 * @param {string[]} args
 * @param {NodeJS.ProcessEnv} env
 * @param {boolean} [isServer] adds a channel that tells the server when this command is gone, however it went
 * @returns {Promise<number>}
 */
export function run(file, args, env, isServer = false) {
  /** @type {import("node:child_process").StdioOptions} */
  const stdio = isServer ? ["inherit", "inherit", "inherit", "ipc"] : "inherit";
  const child = spawn(file, args, { cwd: root, env, stdio });
  /** @param {NodeJS.Signals} signal */
  const passOn = (signal) => child.kill(signal);
  process.on("SIGINT", passOn);
  process.on("SIGTERM", passOn);
  return new Promise((resolve) => {
    /** @param {number} code */
    const done = (code) => {
      process.off("SIGINT", passOn);
      process.off("SIGTERM", passOn);
      resolve(code);
    };
    child.once("error", () => done(1));
    child.once("exit", (code) => done(code ?? 1));
  });
}

/**
 * The built application on its address, until it ends.
 * @param {Settings} settings
 * @param {NodeJS.ProcessEnv} env
 */
export function serve({ host, port, folder, url }, env) {
  /** @type {NodeJS.ProcessEnv} */
  const serverEnv = {
    ...env,
    NODE_ENV: "production",
    HOST: host,
    PORT: String(port),
    EBBLINE_DATA: folder,
    NEXTAUTH_URL: url,
    NEXT_TELEMETRY_DISABLED: "1",
    // The server closes its database itself before it ends.
    NEXT_MANUAL_SIG_HANDLE: "1",
  };
  return run(process.execPath, [NEXT, "start", "-H", host, "-p", String(port)], serverEnv, true);
}

/**
 * Waits until the server answers, or has ended. The time limit is for a server that hangs.
 * @param {Settings} settings
 * @param {() => boolean} hasEnded
 */
export async function answers({ host, port }, hasEnded, limit = 120_000) {
  const address = `http://${["0.0.0.0", "::"].includes(host) ? "127.0.0.1" : host}:${port}/api/health`;
  const end = Date.now() + limit;
  while (Date.now() < end && !hasEnded()) {
    const reply = await fetch(address).catch(() => null);
    if (reply?.ok) return true;
    await new Promise((resolve) => setTimeout(resolve, 250));
  }
  return false;
}
