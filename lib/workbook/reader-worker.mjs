/**
 * Reads one upload in a thread of its own, so that a hostile file can exhaust neither the server's memory nor its
 * time. Plain JavaScript that loads the TypeScript reader itself: it is started by its path and never bundled.
 */
import { fileURLToPath } from "node:url";
import { parentPort } from "node:worker_threads";
import { tsImport } from "tsx/esm/api";

/** @typedef {import("./worker-messages").ReadRequest} ReadRequest */
/** @typedef {import("./worker-messages").WorkerRequest} WorkerRequest */
/** @typedef {import("./worker-messages").WorkerReply} WorkerReply */

if (!parentPort) throw new Error("The workbook reader runs as a worker thread only.");
const port = parentPort;

/** @type {import("./raw-rows").RawTallyRow[]} */
let rows = [];
let sent = 0;
let rowsPerMessage = 1;

/** @param {WorkerReply} reply */
const reply = (reply) => port.postMessage(reply);

/** @param {ReadRequest} request */
async function read({ bytes, fileName }) {
  const { readBytes, ROWS_PER_MESSAGE } = await tsImport("./worker-entry.ts", {
    parentURL: import.meta.url,
    tsconfig: fileURLToPath(new URL("../../tsconfig.json", import.meta.url)),
  });
  const sheet = readBytes(bytes, fileName);
  rows = sheet.rows;
  rowsPerMessage = ROWS_PER_MESSAGE;
  reply({ type: "summary", summary: { ...sheet, rows: undefined }, rowCount: rows.length });
}

/** @param {unknown} error */
function fail(error) {
  if (error instanceof Error && error.name === "DomainError") {
    const { code, message, errors } = /** @type {import("../errors/domain-error").DomainError} */ (error);
    reply({ type: "refused", code, message, errors });
  } else {
    reply({
      type: "crashed",
      message: error instanceof Error ? (error.stack ?? error.message) : String(error),
    });
  }
}

port.on("message", (/** @type {WorkerRequest} */ request) => {
  if (request.type === "read") {
    read(request).catch(fail);
  } else {
    reply({ type: "rows", rows: rows.slice(sent, sent + rowsPerMessage) });
    sent += rowsPerMessage;
  }
});
