// Plain JavaScript, so that it runs unbundled from any process. Holds and renews the lock of a data folder.
import { parentPort } from "node:worker_threads";
import lockfile from "proper-lockfile";

/** @type {(() => Promise<void>) | null} */
let release = null;

/** @param {string} folder @param {number} stale */
async function hold(folder, stale) {
  try {
    release = await lockfile.lock(folder, {
      stale,
      update: Math.max(1000, Math.floor(stale / 4)),
      realpath: false,
      lockfilePath: `${folder}/in-use.lock`,
      // A killed process leaves its lock behind until it is stale: wait a little longer than that.
      retries: { retries: Math.ceil(stale / 500) + 4, factor: 1, minTimeout: 500, maxTimeout: 500 },
      onCompromised: (error) => parentPort?.postMessage({ type: "lost", reason: error.message }),
    });
    parentPort?.postMessage({ type: "held" });
  } catch (error) {
    parentPort?.postMessage({ type: "busy", reason: error instanceof Error ? error.message : String(error) });
  }
}

parentPort?.on("message", async (message) => {
  if (message.type === "hold") await hold(message.folder, message.stale);
  if (message.type === "release") {
    await release?.().catch(() => undefined);
    parentPort?.postMessage({ type: "released" });
  }
});
