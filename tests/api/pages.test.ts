import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { demoIndicators, demoWards } from "@/lib/demo/hospital";
import { findPages } from "@/tests/support/app-files";
import type { ExtraHeaders, Reply } from "@/tests/support/http-client";
import { rawRequest } from "@/tests/support/raw-request";
import { START_LIMIT } from "@/tests/support/server";
import { pageProbes, publicPages } from "./page-expectations";
import { accounts, makeWorld, type World } from "./walk-world";

let world: World;
beforeAll(async () => {
  world = await makeWorld();
}, START_LIMIT);
afterAll(() => world?.server.stop());

const NONCE = /script-src 'nonce-([A-Za-z0-9+/=]+)' 'strict-dynamic'(?:;|$)/;

/** What holds for every page, whatever it says. */
function expectDecentPage(reply: Reply, what: string): string {
  const text = String(reply.body);
  expect(reply.status, `${what}: ${text.slice(0, 200)}`).toBeLessThan(500);
  expect(text, what).not.toMatch(/\n\s+at .+:\d+:\d+|node_modules|lib\/services\//);
  const { headers } = reply;
  expect(headers.get("cache-control"), what).toBe("no-store");
  expect(headers.get("x-content-type-options"), what).toBe("nosniff");
  expect(headers.get("referrer-policy"), what).toBe("same-origin");
  expect(headers.get("x-frame-options"), what).toBe("DENY");
  expect(headers.get("x-powered-by"), what).toBeNull();
  const policy = headers.get("content-security-policy") ?? "";
  expect(policy, what).not.toMatch(/unsafe-|https?:|\*/);
  const nonce = NONCE.exec(policy)?.[1] ?? "none";
  for (const [script] of text.matchAll(/<script\b[^>]*>/g)) {
    expect(script, what).toContain(`nonce="${nonce}"`);
  }
  // The policy stops these: where they stood, something would be missing from the page.
  expect(text, what).not.toMatch(/<[a-z][^>]*\s(?:style|on[a-z]+)="/);
  return nonce;
}

/** Names of what the hospital counts, and where: nobody may read them from a page that refuses. */
const names = [
  ...demoWards.flatMap(({ name }) => [name]),
  ...demoIndicators.flatMap(({ name, numeratorLabel }) => [name, numeratorLabel]),
];

function expectNothingCounted(text: string, what: string): void {
  for (const name of names) expect(text.includes(name), `${what} shows "${name}"`).toBe(false);
}

describe("the table of pages", () => {
  it("names every page, and nothing else", () => {
    expect(Object.keys(pageProbes).sort()).toEqual(findPages("(signed-in)").sort());
    expect(Object.keys(publicPages).sort()).toEqual(findPages("(public)").sort());
  });

  it("opens to board members nothing but the packs", () => {
    const open = Object.entries(pageProbes).filter(([, all]) =>
      all.some(({ statuses }) => statuses.board === 200),
    );
    expect(open.map(([pattern]) => pattern)).toEqual(["/packs"]);
  });
});

describe.each(Object.keys(pageProbes))("%s", (pattern) => {
  it("opens to whom it should", async () => {
    for (const { path, statuses } of pageProbes[pattern] ?? []) {
      for (const account of accounts) {
        const what = `${account}: ${path(world)}`;
        const reply = await world.clients[account].get(path(world));
        expectDecentPage(reply, what);
        expect(reply.status, what).toBe(statuses[account]);
        if (reply.status === 403 || reply.status === 404) expectNothingCounted(String(reply.body), what);
      }
    }
  });

  it("says no more to the browser's own fetching of its contents", async () => {
    for (const { path, statuses } of pageProbes[pattern] ?? []) {
      for (const account of accounts.filter((each) => statuses[each] >= 400)) {
        const reply = await world.clients[account].get(path(world), { rsc: "1" });
        expect(reply.status, path(world)).toBeLessThan(500);
        expectNothingCounted(String(reply.body), `${account}: ${path(world)} as contents`);
      }
    }
  });

  it("sends whoever hasn't signed in to the sign-in page", async () => {
    for (const { path } of pageProbes[pattern] ?? []) {
      const reply = await world.anybody.get(path(world));
      expectDecentPage(reply, path(world));
      expect(reply.status, path(world)).toBe(307);
      expect(reply.headers.get("location"), path(world)).toMatch(/^\/sign-in(\?from=|$)/);
      expectNothingCounted(String(reply.body), path(world));
    }
  });
});

describe("pages that anybody may open", () => {
  it.each(Object.values(publicPages))("$path", async ({ path, signedIn }) => {
    const reply = await world.anybody.get(path);
    expectDecentPage(reply, path);
    expect(reply.status).toBe(200);
    for (const account of accounts) {
      const own = await world.clients[account].get(path);
      expectDecentPage(own, path);
      expect(own.status, `${account}: ${path}`).toBe(signedIn);
    }
  });
});

describe("what board members can read", () => {
  it("names no ward and nothing counted", async () => {
    const { board } = world.clients;
    for (const path of ["/packs", "/invitation/x", "/no-such-page", "/packs/2026-Q3"]) {
      const page = await board.get(path);
      expectNothingCounted(String(page.body), path);
      expectNothingCounted(String((await board.get(path, { rsc: "1" })).body), `${path} as contents`);
    }
  });
});

describe("odd requests for pages", () => {
  it("get a new nonce each", async () => {
    const nonces = new Set<string>();
    for (let count = 0; count < 5; count += 1) {
      nonces.add(expectDecentPage(await world.anybody.get("/sign-in"), "/sign-in"));
    }
    expect(nonces.size).toBe(5);
    expect([...nonces].every((nonce) => nonce.length >= 22)).toBe(true);
  });

  it("find nothing, in order", async () => {
    const { lead } = world.clients;
    const odd = ["%00", "%01", "%ff", "__proto__", "..%2f..", "'", "x".repeat(5_000)];
    for (const value of odd) {
      for (const path of [
        `/charts/${value}/FALLS`,
        `/returns/OSIER/${value}`,
        `/returns/OSIER/2026-10/${value}`,
      ]) {
        const reply = await lead.get(path);
        expectDecentPage(reply, path.slice(0, 60));
        expect(reply.status, path.slice(0, 60)).toBe(404);
      }
    }
    for (const query of [
      "from=%00",
      "ward=%ff",
      "cursor=x&cursor=y",
      "__proto__=1",
      `status=${"x".repeat(3_000)}`,
    ]) {
      for (const path of [
        "/charts/OSIER/FALLS",
        "/charts",
        "/returns",
        "/signals",
        "/set-up/record",
        "/sign-in",
      ]) {
        expectDecentPage(await lead.get(`${path}?${query}`), `${path}?${query.slice(0, 40)}`);
      }
    }
  });

  it("can't name the path or the caller in headers of their own", async () => {
    const headers = { "x-ebbline-path": "//elsewhere.example", "x-ebbline-peer": "10.0.0.1" };
    const reply = await rawRequest(world.server.url, { path: "/charts", headers });
    expect([reply.status, reply.headers.location]).toEqual([307, "/sign-in?from=%2Fcharts"]);
  });
});

it("logged no failure of its own in all this", () => {
  expect(world.server.output()).not.toMatch(/request\.failed|⨯|Error:/);
});

it("has no actions that a request could set off", async () => {
  const foreign = { "next-action": "0".repeat(40), origin: "https://elsewhere.example" };
  for (const headers of [{ "next-action": "0".repeat(40) }, foreign] as ExtraHeaders[]) {
    const reply = await world.clients.lead.request("POST", "/people", "[]", headers);
    expect(reply.status).toBeGreaterThanOrEqual(400);
    expect(reply.status).toBeLessThan(500);
  }
});
