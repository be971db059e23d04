import { spawn, type ChildProcess } from "node:child_process";
import { createHash } from "node:crypto";
import { existsSync, readFileSync } from "node:fs";
import { cp, mkdir, mkdtemp, rename, rm } from "node:fs/promises";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import path from "node:path";
import { markDemoFolder } from "@/lib/config/data-folder.mjs";

const root = path.resolve(import.meta.dirname, "../..");

/** The demo hospital's day in all tests over HTTP: a Monday on which November's returns are due. */
export const TEST_CLOCK = "2026-12-07T09:00:00.000Z";

/** Milliseconds that a suite's first start may take: the first of all invents the hospital. */
export const START_LIMIT = 300_000;

export interface TestServer {
  url: string;
  folder: string;
  process: ChildProcess;
  /** Everything that the server has written to its console so far. */
  output: () => string;
  /** Ends the process at once, as a crash would. */
  kill: () => Promise<void>;
  /** Ends the process in order and removes the folder. */
  stop: () => Promise<void>;
}

export interface ServerOptions {
  /** An existing data folder; otherwise a fresh copy of the seeded demo hospital. */
  folder?: string;
  env?: Record<string, string>;
}

/** The built application on a port and a data folder of its own. `npm run build` must have run. */
export async function startServer(options: ServerOptions = {}): Promise<TestServer> {
  if (!existsSync(path.join(root, ".next/BUILD_ID"))) throw new Error("Build first: npm run build");
  const folder = options.folder ?? (await copyOfSeeded());
  const port = await freePort();
  const url = `http://127.0.0.1:${port}`;
  const child = spawn(
    process.execPath,
    [path.join(root, "node_modules/next/dist/bin/next"), "start", "-H", "127.0.0.1", "-p", String(port)],
    {
      cwd: root,
      stdio: ["ignore", "pipe", "pipe"],
      env: {
        ...process.env,
        NODE_ENV: "production",
        NEXT_MANUAL_SIG_HANDLE: "1",
        NEXT_TELEMETRY_DISABLED: "1",
        EBBLINE_DEMO: "1",
        EBBLINE_DATA: folder,
        EBBLINE_CLOCK: TEST_CLOCK,
        DATABASE_URL: "",
        HOST: "127.0.0.1",
        PORT: String(port),
        NEXTAUTH_URL: url,
        ...options.env,
      },
    },
  );
  let text = "";
  child.stdout.on("data", (chunk: Buffer) => (text += chunk.toString()));
  child.stderr.on("data", (chunk: Buffer) => (text += chunk.toString()));
  const gone = new Promise<void>((resolve) => child.once("exit", () => resolve()));
  await untilHealthy(url, child, () => text);
  return {
    url,
    folder,
    process: child,
    output: () => text,
    kill: async () => {
      child.kill("SIGKILL");
      await gone;
    },
    stop: async () => {
      child.kill("SIGTERM");
      await gone;
      await rm(folder, { recursive: true, force: true });
    },
  };
}

/** Waits for the server to answer; fails at once when its process has ended. */
async function untilHealthy(url: string, child: ChildProcess, output: () => string): Promise<void> {
  for (;;) {
    if (child.exitCode !== null || child.signalCode !== null) {
      throw new Error(`The server ended before it answered.\n${output()}`);
    }
    const reply = await fetch(`${url}/api/health`).catch(() => null);
    if (reply?.ok) return;
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
}

/** A fresh copy of a data folder that holds the demo hospital, seeded once per state of the sources. */
export async function copyOfSeeded(): Promise<string> {
  const source = await seededFolder();
  const copy = await mkdtemp(path.join(tmpdir(), "ebbline-test-"));
  await cp(source, copy, { recursive: true });
  return copy;
}

async function seededFolder(): Promise<string> {
  const build = readFileSync(path.join(root, ".next/BUILD_ID"), "utf8");
  const name = createHash("sha256")
    .update(build + TEST_CLOCK)
    .digest("hex")
    .slice(0, 16);
  const folder = path.join(root, "tests/.tmp", `seeded-${name}`);
  if (existsSync(folder)) return folder;
  const half = `${folder}.${process.pid}`;
  await mkdir(half, { recursive: true });
  markDemoFolder(half);
  await seed(half);
  await rename(half, folder);
  return folder;
}

function seed(folder: string): Promise<void> {
  const args = ["--conditions=react-server", "--import", "tsx", "lib/commands/seed-demo.ts"];
  const env = {
    ...process.env,
    NODE_ENV: "production" as const,
    EBBLINE_DEMO: "1",
    EBBLINE_DATA: folder,
    EBBLINE_CLOCK: TEST_CLOCK,
    DATABASE_URL: "",
  };
  const child = spawn(process.execPath, args, { cwd: root, stdio: "inherit", env });
  return new Promise((resolve, reject) => {
    child.once("exit", (code) => (code === 0 ? resolve() : reject(new Error(`Seeding ended with ${code}.`))));
  });
}

export function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.on("error", reject);
    probe.listen(0, "127.0.0.1", () => {
      const address = probe.address();
      probe.close(() => resolve(typeof address === "object" && address !== null ? address.port : 0));
    });
  });
}
