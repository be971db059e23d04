import { spawn, type ChildProcess } from "node:child_process";
import path from "node:path";
import { freePort } from "./server";

const root = path.resolve(import.meta.dirname, "../..");

export interface Started {
  url: string;
  process: ChildProcess;
  output: () => string;
  /** Resolves to the exit code once the process has ended. */
  ended: Promise<number | null>;
  /** Waits for the address to answer; fails at once when the process has ended before. */
  healthy: () => Promise<void>;
  /** Ends the process in order. */
  stop: () => Promise<number | null>;
}

/** `npm start` on a folder, as an operator would: nothing of the demo in its environment. */
export async function runStart(folder: string, env: Record<string, string> = {}): Promise<Started> {
  const port = await freePort();
  const url = `http://127.0.0.1:${port}`;
  const child = spawn(process.execPath, ["lib/commands/start.mjs"], {
    cwd: root,
    stdio: ["ignore", "pipe", "pipe"],
    env: {
      PATH: process.env.PATH,
      HOME: process.env.HOME,
      NODE_ENV: "production",
      EBBLINE_DATA: folder,
      EBBLINE_LOCK_STALE_MS: "2000",
      HOST: "127.0.0.1",
      PORT: String(port),
      ...env,
    },
  });
  let text = "";
  child.stdout.on("data", (chunk: Buffer) => (text += chunk.toString()));
  child.stderr.on("data", (chunk: Buffer) => (text += chunk.toString()));
  const ended = new Promise<number | null>((resolve) => child.once("exit", resolve));
  return {
    url,
    process: child,
    output: () => text,
    ended,
    healthy: async () => {
      for (;;) {
        if (child.exitCode !== null || child.signalCode !== null) throw new Error(`It ended early.\n${text}`);
        const reply = await fetch(`${url}/api/health`).catch(() => null);
        if (reply?.ok) return;
        await new Promise((resolve) => setTimeout(resolve, 100));
      }
    },
    stop: async () => {
      child.kill("SIGTERM");
      return ended;
    },
  };
}
