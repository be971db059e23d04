import { mkdir } from "node:fs/promises";
import path from "node:path";
import { Worker } from "node:worker_threads";

export interface FolderLock {
  release: () => Promise<void>;
}

type WorkerMessage =
  | { type: "held" }
  | { type: "busy"; reason: string }
  | { type: "lost"; reason: string }
  | { type: "released" };

export interface HoldOptions {
  /** Milliseconds after which a lock that nobody renews counts as left behind. */
  stale?: number;
}

/** Ends the process: from now on somebody else may write to the folder. */
function leaveAtOnce(reason: string): void {
  console.error(`Ebbline lost its hold on the data folder and stops: ${reason}`);
  process.exit(1);
}

/**
 * Makes this process the only one on a data folder, or throws. The lock is renewed in a worker thread: the
 * embedded database can keep the main thread busy for longer than a lock stays fresh. A lock left by a killed
 * process is taken over once it is stale, so a restart needs no hands.
 */
export async function holdFolder(folder: string, options: HoldOptions = {}): Promise<FolderLock> {
  await mkdir(folder, { recursive: true, mode: 0o700 });
  const worker = new Worker(
    path.resolve(/* turbopackIgnore: true */ process.cwd(), "db/folder-lock-worker.mjs"),
  );
  worker.unref();
  worker.postMessage({ type: "hold", folder, stale: options.stale ?? 10_000 });
  const answer = await nextMessage(worker);
  if (answer.type !== "held") {
    await worker.terminate();
    const reason = answer.type === "busy" ? answer.reason : "no answer";
    throw new Error(`The data folder ${folder} is in use by another Ebbline process (${reason}).`);
  }
  worker.on("message", (message: WorkerMessage) => {
    if (message.type === "lost") leaveAtOnce(message.reason);
  });
  return {
    release: async () => {
      worker.postMessage({ type: "release" });
      await nextMessage(worker);
      await worker.terminate();
    },
  };
}

function nextMessage(worker: Worker): Promise<WorkerMessage> {
  return new Promise((resolve, reject) => {
    // While an answer is awaited the thread keeps the process alive; afterwards it must not.
    worker.ref();
    const done = () => worker.unref();
    worker.once("message", (message: WorkerMessage) => {
      done();
      resolve(message);
    });
    worker.once("error", (error) => {
      done();
      reject(error);
    });
  });
}
