import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { correctionResultSchema, type CorrectionResult } from "@/lib/schemas/correction";
import { signedIn, type HttpClient, type Reply } from "@/tests/support/http-client";
import { currentLine, pathsOf, ReturnClient } from "@/tests/support/returns-client";
import { START_LIMIT, startServer, type TestServer } from "@/tests/support/server";

let server: TestServer;
let nurseClient: HttpClient;
let leadClient: HttpClient;
beforeAll(async () => {
  server = await startServer();
  nurseClient = await signedIn(server.url, "nurse");
  leadClient = await signedIn(server.url, "lead");
}, START_LIMIT);
afterAll(() => server?.stop());

/** Accepted weeks ago. */
const nurse = () => new ReturnClient(nurseClient, "TERN", "2026-10");
const lead = () => new ReturnClient(leadClient, "TERN", "2026-10");
const result = (reply: Reply): CorrectionResult => correctionResultSchema.parse(reply.body);

describe("corrections of what was sent", () => {
  it("of a nurse wait until a lead agrees", async () => {
    const before = await nurse().line("OBS-LATE");
    const numerator = (before.numerator ?? 0) + 5;
    const unsaid = await nurse().step("corrections", {
      indicator: "OBS-LATE",
      numerator,
      version: before.version,
    });
    expect([unsaid.status, pathsOf(unsaid)]).toEqual([422, ["reason"]]);

    const body = { indicator: "OBS-LATE", numerator, reason: "A page was missing.", version: before.version };
    const asked = await nurse().step("corrections", body);
    expect(asked.status).toBe(200);
    expect(result(asked)).toMatchObject({ state: "waiting", askedBy: "Della Quarrie", numerator });
    expect(await nurse().line("OBS-LATE")).toEqual(before);
    expect((await nurse().step("corrections", body)).status).toBe(409);

    const decide = (client: HttpClient) =>
      client.post(`/api/corrections/${result(asked).id}/decision`, { agree: true });
    expect((await decide(nurseClient)).status).toBe(403);
    const agreed = await decide(leadClient);
    expect([agreed.status, result(agreed).state]).toEqual([200, "agreed"]);
    expect(await nurse().line("OBS-LATE")).toMatchObject({ numerator, corrected: true });
    expect((await decide(leadClient)).status).toBe(409);
    const chart = await nurseClient.get("/api/charts/TERN/OBS-LATE?from=2026-10&to=2026-10");
    expect(chart.body).toMatchObject({ points: [{ month: "2026-10", numerator, corrected: true }] });
  });

  it("of a lead hold at once, and a lead's refusal leaves the line as it was", async () => {
    const before = await lead().line("CLOT-RISK");
    const numerator = (before.numerator ?? 0) - 1;
    const body = {
      indicator: "CLOT-RISK",
      numerator,
      reason: "One was counted twice.",
      version: before.version,
    };
    expect(result(await lead().step("corrections", body))).toMatchObject({
      state: "agreed",
      tally: { numerator },
    });
    const stale = await lead().step("corrections", { ...body, numerator: numerator - 1 });
    expect([stale.status, currentLine(stale).numerator]).toEqual([409, numerator]);

    const hands = await nurse().line("HANDS");
    const wish = { indicator: "HANDS", numerator: 1, reason: "Looks too many.", version: hands.version };
    const asked = result(await nurse().step("corrections", wish));
    const declined = await leadClient.post(`/api/corrections/${asked.id}/decision`, {
      agree: false,
      reason: "The sheets say otherwise.",
    });
    expect(result(declined)).toMatchObject({
      state: "declined",
      decisionReason: "The sheets say otherwise.",
    });
    expect(await nurse().line("HANDS")).toEqual(hands);
  });

  it("reach every line of a shared denominator, once", async () => {
    const before = await lead().line("FALLS");
    const denominator = (before.denominator ?? 0) + 11;
    const { version, denominatorVersion } = before;
    const reason = "The census was wrong.";
    const body = { indicator: "FALLS", denominator, reason, version, denominatorVersion };
    expect((await lead().step("corrections", body)).status).toBe(200);
    for (const line of (await lead().read()).tallies.filter((each) => each.sharedDenominator === "OBD")) {
      expect(line.denominator, line.indicator).toBe(denominator);
    }
  });

  it("are refused while the return is open, and where they can't be", async () => {
    const open = { indicator: "OBS-LATE", numerator: 1, reason: "Too early.", version: 1 };
    expect((await new ReturnClient(nurseClient, "OSIER", "2026-11").step("corrections", open)).status).toBe(
      409,
    );
    const { version, denominator } = await nurse().line("READMIT");
    const reason = "A slip of the hand.";
    const tooMany = { indicator: "READMIT", numerator: (denominator ?? 0) + 1, reason, version };
    const refused = await nurse().step("corrections", tooMany);
    expect([refused.status, pathsOf(refused)]).toEqual([422, ["numerator"]]);
  });
});

it("keeps an unbroken record of all this", async () => {
  const audit = await leadClient.get("/api/audit?limit=1");
  expect(audit.body).toMatchObject({ chain: { intact: true, brokenAt: null } });
});
