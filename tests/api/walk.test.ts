import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { z } from "zod";
import { findRoutes, routeMethods, UNKNOWN_ROUTE } from "@/tests/support/app-files";
import type { ExtraHeaders, HttpClient, Reply } from "@/tests/support/http-client";
import { rawRequest } from "@/tests/support/raw-request";
import { START_LIMIT } from "@/tests/support/server";
import { expectDecent, expectProblem } from "./decent-reply";
import { openToAnyone, openToBoard, probes, type Probe } from "./route-expectations";
import { accounts, makeWorld, type World } from "./walk-world";

const all = await findRoutes();
const routes = all
  .filter((route) => route.path !== UNKNOWN_ROUTE)
  .map((route) => ({ ...route, name: `${route.method} ${route.path}` }));
type Route = (typeof routes)[number];

let world: World;
beforeAll(async () => {
  world = await makeWorld();
}, START_LIMIT);
afterAll(() => world?.server.stop());

function probeOf({ name }: Route): Probe {
  const probe = probes[name];
  if (!probe) throw new Error(`${name} has no line in route-expectations.ts.`);
  return probe;
}

function filled(path: string, params: Record<string, string>): string {
  return path.replace(/\{(\w+)\}/g, (_, key: string) => params[key] ?? "");
}

function addressOf(route: Route, params = probeOf(route).params?.(world) ?? {}, query?: string): string {
  const search = query ?? probeOf(route).query;
  return filled(route.path, params) + (search ? `?${search}` : "");
}

/** The probe's own call. */
function call(client: HttpClient, route: Route, headers?: ExtraHeaders): Promise<Reply> {
  return client.request(route.method, addressOf(route), probeOf(route).body?.(world), headers);
}

describe("the table of expectations", () => {
  it("names every method of every route file, and nothing else", () => {
    expect(Object.keys(probes).sort()).toEqual(routes.map(({ name }) => name).sort());
  });

  it("lets board members in only where a reason is written down", () => {
    const open = Object.keys(probes).filter((name) => probes[name]?.statuses.board !== 403);
    expect(open.sort()).toEqual(Object.keys(openToBoard).sort());
  });

  it("shows another ward's addresses to nobody", () => {
    const named = Object.keys(probes).filter((name) => /\{ward\}|\{month\}/.test(name));
    expect(named.length).toBeGreaterThan(10);
    for (const name of named) expect([403, 404], name).toContain(probes[name]?.statuses.nurse2);
  });

  it("has the routes that answer without signing in, and no others, open to anyone", () => {
    const open = routes.filter(({ handler }) => handler.route.openToAnyone).map(({ name }) => name);
    expect(open.sort()).toEqual(Object.keys(openToAnyone).sort());
  });
});

describe("each account gets what it should", () => {
  it.each(routes)("$name", async (route) => {
    for (const account of accounts) {
      const reply = await call(world.clients[account], route);
      const what = `${account}: ${route.name}`;
      const expected = probeOf(route).statuses[account];
      if (expected >= 400) expectProblem(reply, expected, what);
      expectDecent(reply, what);
      expect(reply.status, `${what}: ${JSON.stringify(reply.body).slice(0, 300)}`).toBe(expected);
    }
  });
});

describe("whoever hasn't signed in gets nothing", () => {
  it.each(routes)("$name", async (route) => {
    const reply = await call(world.anybody, route);
    if (route.name in openToAnyone) return expectDecent(reply, route.name);
    expectProblem(reply, 401, route.name);
    const made = await call(world.anybody, route, { cookie: "next-auth.session-token=made.up.here" });
    expectProblem(made, 401, `${route.name} with a made-up cookie`);
  });
});

describe("changes are taken from Ebbline's own pages alone", () => {
  const foreign: ExtraHeaders[] = [
    { origin: null },
    { origin: "https://elsewhere.example" },
    { origin: "null" },
    { origin: null, "sec-fetch-site": "cross-site" },
    { origin: null, "sec-fetch-site": "same-site" },
    { "sec-fetch-site": "cross-site" },
  ];

  it.each(routes.filter(({ method }) => method !== "GET"))("$name", async (route) => {
    for (const headers of foreign) {
      const reply = await call(world.clients.lead, route, headers);
      expectProblem(reply, 403, `${route.name} with ${JSON.stringify(headers)}`);
    }
  });
});

describe("bodies that aren't what a route takes are refused", () => {
  const takesJson = routes.filter(({ handler }) => handler.route.body !== undefined);

  it.each(takesJson)("$name", async (route) => {
    const send = (body: string, type = "application/json") =>
      world.clients.lead.request(route.method, addressOf(route), body, { "content-type": type });
    expectProblem(await send("a=1", "text/plain"), 415, "text");
    expectProblem(await send("a=1", "application/x-www-form-urlencoded"), 415, "a form");
    expectProblem(await send('{"a":'), 422, "half of it");
    expectProblem(await send(`{"a":"${"x".repeat(66_000)}"}`), 413, "too much of it");
    for (const body of ["[]", "7", "null", '"text"', "true"]) expectProblem(await send(body), 422, body);
    for (const body of ['{"__proto__":{"isAdmin":true}}', '{"constructor":{}}', "[".repeat(9_000)]) {
      const reply = await send(body);
      expectDecent(reply, body.slice(0, 40));
      // A route whose whole body may be left out takes an object without anything that it knows.
      expect([200, 404, 409, 422], body.slice(0, 40)).toContain(reply.status);
    }
  });

  it("POST /api/imports takes one file in a form, of at most 5 MB", async () => {
    const { nurse } = world.clients;
    const send = (body: unknown, type?: string) =>
      nurse.request("POST", "/api/imports", body, type ? { "content-type": type } : {});
    expectProblem(await send("Ward,Indicator", "text/csv"), 415, "the file alone");
    expectProblem(await send({ file: "Ward" }), 415, "JSON");
    expectProblem(await send("no parts here", "multipart/form-data; boundary=x"), 422, "a broken form");
    expectProblem(await send(new FormData()), 422, "an empty form");
    const two = new FormData();
    two.append("file", new File(["a"], "a.csv"));
    two.append("file", new File(["b"], "b.csv"));
    expectProblem(await send(two), 422, "two files");
    expectProblem(await nurse.upload("/api/imports", "x".repeat(5_300_000), "big.csv"), 413, "too much");
  });
});

describe("odd queries upset nothing", () => {
  const values = ["%00", "%ff", "__proto__", "%E2%80%AE", "'%22;--", "x".repeat(3_000)];
  const wholes = ["__proto__=1", "constructor[prototype]=1", "a=1&a=2", "%ff=1", "&&==&"];

  it.each(routes)("$name", async (route) => {
    // Of changes only the query's own refusal is wanted, not the change.
    const client = route.method === "GET" ? world.clients.lead : world.clients.board;
    const ask = (query: string) => client.request(route.method, addressOf(route, undefined, query));
    const keys = queryKeys(route.handler.route.query);
    const twice = keys.map(async (key) => expectProblem(await ask(`${key}=1&${key}=2`), 422, `${key} twice`));
    const odd = keys.flatMap((key) =>
      values.map(async (value) => {
        const reply = await ask(`${key}=${value}`);
        expectDecent(reply, `${key}=${value.slice(0, 20)}`);
        expect([200, 404, 422], `${key}=${value.slice(0, 20)}`).toContain(reply.status);
      }),
    );
    const others = wholes.map(async (query) => expectDecent(await ask(query), query));
    await Promise.all([...twice, ...odd, ...others]);
  });
});

describe("odd addresses aren't known", () => {
  const named = routes.filter(({ path }) => path.includes("{"));
  const odd = [
    "%00",
    "%01%1f",
    "%ff",
    "%zz",
    "__proto__",
    "..%2f..%2fhealth",
    "'%20or%201=1",
    "x".repeat(5_000),
  ];

  it.each(named)("$name", async (route) => {
    const right = probeOf(route).params?.(world) ?? {};
    const tries = Object.keys(right).flatMap((key) =>
      odd.map(async (value) => {
        const address = addressOf(route, { ...right, [key]: value });
        const reply = await world.clients.lead.request(route.method, address, probeOf(route).body?.(world));
        expectProblem(reply, 404, `${key} ${value.slice(0, 20)}`);
      }),
    );
    await Promise.all(tries);
  });
});

/** Keys that a query may have, also where checks across them or a transform come behind. */
function queryKeys(schema: z.ZodType | undefined): string[] {
  if (!schema) return [];
  const described = z.toJSONSchema(schema, { io: "input", unrepresentable: "any" });
  return Object.keys(described.properties ?? {});
}

describe("methods and addresses that nothing answers", () => {
  const paths = [...new Set(routes.map(({ path }) => path))];

  it.each(paths)("%s refuses the methods that it doesn't have", async (path) => {
    const own = routes.filter((route) => route.path === path);
    const [first] = own;
    if (!first) throw new Error("A path without a route.");
    for (const method of routeMethods.filter((each) => own.every((route) => route.method !== each))) {
      const reply = await world.clients.lead.request(method, addressOf(first));
      expectDecent(reply, `${method} ${path}`);
      expect(reply.status, `${method} ${path}`).toBe(405);
    }
  });

  it("says of an unknown address that there is none, by any method", async () => {
    for (const method of routeMethods) {
      for (const address of ["/api/nothing", "/api/returns/OSIER/2026-11/nothing", "/api/health/more"]) {
        const reply = await world.clients.lead.request(method, address, method === "GET" ? undefined : {});
        expectProblem(reply, 404, `${method} ${address}`);
      }
    }
    expectProblem(await world.anybody.get("/api/nothing"), 404, "signed out");
  });

  it("answers HEAD as GET without a body, and to those only who may", async () => {
    const refused = await world.anybody.request("HEAD", "/api/wards");
    expect([refused.status, refused.body]).toEqual([401, ""]);
    const taken = await world.clients.nurse.request("HEAD", "/api/wards/OSIER");
    expect([taken.status, taken.body]).toEqual([200, ""]);
    expect((await world.clients.nurse2.request("HEAD", "/api/wards/OSIER")).status).toBe(404);
  });

  it("refuses methods and addresses that the framework can't make a request of", async () => {
    const ask = async (method: string, path: string) =>
      (await rawRequest(world.server.url, { method, path })).status;
    for (const method of ["TRACE", "PROPFIND", "REPORT"])
      expect(await ask(method, "/api/me"), method).toBe(400);
    for (const path of ["/api/wards/%ff", "/api/wards/%", "/api/%c3%28/x"]) {
      expect([401, 404], path).toContain(await ask("GET", path));
    }
    expect(await ask("GET", `/api/wards/${"x".repeat(40_000)}`)).toBe(431);
  });
});

it("logged no failure of its own in all this", () => {
  expect(world.server.output()).not.toContain("request.failed");
});
