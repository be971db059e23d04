import { existsSync } from "node:fs";
import { mkdtemp, readFile, rm, stat } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, afterEach, beforeAll, describe, expect, it } from "vitest";
import { markDemoFolder } from "@/lib/config/data-folder.mjs";
import { DEMO_PASSWORD, demoAccounts, HttpClient } from "@/tests/support/http-client";
import { START_LIMIT } from "@/tests/support/server";
import { runStart, type Started } from "@/tests/support/start-command";

const folders: string[] = [];
const running: Started[] = [];

async function newFolder(): Promise<string> {
  const folder = await mkdtemp(path.join(tmpdir(), "ebbline-start-"));
  folders.push(folder);
  return folder;
}

async function start(folder: string, env?: Record<string, string>): Promise<Started> {
  const started = await runStart(folder, env);
  running.push(started);
  return started;
}

afterEach(async () => {
  for (const each of running.splice(0)) await each.stop();
});
afterAll(async () => {
  for (const folder of folders) await rm(folder, { recursive: true, force: true });
});

const LINK = /(https?:\/\/\S+)\/invitation\/([A-Za-z0-9_-]{43})/;

describe("a start on an empty folder", () => {
  let folder: string;
  beforeAll(async () => {
    folder = await newFolder();
  });
  const account = { email: "mora.quillon@harrowmere.example", name: "Mora Quillon" };
  const password = "seven boats on the water";

  it(
    "prints a link for the first quality lead, which works once",
    async () => {
      const started = await start(folder);
      await started.healthy();
      const [, origin = "", token = ""] = LINK.exec(started.output()) ?? [];
      expect(origin).toBe(started.url);
      const client = new HttpClient(started.url);
      expect((await client.get(`/invitation/${token}`)).body).toContain("password");

      for (const [name, email] of Object.entries(demoAccounts)) {
        expect((await client.signIn(email, DEMO_PASSWORD)).status, name).toBe(401);
      }
      expect((await client.post("/api/invitations", { token, password })).status).toBe(422);
      expect((await client.post("/api/invitations", { token, password, ...account })).status).toBe(200);
      expect((await client.post("/api/invitations", { token, password, ...account })).status).toBe(404);
      expect((await client.signIn(account.email, password)).status).toBe(200);
      expect((await client.get("/api/me")).body).toEqual({ ...account, role: "quality_lead", wards: [] });
      expect((await client.get("/api/wards")).body).toEqual({ items: [], nextCursor: null });
      const hospital = { name: "Harrowmere", timeZone: "Europe/London", dueDay: 5, version: 1 };
      expect((await client.patch("/api/hospital", hospital)).status).toBe(200);

      expect((await stat(path.join(folder, "session-secret"))).mode & 0o077).toBe(0);
      const secret = await readFile(path.join(folder, "session-secret"), "utf8");
      expect(started.output()).not.toContain(secret.trim());
      expect(await started.stop()).toBe(0);
      expect(existsSync(path.join(folder, "in-use.lock"))).toBe(false);
    },
    START_LIMIT,
  );

  it(
    "is followed by starts that find everything as it was, behind a proxy too, and one at a time",
    async () => {
      const typed = "https://ebbline.harrowmere.example";
      const started = await start(folder, { NEXTAUTH_URL: typed });
      await started.healthy();
      expect(started.output()).not.toMatch(LINK);
      const client = new HttpClient(started.url, typed);
      const signedIn = await client.signIn(account.email, password);
      expect(signedIn.status).toBe(200);
      const cookies = signedIn.headers.getSetCookie();
      expect(cookies.some((cookie) => cookie.startsWith("__Secure-next-auth.session-token="))).toBe(true);
      for (const cookie of cookies) expect(cookie).toMatch(/; Secure/i);
      expect((await client.get("/api/hospital")).body).toMatchObject({ name: "Harrowmere", dueDay: 5 });

      const second = await start(folder);
      expect(await second.ended).not.toBe(0);
      expect(second.output()).toContain("Ebbline can't start.");
      expect(second.output()).toContain("is in use by another Ebbline process");
      expect((await client.get("/api/me")).status).toBe(200);
    },
    START_LIMIT,
  );
});

describe("a start that can't be", () => {
  const wrong: [what: string, env: Record<string, string>, says: RegExp][] = [
    ["a short secret", { NEXTAUTH_SECRET: "short" }, /NEXTAUTH_SECRET has at least 32 characters/],
    ["an address that is none", { NEXTAUTH_URL: "harrowmere" }, /NEXTAUTH_URL/],
    ["another kind of database", { DATABASE_URL: "mysql://db/ebbline" }, /DATABASE_URL/],
    [
      "a database that isn't there",
      { DATABASE_URL: "postgres://127.0.0.1:1/ebbline" },
      /can't start.*ECONNREFUSED/,
    ],
    ["a stopped clock", { EBBLINE_CLOCK: "2026-12-07T09:00:00Z" }, /EBBLINE_CLOCK/],
    ["a hasty lock", { EBBLINE_LOCK_STALE_MS: "5" }, /EBBLINE_LOCK_STALE_MS is 2000 or more/],
    ["the demo's switch", { EBBLINE_DEMO: "1" }, /npm run demo/],
    ["a port that is none", { PORT: "http" }, /PORT is a number/],
  ];

  it.each(wrong)("ends with %s, and says why", async (_, env, says) => {
    const started = await start(await newFolder(), env);
    expect(await started.ended).not.toBe(0);
    expect(started.output()).toMatch(says);
    expect(started.output()).not.toMatch(/\n\s+at .+:\d+:\d+/);
  });

  it("ends on the demo's folder", async () => {
    const folder = await newFolder();
    markDemoFolder(folder);
    const started = await start(folder);
    expect(await started.ended).not.toBe(0);
    expect(started.output()).toContain("belongs to the demo");
  });
});
