import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { tallyHistorySchema } from "@/lib/schemas/tally";
import { signedIn, type DemoAccount, type HttpClient } from "@/tests/support/http-client";
import { currentLine, pathsOf, ReturnClient } from "@/tests/support/returns-client";
import { START_LIMIT, startServer, type TestServer } from "@/tests/support/server";

let server: TestServer;
const clients = {} as Record<DemoAccount, HttpClient>;
beforeAll(async () => {
  server = await startServer();
  for (const account of ["nurse", "nurse2", "infection", "lead"] as const) {
    clients[account] = await signedIn(server.url, account);
  }
}, START_LIMIT);
afterAll(() => server?.stop());

const of = (account: DemoAccount, ward: string, month: string) =>
  new ReturnClient(clients[account], ward, month);

/** A blank return of the month that has just begun. */
const osier = (account: DemoAccount = "nurse") => of(account, "OSIER", "2026-12");

describe("a return from the first count to its acceptance", () => {
  const nurse = () => of("nurse", "OSIER", "2026-11");
  const lead = () => of("lead", "OSIER", "2026-11");
  const infection = () => of("infection", "OSIER", "2026-11");

  it("lists every line, and says which of them are missing", async () => {
    const before = await nurse().read();
    expect(before).toMatchObject({ ward: "OSIER", status: "open", dueOn: "2026-12-07", late: false });
    const blank = before.tallies.filter((line) => line.version === 0 && line.isMature);
    expect(blank.length).toBeGreaterThan(3);

    const refused = await nurse().step("submission");
    expect(refused.status).toBe(422);
    const missing = pathsOf(refused);
    for (const line of blank.filter((each) => each.numeratorBy === "ward"))
      expect(missing).toContain(line.indicator);
    // What takes thirty days to show doesn't hold the return back.
    expect(missing).not.toContain("READMIT");
    expect((await nurse().read()).status).toBe("open");
  });

  it("is sent once nothing is missing, and then keeps its figures from everybody", async () => {
    await nurse().fill();
    const { tallies } = await nurse().read();
    const sent = await nurse().step("submission");
    expect([sent.status, sent.body]).toMatchObject([
      200,
      { status: "submitted", submittedBy: "Della Quarrie" },
    ]);

    for (const who of [nurse(), lead()]) {
      const refused = await who.save("OBS-LATE", { numerator: 7, version: 1 });
      expect(refused.status).toBe(409);
    }
    expect((await infection().save("CATH-INF", { numerator: 7, version: 1 })).status).toBe(409);
    expect((await nurse().read()).tallies).toEqual(tallies);
    expect((await nurse().step("submission")).status).toBe(409);
  });

  it("comes back until it is accepted, and afterwards only by a lead with a reason", async () => {
    expect(await nurse().step("recall")).toMatchObject({ status: 200, body: { status: "open" } });
    expect(
      (await nurse().save("OBS-LATE", { numerator: 9, version: (await nurse().line("OBS-LATE")).version }))
        .status,
    ).toBe(200);
    expect((await nurse().step("submission")).status).toBe(200);

    const { version } = await lead().read();
    const stale = await lead().step("acceptance", { version: version - 1 });
    expect([stale.status, stale.body]).toMatchObject([409, { current: { version, status: "submitted" } }]);
    expect(await lead().step("acceptance", { version })).toMatchObject({
      status: 200,
      body: { status: "accepted", acceptedBy: "Maro Venndale", late: false },
    });
    expect((await nurse().step("recall")).status).toBe(409);
    expect((await lead().step("acceptance")).status).toBe(409);

    const unsaid = await lead().step("reopening");
    expect([unsaid.status, pathsOf(unsaid)]).toEqual([422, ["reason"]]);
    const reopened = await lead().step("reopening", { reason: "Two observations were counted twice." });
    expect(reopened).toMatchObject({
      status: 200,
      body: { status: "open", reopened: true, reopenedReason: "Two observations were counted twice." },
    });
    const line = await nurse().line("OBS-LATE");
    expect((await nurse().save("OBS-LATE", { numerator: 7, version: line.version })).status).toBe(200);
    expect((await nurse().step("submission")).status).toBe(200);
    expect((await lead().step("acceptance")).status).toBe(200);

    const history = await clients.nurse.get("/api/returns/OSIER/2026-11/tallies/OBS-LATE/history");
    const events = tallyHistorySchema.parse(history.body).items.map(({ event }) => event);
    expect(events).toEqual(["saved", "sent", "recalled", "saved", "sent", "reopened", "saved", "sent"]);
  });
});

describe("two people at one line", () => {
  it("takes one of two saves from one version and shows the other what stands", async () => {
    const first = await osier().saved("OBS-LATE", { numerator: 3, denominator: 50, version: 0 });
    const replies = await Promise.all([
      osier("nurse").save("OBS-LATE", { numerator: 4, version: first.version }),
      osier("lead").save("OBS-LATE", { numerator: 5, version: first.version }),
    ]);
    expect(replies.map(({ status }) => status).sort()).toEqual([200, 409]);
    const refused = replies.find(({ status }) => status === 409);
    const stands = await osier().line("OBS-LATE");
    expect([4, 5]).toContain(stands.numerator);
    expect(currentLine(refused ?? { status: 0, headers: new Headers(), body: {} })).toEqual(stands);
    expect(stands.version).toBe(first.version + 1);
  });

  it("takes one of two first saves", async () => {
    const replies = await Promise.all(
      [3, 4].map((numerator) => osier().save("DOSES", { numerator, version: 0 })),
    );
    expect(replies.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it("lets saves of different fields pass each other", async () => {
    const first = await osier().saved("CLOT-RISK", { numerator: 60, denominator: 70, version: 0 });
    const second = await osier().saved("CLOT-RISK", {
      note: "Two charts were found late.",
      version: first.version,
    });
    expect(second).toMatchObject({ numerator: 60, denominator: 70 });
    const third = await osier("lead").saved("CLOT-RISK", { numerator: 61, version: first.version });
    expect(third).toMatchObject({ numerator: 61, denominator: 70, note: "Two charts were found late." });
    const stale = await osier().save("CLOT-RISK", { numerator: 62, version: second.version });
    expect([stale.status, currentLine(stale).numerator]).toEqual([409, 61]);
    // The same value again moves nothing, whatever it was based on.
    expect(await osier().saved("CLOT-RISK", { numerator: 61, version: 0 })).toEqual(third);
  });
});

describe("what a save refuses", () => {
  const sick: [name: string, body: Record<string, unknown>, path: string][] = [
    ["more than out of", { numerator: 71, denominator: 70 }, "numerator"],
    ["events out of nothing", { numerator: 1, denominator: 0 }, "numerator"],
    ["below zero", { numerator: -1 }, "numerator"],
    ["parts of one", { numerator: 1.5 }, "numerator"],
    ["a number in quotes", { numerator: "7" }, "numerator"],
    ["more than can be counted", { denominator: 1_000_000_001 }, "denominator"],
    ["two answers", { numerator: 1, notCollected: "No time." }, "notCollected"],
    ["a long note", { note: "x".repeat(301) }, "note"],
    ["a note that can't be kept", { note: "a\u0000b" }, "note"],
    ["an unknown version", { version: -1 }, "version"],
  ];

  it.each(sick)("%s, at its field", async (_, body, path) => {
    const before = await osier().line("HANDS");
    const reply = await osier().save("HANDS", { version: before.version, ...body });
    expect(reply.status, JSON.stringify(reply.body)).toBe(422);
    expect(pathsOf(reply)).toContain(path);
    expect(await osier().line("HANDS")).toEqual(before);
  });

  it("a save without a version", async () => {
    const reply = await osier().save("HANDS", { numerator: 1 });
    expect([reply.status, pathsOf(reply)]).toEqual([422, ["version"]]);
  });

  it("a line that the ward doesn't report, and a month that hasn't begun", async () => {
    expect((await osier().save("PAIN", { numerator: 1, version: 0 })).status).toBe(404);
    expect((await of("nurse", "OSIER", "2027-01").save("HANDS", { numerator: 1, version: 0 })).status).toBe(
      404,
    );
  });

  it("keeps zero, blank, nothing to count, not collected and awaited apart", async () => {
    const tern = of("nurse", "TERN", "2026-12");
    const zero = await tern.saved("HANDS", { numerator: 0, denominator: 40, version: 0 });
    expect(zero).toMatchObject({ numerator: 0, denominator: 40, notCollected: null });
    const none = await tern.saved("HANDS", { numerator: null, denominator: 0, version: zero.version });
    expect(none).toMatchObject({ numerator: null, denominator: 0 });
    const reason = "No observer was free.";
    const skipped = await tern.saved("HANDS", { notCollected: reason, version: none.version });
    expect(skipped).toMatchObject({ numerator: null, denominator: null, notCollected: reason });
    const awaited = await tern.saved("HANDS", {
      numerator: 2,
      awaited: "theatre system",
      version: skipped.version,
    });
    expect(awaited).toMatchObject({
      numerator: 2,
      denominator: null,
      notCollected: null,
      awaited: "theatre system",
    });
    const blank = await tern.saved("HANDS", { numerator: null, awaited: null, version: awaited.version });
    expect(blank).toMatchObject({ numerator: null, denominator: null, notCollected: null, awaited: null });
  });
});

describe("a denominator that several lines share", () => {
  it("is typed once, seen in each line, and moves by its own version", async () => {
    const falls = await osier().saved("FALLS", {
      numerator: 3,
      denominator: 700,
      version: 0,
      denominatorVersion: 0,
    });
    expect(falls.denominatorVersion).toBe(1);
    const harm = await osier().line("FALLS-HARM");
    expect(harm).toMatchObject({ denominator: 700, version: 0, denominatorVersion: 1 });

    const unseen = await osier().save("ULCERS", { denominator: 710, version: 0 });
    expect([unseen.status, currentLine(unseen).denominatorVersion]).toEqual([409, 1]);
    const moved = await osier().saved("ULCERS", { denominator: 710, version: 0, denominatorVersion: 1 });
    expect(moved).toMatchObject({ denominator: 710, denominatorVersion: 2 });
    const after = await osier().line("FALLS");
    expect(after).toMatchObject({ denominator: 710, denominatorVersion: 2, version: falls.version });
  });

  it("takes one of two changes at once from different lines", async () => {
    const { denominatorVersion, version } = await osier().line("FALLS");
    const harm = await osier().line("FALLS-HARM");
    const replies = await Promise.all([
      osier().save("FALLS", { denominator: 720, version, denominatorVersion }),
      osier("lead").save("FALLS-HARM", { denominator: 730, version: harm.version, denominatorVersion }),
    ]);
    expect(replies.map(({ status }) => status).sort()).toEqual([200, 409]);
    const lines = (await osier().read()).tallies.filter((line) => line.sharedDenominator === "OBD");
    expect(lines.length).toBeGreaterThan(2);
    expect(new Set(lines.map((line) => line.denominator)).size).toBe(1);
  });
});

describe("lines that infection control counts", () => {
  it("are typed by infection control and shown to the ward", async () => {
    const typed = await osier("infection").saved("CATH-INF", { numerator: 2, version: 0 });
    expect(typed).toMatchObject({ numerator: 2, numeratorBy: "team", savedBy: "Ines Vostal" });
    expect(await osier("nurse").line("CATH-INF")).toMatchObject({ numerator: 2 });
    const refused = await osier("nurse").save("CATH-INF", { numerator: 3, version: typed.version });
    expect(refused.status).toBe(403);
    const days = await osier("nurse").saved("CATH-INF", { denominator: 210, version: typed.version });
    expect(days).toMatchObject({ numerator: 2, denominator: 210 });
  });

  it("are all that infection control types", async () => {
    for (const indicator of ["FALLS", "HANDS", "GUT-INF", "OBS-LATE"]) {
      const { version } = await osier("infection").line(indicator);
      expect((await osier("infection").save(indicator, { numerator: 1, version })).status, indicator).toBe(
        403,
      );
    }
    expect((await osier("infection").step("submission")).status).toBe(403);
  });
});

it("keeps an unbroken record of all this", async () => {
  const audit = await clients.lead.get("/api/audit?limit=1");
  expect(audit.body).toMatchObject({ chain: { intact: true, brokenAt: null } });
});
