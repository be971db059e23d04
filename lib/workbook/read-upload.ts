import { once } from "node:events";
import path from "node:path";
import { Worker } from "node:worker_threads";
import { DomainError } from "@/lib/errors/domain-error";
import type { RawTallyRow, UploadSheet } from "./raw-rows";
import { readingMessages } from "./reading-messages";
import { inReadingSlot } from "./reading-slots";
import { MAX_UPLOAD_BYTES, READING_MEMORY_MB, READING_SECONDS } from "./upload-limits";
import type { WorkerReply, WorkerRequest } from "./worker-messages";

export interface Upload {
  bytes: Uint8Array;
  fileName: string;
  /** Ends the reading, and the worker with it. */
  signal?: AbortSignal;
}

export interface ReadingLimits {
  seconds: number;
  memoryMegabytes: number;
}

const defaultLimits: ReadingLimits = { seconds: READING_SECONDS, memoryMegabytes: READING_MEMORY_MB };

/**
 * Reads the tallies of an uploaded workbook or CSV in a worker thread under limits of size, memory and time.
 * @throws DomainError unsupported-type, too-large or invalid, with words for whoever chose the file
 */
export async function readUpload(upload: Upload, limits = defaultLimits): Promise<UploadSheet> {
  if (upload.bytes.length > MAX_UPLOAD_BYTES) {
    throw new DomainError("too-large", readingMessages.tooManyBytes(MAX_UPLOAD_BYTES / 1024 / 1024));
  }
  return inReadingSlot(() => readInWorker(upload, limits));
}

async function readInWorker(
  { bytes, fileName, signal }: Upload,
  limits: ReadingLimits,
): Promise<UploadSheet> {
  signal?.throwIfAborted();
  const timeout = AbortSignal.timeout(limits.seconds * 1000);
  const worker = startWorker(limits);
  try {
    return await receiveSheet(
      worker,
      { bytes, fileName },
      AbortSignal.any([timeout, ...(signal ? [signal] : [])]),
    );
  } catch (error) {
    signal?.throwIfAborted();
    if (timeout.aborted) throw new DomainError("too-large", readingMessages.tooSlow(limits.seconds));
    throw isOutOfMemory(error) ? new DomainError("too-large", readingMessages.tooMuchMemory) : error;
  } finally {
    await worker.terminate();
  }
}

/** Started by its path in the project, so that no bundler takes it in; it sees nothing of the environment. */
function startWorker({ memoryMegabytes }: ReadingLimits): Worker {
  const file = path.resolve(/* turbopackIgnore: true */ process.cwd(), "lib/workbook/reader-worker.mjs");
  const worker = new Worker(/* turbopackIgnore: true */ file, {
    resourceLimits: { maxOldGenerationSizeMb: memoryMegabytes },
    execArgv: [],
    env: {},
  });
  // An error after the last reply was received must not end the process; while one is awaited, `once` reports it.
  worker.on("error", () => undefined);
  return worker;
}

async function receiveSheet(
  worker: Worker,
  { bytes, fileName }: Pick<Upload, "bytes" | "fileName">,
  stop: AbortSignal,
): Promise<UploadSheet> {
  // A copy of its own is handed over: a view would take the whole buffer behind it along.
  const copy = new Uint8Array(bytes);
  const first = await ask(worker, { type: "read", bytes: copy, fileName }, stop, [copy.buffer]);
  if (first.type !== "summary") throw unexpected(first);
  const rows: RawTallyRow[] = [];
  while (rows.length < first.rowCount) {
    const reply = await ask(worker, { type: "more" }, stop);
    if (reply.type !== "rows" || reply.rows.length === 0) throw unexpected(reply);
    rows.push(...reply.rows);
  }
  return { ...first.summary, rows };
}

async function ask(
  worker: Worker,
  request: WorkerRequest,
  stop: AbortSignal,
  transfer: ArrayBuffer[] = [],
): Promise<WorkerReply> {
  const replied = once(worker, "message", { signal: stop }) as Promise<[WorkerReply]>;
  worker.postMessage(request, transfer);
  const [reply] = await replied;
  return reply;
}

function unexpected(reply: WorkerReply): Error {
  if (reply.type === "refused") return new DomainError(reply.code, reply.message, { errors: reply.errors });
  return new Error(`The workbook reader failed: ${reply.type === "crashed" ? reply.message : reply.type}`);
}

function isOutOfMemory(error: unknown): boolean {
  return error instanceof Error && "code" in error && error.code === "ERR_WORKER_OUT_OF_MEMORY";
}
