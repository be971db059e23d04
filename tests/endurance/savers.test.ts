import { afterAll, beforeAll, expect, it } from "vitest";
import { z } from "zod";
import { auditPageSchema } from "@/lib/schemas/audit";
import { importSchema } from "@/lib/schemas/import";
import { tallyReplySchema, type TallyReply } from "@/lib/schemas/tally";
import { signedIn, type DemoAccount, type HttpClient, type Reply } from "@/tests/support/http-client";
import { currentLine, ReturnClient } from "@/tests/support/returns-client";
import { START_LIMIT, startServer, type TestServer } from "@/tests/support/server";

/** The work is bounded by time, since how much of it fits says how busy the machine is, not whether it is right. */
const MINUTE = 60_000;
const MONTH = "2026-12";
const TOP = 1_000_000_000;

let server: TestServer;
const clients = {} as Record<DemoAccount, HttpClient>;
beforeAll(async () => {
  server = await startServer();
  for (const account of ["nurse", "nurse2", "infection", "lead"] as const) {
    clients[account] = await signedIn(server.url, account);
  }
}, START_LIMIT);
afterAll(() => server?.stop());

function taken(reply: Reply, allowed: number[], what: string): Reply {
  expect(allowed, `${what}: ${reply.status} ${JSON.stringify(reply.body).slice(0, 300)}`).toContain(
    reply.status,
  );
  return reply;
}

/** Each saver's own step, so that no two ever ask for one figure: that would be taken as said already. */
const STEPS = [1, 1_000, 1_000_000] as const;
const MOST = 999;

/** Adds its step to the figure that stands, as often as it can; answers the sum that was taken. */
async function addTo(client: HttpClient, ward: string, indicator: string, step: number, until: number) {
  const wardReturn = new ReturnClient(client, ward, MONTH);
  let line: TallyReply = await wardReturn.line(indicator);
  let sum = 0;
  while (Date.now() < until && sum < MOST * step) {
    const reply = await wardReturn.save(indicator, {
      numerator: (line.numerator ?? 0) + step,
      ...(line.denominator === null ? { denominator: TOP } : {}),
      version: line.version,
    });
    taken(reply, [200, 409], `${ward} ${indicator} and ${step}`);
    if (reply.status === 200) sum += step;
    line = reply.status === 200 ? tallyReplySchema.parse(reply.body) : currentLine(reply);
  }
  return sum;
}

/** Sends and takes back one return, over and over. */
async function sendAndRecall(until: number): Promise<number> {
  const tern = new ReturnClient(clients.nurse, "TERN", "2026-11");
  let steps = 0;
  while (Date.now() < until) {
    const { status } = await tern.read();
    taken(await tern.step(status === "open" ? "submission" : "recall"), [200, 409], `TERN, ${status}`);
    steps += 1;
  }
  return steps;
}

/** Brings figures of another ward in by sheet, and takes every second sheet back. */
async function bringIn(until: number): Promise<number> {
  let sheets = 0;
  while (Date.now() < until) {
    sheets += 1;
    const lines = ["DOSES", "OBS-LATE", "HANDS"].map((code) => `ALDER,${code},${MONTH},${sheets},5000`);
    const text = ["Ward,Indicator,Month,Numerator,Denominator", ...lines].join("\n");
    const checked = importSchema.parse(
      taken(await clients.lead.upload("/api/imports", text, "a.csv"), [200], "sheet").body,
    );
    taken(await clients.lead.post(`/api/imports/${checked.id}/commit`), [200], "commit");
    if (sheets % 2 === 0) taken(await clients.lead.delete(`/api/imports/${checked.id}`), [200], "take back");
  }
  return sheets;
}

async function read(account: DemoAccount, paths: string[], until: number): Promise<number> {
  let reads = 0;
  while (Date.now() < until) {
    const path = paths[reads % paths.length] ?? "/api/me";
    const reply = taken(await clients[account].get(path), [200], path);
    const audit = auditPageSchema.safeParse(reply.body);
    // Also in the midst of it all: an unbroken chain is never called broken.
    if (audit.success) expect(audit.data.chain).toMatchObject({ intact: true });
    reads += 1;
  }
  return reads;
}

it(
  "loses no count while many save, read, send and bring in for a minute",
  async () => {
    const until = Date.now() + MINUTE;
    const work = await Promise.all([
      addTo(clients.nurse, "OSIER", "OBS-LATE", STEPS[0], until),
      addTo(clients.nurse, "OSIER", "OBS-LATE", STEPS[1], until),
      addTo(clients.lead, "OSIER", "OBS-LATE", STEPS[2], until),
      addTo(clients.nurse2, "CURLEW", "HANDS", STEPS[0], until),
      addTo(clients.lead, "CURLEW", "HANDS", STEPS[1], until),
      sendAndRecall(until),
      bringIn(until),
      read("infection", ["/api/charts/TERN/FALLS", "/api/signals", "/api/returns", "/", "/charts"], until),
      read(
        "lead",
        ["/api/audit?limit=20", "/api/exports/tallies.xlsx?ward=TERN", "/returns/OSIER/2026-12"],
        until,
      ),
    ]);
    for (const count of work) expect(count).toBeGreaterThan(0);

    const [first = 0, second = 0, third = 0, fourth = 0, fifth = 0, , sheets = 0] = work;
    const lead = (ward: string) => new ReturnClient(clients.lead, ward, MONTH);
    expect(await lead("OSIER").line("OBS-LATE")).toMatchObject({ numerator: first + second + third });
    expect(await lead("CURLEW").line("HANDS")).toMatchObject({ numerator: fourth + fifth });
    // A sheet that was taken back leaves the one before it.
    const standing = sheets % 2 === 0 ? sheets - 1 : sheets;
    expect(await lead("ALDER").line("DOSES")).toMatchObject({ numerator: standing, denominator: 5000 });

    const audit = auditPageSchema.parse((await clients.lead.get("/api/audit?limit=1")).body);
    expect(audit.chain).toMatchObject({ intact: true, brokenAt: null });
    expect(z.string().parse(server.output())).not.toContain("request.failed");
  },
  START_LIMIT,
);
