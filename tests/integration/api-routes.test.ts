import { readdirSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { z } from "zod";
import { routeModules } from "@/app/api/_routes";
import { methods, openApiDocument, type RouteModule } from "@/app/api/openapi.json/document";
import * as openApiRoute from "@/app/api/openapi.json/route";

const root = path.resolve(import.meta.dirname, "../..");

/** Not described: next-auth makes its own handler, and the other one says of all unknown addresses that they are. */
const EXEMPT = new Set(["/api/auth/{...nextauth}", "/api/{...path}"]);

const files = readdirSync(path.join(root, "app/api"), { recursive: true, encoding: "utf8" })
  .filter((file) => path.basename(file) === "route.ts")
  .map((file) => ({
    file: path.join(root, "app/api", file),
    address: `/api/${path.dirname(file)}`.replaceAll("[", "{").replaceAll("]", "}"),
  }))
  .filter(({ address }) => !EXEMPT.has(address));

const all: Record<string, RouteModule> = { ...routeModules, "/api/openapi.json": openApiRoute };
/** As a caller reads it: through JSON. */
const description: unknown = JSON.parse(JSON.stringify(openApiDocument(all)));

/** A value deep inside the description; undefined where a step leads nowhere. */
function at(...steps: string[]): unknown {
  return steps.reduce<unknown>((value, step) => Reflect.get(Object(value) as object, step), description);
}

async function exportsOf(file: string): Promise<RouteModule> {
  return (await import(file)) as RouteModule;
}

describe("the route files", () => {
  it("are all in the manifest, and nothing else is", () => {
    expect(Object.keys(all).sort()).toEqual(files.map(({ address }) => address).sort());
  });

  it.each(files)("$address exports handlers made by route() and nothing else", async ({ file, address }) => {
    const exported = await exportsOf(file);
    expect(Object.keys(exported).filter((name) => !(methods as readonly string[]).includes(name))).toEqual(
      [],
    );
    expect(Object.keys(exported)).not.toEqual([]);
    for (const handler of Object.values(exported)) {
      expect(handler).toBeTypeOf("function");
      expect(handler.route.summary).toMatch(/\w/);
      expect(handler.route.status).toBeTypeOf("number");
    }
    expect(Object.values(all[address] ?? {})).toEqual(Object.values(exported));
  });

  it.each(files)("$address names its parameters in its schemas", async ({ file, address }) => {
    const named = [...address.matchAll(/\{(\w+)\}/g)].map((match) => match[1]);
    for (const handler of Object.values(await exportsOf(file))) {
      const { params } = handler.route;
      const taken = params instanceof z.ZodObject ? Object.keys(params.shape) : [];
      expect(taken.sort()).toEqual(named.sort());
    }
  });
});

describe("the description of the API", () => {
  const json = ["content", "application/json", "schema"];

  it("says what a ward takes and gives", () => {
    const post = ["paths", "/api/wards", "post"];
    expect(at(...post, "requestBody", ...json, "required")).toEqual(["code", "name", "division", "openFrom"]);
    const month = at(...post, "requestBody", ...json, "properties", "openFrom");
    expect(month).toMatchObject({ type: "string", description: "A month, YYYY-MM" });
    expect(Object.keys(Object(at(...post, "responses")) as object)).toEqual(["201", "default"]);
    expect(at(...post, "responses", "201", ...json, "properties", "version")).toMatchObject({
      type: "integer",
    });
    expect(at(...post, "security")).toEqual([{ session: [] }]);
  });

  it("lists parameters of path and query", () => {
    expect(at("paths", "/api/assignments/{ward}/{indicator}", "put", "parameters")).toMatchObject([
      { name: "ward", in: "path", required: true },
      { name: "indicator", in: "path", required: true },
    ]);
    expect(at("paths", "/api/audit", "get", "parameters")).toMatchObject([
      { name: "cursor", in: "query", required: false },
      { name: "limit", in: "query", required: false },
    ]);
  });

  it("says which routes answer whoever asks, and describes itself", () => {
    expect(at("openapi")).toBe("3.1.0");
    expect(at("paths", "/api/health", "get", "security")).toEqual([]);
    expect(at("paths", "/api/openapi.json", "get", "security")).toEqual([{ session: [] }]);
  });
});
