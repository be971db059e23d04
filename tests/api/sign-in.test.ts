import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { z } from "zod";
import { personSchema, type PersonRecord } from "@/lib/schemas/person";
import { DEMO_PASSWORD, demoAccounts, HttpClient, signedIn, type Reply } from "@/tests/support/http-client";
import { rawRequest } from "@/tests/support/raw-request";
import { START_LIMIT, startServer, type TestServer } from "@/tests/support/server";
import { expectProblem } from "./decent-reply";

let server: TestServer;
let lead: HttpClient;
beforeAll(async () => {
  server = await startServer();
  lead = await signedIn(server.url, "lead");
}, START_LIMIT);
afterAll(() => server?.stop());

const newClient = () => new HttpClient(server.url);
const withCookie = (cookie: string) => ({ get: (path: string) => newClient().get(path, { cookie }) });

async function person(email: string): Promise<PersonRecord> {
  const { items } = z.object({ items: z.array(personSchema) }).parse((await lead.get("/api/people")).body);
  const found = items.find((each) => each.email === email);
  if (!found) throw new Error(`Nobody has the address ${email}.`);
  return found;
}

async function change(email: string, values: Record<string, unknown>): Promise<void> {
  const { id, version } = await person(email);
  const reply = await lead.patch(`/api/people/${id}`, { ...values, version });
  if (reply.status !== 200) throw new Error(`${email} wasn't changed: ${JSON.stringify(reply.body)}`);
}

/** Where the library sends the browser next: of a redirect, or said in JSON. */
function nextAddress(reply: Reply): string {
  const location = reply.headers.get("location");
  return location ?? z.object({ url: z.string() }).parse(reply.body).url;
}

describe("signing in", () => {
  it("gives a cookie that scripts can't read and other sites don't send", async () => {
    const client = newClient();
    const reply = await client.signIn(demoAccounts.nurse, DEMO_PASSWORD);
    expect(reply.status).toBe(200);
    expect(reply.headers.get("cache-control")).toBe("no-store");
    const cookies = reply.headers
      .getSetCookie()
      .filter((line) => line.startsWith("next-auth.session-token="));
    expect(cookies).toHaveLength(1);
    expect(cookies[0]).toMatch(/; HttpOnly/i);
    expect(cookies[0]).toMatch(/; SameSite=Lax/i);
    expect(cookies[0]).toMatch(/; Path=\/(;|$)/i);
    expect(cookies[0]).not.toMatch(/; Domain=/i);
    const text = JSON.stringify((await client.get("/api/auth/session")).body);
    expect(text).toContain(demoAccounts.nurse);
    expect(text).not.toMatch(/ward_nurse|password|argon/);
  });

  it("answers a wrong password and an unknown address alike", async () => {
    const wrong = await newClient().signIn(demoAccounts.nurse2, "not the password");
    const unknown = await newClient().signIn("nobody@harrowmere.example", "not the password");
    expect([wrong.status, wrong.body]).toEqual([unknown.status, unknown.body]);
    expect(wrong.status).toBe(401);
    for (const [email, password] of [
      ["", ""],
      [demoAccounts.nurse, "x".repeat(5_000)],
      ["a\u0000@b.example", "x"],
    ]) {
      expect((await newClient().signIn(email ?? "", password ?? "")).status).toBe(401);
    }
  });

  it("slows down whoever guesses, whatever they say about themselves, and nobody else", async () => {
    const email = "pender@harrowmere.example";
    const statuses: number[] = [];
    for (let count = 0; count < 11; count += 1) {
      const client = newClient();
      const { csrfToken } = z
        .object({ csrfToken: z.string() })
        .parse((await client.get("/api/auth/csrf")).body);
      const form = new URLSearchParams({
        email: email.toUpperCase(),
        password: `guess ${count}`,
        csrfToken,
        json: "true",
      });
      const headers = { "x-forwarded-for": `10.0.0.${count}`, "x-ebbline-peer": `10.0.1.${count}` };
      statuses.push((await client.request("POST", "/api/auth/callback/credentials", form, headers)).status);
    }
    expect(statuses).toEqual([...Array<number>(10).fill(401), 429]);
    const right = await newClient().signIn(email, DEMO_PASSWORD);
    expect(right.status).toBe(429);
    expect(Number(right.headers.get("retry-after"))).toBeGreaterThan(0);
    expect((await newClient().signIn("quill@harrowmere.example", DEMO_PASSWORD)).status).toBe(200);
  });

  it("needs its own token and its own pages", async () => {
    const right = { email: demoAccounts.nurse, password: DEMO_PASSWORD, json: "true" };
    const client = newClient();
    await client.request("POST", "/api/auth/callback/credentials", new URLSearchParams(right));
    expect((await client.get("/api/me")).status).toBe(401);

    const { csrfToken } = z
      .object({ csrfToken: z.string() })
      .parse((await client.get("/api/auth/csrf")).body);
    const form = new URLSearchParams({ ...right, csrfToken });
    const foreign = { origin: "https://elsewhere.example" };
    expectProblem(
      await client.request("POST", "/api/auth/callback/credentials", form, foreign),
      403,
      "another site",
    );
    const large = new URLSearchParams({ ...right, csrfToken, more: "x".repeat(20_000) });
    expectProblem(await client.request("POST", "/api/auth/callback/credentials", large), 413, "too much");
  });

  it("has no other doors of the library's", async () => {
    for (const path of ["_log", "verify-request", "callback/google", "signin/email", "nothing"]) {
      for (const method of ["GET", "POST"]) {
        const reply = await newClient().request(
          method,
          `/api/auth/${path}`,
          method === "GET" ? undefined : {},
        );
        expect([204, 404], `${method} ${path}`).toContain(reply.status);
        expect(reply.body === "" || (reply.body as { status: number }).status === 404).toBe(true);
      }
    }
  });
});

describe("a session's end", () => {
  it("by signing out kills every copy of the cookie", async () => {
    const client = await signedIn(server.url, "nurse2");
    const copy = client.cookieHeader();
    expect((await withCookie(copy).get("/api/me")).status).toBe(200);
    const { csrfToken } = z
      .object({ csrfToken: z.string() })
      .parse((await client.get("/api/auth/csrf")).body);
    await client.request("POST", "/api/auth/signout", new URLSearchParams({ csrfToken, json: "true" }));
    expect((await client.get("/api/me")).status).toBe(401);
    expectProblem(await withCookie(copy).get("/api/me"), 401, "a copied cookie");
    expect((await withCookie(copy).get("/returns")).headers.get("location")).toBe("/sign-in?from=%2Freturns");
    expect((await withCookie(copy).get("/api/auth/session")).body).toEqual({});
  });

  it("by switching off comes with the next request, and switching on brings no session back", async () => {
    const client = newClient();
    await client.signIn("tarrow@harrowmere.example", DEMO_PASSWORD);
    expect((await client.get("/api/returns/ROWAN/2026-11")).status).toBe(200);
    await change("tarrow@harrowmere.example", { state: "off" });
    expectProblem(await client.get("/api/returns/ROWAN/2026-11"), 401, "switched off");
    expect((await newClient().signIn("tarrow@harrowmere.example", DEMO_PASSWORD)).status).toBe(401);
    await change("tarrow@harrowmere.example", { state: "active" });
    expect((await client.get("/api/me")).status).toBe(401);
    expect((await newClient().signIn("tarrow@harrowmere.example", DEMO_PASSWORD)).status).toBe(200);
  });
});

describe("changed rights hold with the next request", () => {
  it("of wards", async () => {
    const client = newClient();
    const email = "halloway@harrowmere.example";
    await client.signIn(email, DEMO_PASSWORD);
    expect((await client.get("/api/charts/SEDGE/FALLS")).status).toBe(200);
    await change(email, { wards: ["ALDER"] });
    expectProblem(await client.get("/api/charts/SEDGE/FALLS"), 404, "a ward that was taken away");
    expect((await client.get("/charts/SEDGE/FALLS")).status).toBe(404);
    const late = await client.put("/api/returns/SEDGE/2026-12/tallies/FALLS", { numerator: 1, version: 0 });
    expectProblem(late, 404, "a change on it");
    expect((await client.get("/api/me")).body).toMatchObject({ wards: ["ALDER"] });
    await change(email, { wards: ["SEDGE", "ALDER", "HERON"] });
    expect((await client.get("/api/charts/SEDGE/FALLS")).status).toBe(200);
  });

  it("of the role", async () => {
    const client = newClient();
    const email = "quill@harrowmere.example";
    await client.signIn(email, DEMO_PASSWORD);
    expect((await client.get("/api/wards")).status).toBe(200);
    await change(email, { role: "board_member" });
    expectProblem(await client.get("/api/wards"), 403, "a board member");
    expect((await client.get("/charts")).status).toBe(403);
    expect((await client.get("/api/me")).body).toMatchObject({ role: "board_member", wards: [] });
  });

  it("but the last lead stays", async () => {
    const { id, version } = await person(demoAccounts.lead);
    for (const values of [{ state: "off" }, { role: "ward_nurse" }]) {
      expectProblem(
        await lead.patch(`/api/people/${id}`, { ...values, version }),
        409,
        JSON.stringify(values),
      );
    }
    expect((await lead.get("/api/people")).status).toBe(200);
  });
});

describe("where a browser is sent", () => {
  const elsewhere = [
    "https://elsewhere.example/",
    "//elsewhere.example",
    "/\\elsewhere.example",
    "https:elsewhere.example",
    "javascript:alert(1)",
    "/api/auth/signout",
  ];

  it.each(elsewhere)("is never %s", async (callbackUrl) => {
    const client = newClient();
    const { csrfToken } = z
      .object({ csrfToken: z.string() })
      .parse((await client.get("/api/auth/csrf")).body);
    const email = demoAccounts.nurse;
    for (const json of ["true", "false"]) {
      const form = new URLSearchParams({ email, password: DEMO_PASSWORD, csrfToken, callbackUrl, json });
      const reply = await client.request("POST", "/api/auth/callback/credentials", form);
      expect(nextAddress(reply)).toBe(`${server.url}/`);
    }
    const asked = await newClient().get(`/api/auth/signin?callbackUrl=${encodeURIComponent(callbackUrl)}`);
    expect(new URL(nextAddress(asked), server.url).origin).toBe(server.url);
    const page = await client.get(`/sign-in?from=${encodeURIComponent(callbackUrl)}`);
    expect([page.status, page.headers.get("location")]).toEqual([307, "/"]);
  });

  it("doesn't follow a Host that a caller made up", async () => {
    const made = {
      host: "elsewhere.example",
      "x-forwarded-host": "elsewhere.example",
      "x-forwarded-proto": "https",
    };
    for (const path of ["/charts", "/api/auth/signin", "/api/auth/csrf", "/sign-in", "/api/auth/providers"]) {
      const reply = await rawRequest(server.url, { path, headers: made });
      expect(reply.status, path).toBeLessThan(400);
      expect(JSON.stringify(reply.headers) + reply.text, path).not.toContain("elsewhere.example");
    }
    const invited = await rawRequest(server.url, {
      method: "POST",
      path: "/api/people",
      headers: {
        ...made,
        origin: server.url,
        cookie: lead.cookieHeader(),
        "content-type": "application/json",
      },
      body: JSON.stringify({
        email: "host@harrowmere.example",
        name: "Una Colborne",
        role: "infection_control",
      }),
    });
    expect(invited.status, invited.text).toBe(201);
    const { invitation } = z
      .object({ invitation: z.object({ link: z.string() }) })
      .parse(JSON.parse(invited.text));
    expect(invitation.link.startsWith(`${server.url}/invitation/`)).toBe(true);
  });
});

it("takes up an invitation once, and refuses weak passwords", async () => {
  const made = await lead.post("/api/people", {
    email: "una.ferris@harrowmere.example",
    name: "Una Ferris",
    role: "ward_nurse",
    wards: ["TERN"],
  });
  const { invitation } = z.object({ invitation: z.object({ link: z.string() }) }).parse(made.body);
  const token = invitation.link.split("/").at(-1) ?? "";
  const client = newClient();
  for (const password of ["short", "passwordpassword", "una.ferris and more", "x".repeat(300)]) {
    expectProblem(await client.post("/api/invitations", { token, password }), 422, password.slice(0, 20));
  }
  const password = "seven boats on the water";
  const replies = await Promise.all(
    [1, 2].map(() => newClient().post("/api/invitations", { token, password })),
  );
  expect(replies.map(({ status }) => status).sort()).toEqual([200, 404]);
  await client.signIn("una.ferris@harrowmere.example", password);
  expect((await client.get("/api/me")).body).toMatchObject({ name: "Una Ferris", wards: ["TERN"] });
});
