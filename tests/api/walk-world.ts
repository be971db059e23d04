import { z } from "zod";
import { HttpClient, signedIn, type DemoAccount } from "@/tests/support/http-client";
import { startServer, type TestServer } from "@/tests/support/server";

/** From whoever may least to whoever may most, so that what one call changes doesn't spoil the next one's answer. */
export const accounts = ["board", "nurse2", "infection", "nurse", "lead"] as const satisfies DemoAccount[];

const withId = z.object({ id: z.string() });

/** A running hospital, everybody signed in, and records of Osier ward that addresses can name. */
export interface World {
  server: TestServer;
  anybody: HttpClient;
  clients: Record<DemoAccount, HttpClient>;
  /** A correction of Osier's falls that waits for a decision. */
  correctionId: string;
  /** A proposed baseline of Osier's missed hand hygiene. */
  baselineId: string;
  /** A sheet for Osier that its nurse has checked, and one that was brought in. */
  checkedImportId: string;
  committedImportId: string;
  /** Somebody who was invited and hasn't come yet. */
  personId: string;
}

export async function makeWorld(): Promise<World> {
  const server = await startServer();
  const clients = {} as Record<DemoAccount, HttpClient>;
  for (const account of accounts) clients[account] = await signedIn(server.url, account);
  const { nurse, infection, lead } = clients;

  const correction = await made(nurse, "/api/returns/OSIER/2026-10/corrections", {
    indicator: "OBS-LATE",
    numerator: 3,
    reason: "Counted again from the charts.",
    version: await versionOf(nurse, "OBS-LATE"),
  });
  const baseline = await infection.put("/api/baselines/OSIER/HANDS", {
    from: "2025-07",
    to: "2026-08",
    reason: "A longer look at the time since the coaching.",
  });
  const checked = await uploadFor(nurse, "2026-12");
  const committed = await uploadFor(nurse, "2026-11");
  const commit = await nurse.post(`/api/imports/${committed}/commit`);
  if (commit.status !== 200) throw new Error(`The sheet wasn't brought in: ${JSON.stringify(commit.body)}`);
  const person = await made(lead, "/api/people", {
    email: "walk@harrowmere.example",
    name: "Ira Fennick",
    role: "ward_nurse",
    wards: ["OSIER"],
  });
  return {
    server,
    anybody: new HttpClient(server.url),
    clients,
    correctionId: correction,
    baselineId: withId.parse(baseline.body).id,
    checkedImportId: checked,
    committedImportId: committed,
    personId: person,
  };
}

async function made(client: HttpClient, path: string, body: unknown): Promise<string> {
  const reply = await client.post(path, body);
  const parsed = withId.safeParse(reply.body);
  if (!parsed.success) throw new Error(`${path} made nothing: ${JSON.stringify(reply.body)}`);
  return parsed.data.id;
}

async function uploadFor(nurse: HttpClient, month: string): Promise<string> {
  const reply = await nurse.upload("/api/imports", osierSheet(month), `osier-${month}.csv`);
  return withId.parse(reply.body).id;
}

/** One line of Osier's as CSV. */
export function osierSheet(month: string): string {
  return `Ward,Indicator,Month,Numerator,Denominator\r\nOSIER,OBS-LATE,${month},41,1600\r\n`;
}

async function versionOf(client: HttpClient, indicator: string): Promise<number> {
  const tallies = z.object({ tallies: z.array(z.object({ indicator: z.string(), version: z.number() })) });
  const reply = tallies.parse((await client.get("/api/returns/OSIER/2026-10")).body);
  return reply.tallies.find((tally) => tally.indicator === indicator)?.version ?? 0;
}
