import { expect } from "vitest";
import { auditPageSchema } from "@/lib/schemas/audit";
import { tallyHistorySchema, tallyReplySchema } from "@/lib/schemas/tally";
import { signedIn, type DemoAccount, type HttpClient } from "./http-client";
import { copyOfSeeded, startServer, type TestServer } from "./server";

/** Lines of the month that has just begun, each with whoever types it all the time. */
const lines: [account: DemoAccount, ward: string, indicator: string][] = [
  ["nurse", "OSIER", "OBS-LATE"],
  ["nurse", "OSIER", "HANDS"],
  ["nurse", "TERN", "OBS-LATE"],
  ["nurse2", "CURLEW", "HANDS"],
  ["infection", "OSIER", "CATH-INF"],
  ["lead", "ALDER", "DOSES"],
];
const MONTH = "2026-12";
const DENOMINATOR = 100_000;

/** What the server has said about a line: the last figure that it took, and one that it may have taken. */
interface Known {
  version: number;
  numerator: number;
  /** Sent, not answered: the process was killed meanwhile. */
  unanswered: number | null;
}

type Ledger = Map<string, Known>;

const keyOf = (ward: string, indicator: string) => `${ward} ${indicator}`;
const pathOf = (ward: string, indicator: string) => `/api/returns/${ward}/${MONTH}/tallies/${indicator}`;

/**
 * Kills the process, again and again, while several people save as fast as they can. After each restart on the same
 * folder, without any hands in between, every save that was answered is there, and the record's chain verifies.
 * Answers how many saves were taken in all.
 */
export async function killRounds(rounds: number): Promise<number> {
  const folder = await copyOfSeeded();
  const ledger: Ledger = new Map();
  let taken = 0;
  let server = await start(folder);
  try {
    for (let round = 1; round <= rounds; round += 1) {
      // Another moment in every round: now between saves, now within several.
      taken += await saveUntilKilled(server, ledger, 12 + 7 * round);
      server = await start(folder);
      await expectKept(server, ledger);
    }
  } finally {
    await server.stop();
  }
  return taken;
}

const start = (folder: string): Promise<TestServer> =>
  startServer({ folder, env: { EBBLINE_LOCK_STALE_MS: "2000" } });

async function saveUntilKilled(server: TestServer, ledger: Ledger, saves: number): Promise<number> {
  const clients = new Map<DemoAccount, HttpClient>();
  for (const [account] of lines) {
    if (!clients.has(account)) clients.set(account, await signedIn(server.url, account));
  }
  let taken = 0;
  let isKilled = false;
  const work = lines.map(async ([account, ward, indicator]) => {
    const client = clients.get(account);
    if (!client) throw new Error(`Nobody signed in as ${account}.`);
    while (!isKilled) {
      const isTaken = await saveNext(client, ledger, ward, indicator);
      if (!isTaken && !isKilled) throw new Error(`A save was lost before the kill.\n${server.output()}`);
      taken += isTaken ? 1 : 0;
      if (taken === saves && !isKilled) {
        isKilled = true;
        await server.kill();
      }
    }
  });
  await Promise.all(work);
  return taken;
}

/** One more; false where the connection broke before there was an answer. */
async function saveNext(
  client: HttpClient,
  ledger: Ledger,
  ward: string,
  indicator: string,
): Promise<boolean> {
  const known = ledger.get(keyOf(ward, indicator)) ?? { version: 0, numerator: 0, unanswered: null };
  const numerator = known.numerator + 1;
  ledger.set(keyOf(ward, indicator), { ...known, unanswered: numerator });
  // Who types only the numerator leaves the rest to the ward.
  const rest = indicator === "CATH-INF" ? {} : { denominator: DENOMINATOR };
  const body = { numerator, ...rest, version: known.version };
  const reply = await client.put(pathOf(ward, indicator), body).catch(() => null);
  if (reply === null) return false;
  expect(reply.status, JSON.stringify(reply.body)).toBe(200);
  const saved = tallyReplySchema.parse(reply.body);
  ledger.set(keyOf(ward, indicator), {
    version: saved.version,
    numerator: saved.numerator ?? -1,
    unanswered: null,
  });
  return true;
}

/** Compares every line with what was answered, and takes over what was saved without an answer. */
async function expectKept(server: TestServer, ledger: Ledger): Promise<void> {
  const lead = await signedIn(server.url, "lead");
  for (const [key, known] of ledger) {
    const [ward = "", indicator = ""] = key.split(" ");
    const reply = await lead.get(`${pathOf(ward, indicator)}/history`);
    const { tally, items } = tallyHistorySchema.parse(reply.body);
    const numerator = tally.numerator ?? 0;
    if (numerator === known.numerator) expect(tally.version, key).toBe(known.version);
    else expect([numerator, tally.version], key).toEqual([known.unanswered, known.version + 1]);
    // One revision for each version, each with the figure that was answered for it.
    expect(
      items.map((item) => item.version),
      key,
    ).toEqual(items.map((_, index) => index + 1));
    expect(
      items.map((item) => item.numerator),
      key,
    ).toEqual(items.map((_, index) => index + 1));
    expect(items.length, key).toBe(tally.version);
    ledger.set(key, { version: tally.version, numerator, unanswered: null });
  }
  const { chain } = auditPageSchema.parse((await lead.get("/api/audit?limit=1")).body);
  expect(chain).toMatchObject({ intact: true, brokenAt: null });
}
