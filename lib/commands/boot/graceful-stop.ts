import "server-only";
import { subscribe } from "node:diagnostics_channel";
import type { Server } from "node:http";
import { closeStore } from "@/db/client";

/** Requests under way get this long to finish. */
const PATIENCE = 5_000;

let server: Server | undefined;
let isStopping = false;

/**
 * On SIGTERM, SIGINT or the loss of the command that started this process: takes no new requests, lets those under
 * way finish, closes the database and gives the data folder free. Needs NEXT_MANUAL_SIG_HANDLE, which the start
 * commands set; without it the framework ends the process first, and the folder is free once its lock is stale.
 */
export function stopGracefully(): void {
  subscribe("http.server.request.start", (message) => {
    server ??= (message as { server: Server }).server;
  });
  process.on("SIGTERM", () => void stop());
  process.on("SIGINT", () => void stop());
  process.on("disconnect", () => void stop());
}

async function stop(): Promise<void> {
  if (isStopping) return;
  isStopping = true;
  try {
    await closeServer();
    await closeStore();
  } catch (error) {
    console.error(
      `The database was not closed in order: ${error instanceof Error ? error.message : String(error)}`,
    );
  }
  process.exit(0);
}

function closeServer(): Promise<void> {
  return new Promise((resolve) => {
    if (!server) return resolve();
    const open = server;
    const cut = setTimeout(() => open.closeAllConnections(), PATIENCE);
    open.close(() => {
      clearTimeout(cut);
      resolve();
    });
    open.closeIdleConnections();
  });
}
