import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { z } from "zod";
import { findRoutes, UNKNOWN_ROUTE } from "@/tests/support/app-files";
import { signedIn } from "@/tests/support/http-client";
import { START_LIMIT, startServer, type TestServer } from "@/tests/support/server";

const routes = (await findRoutes()).filter(({ path }) => path !== UNKNOWN_ROUTE);

const schemaObject = z.record(z.string(), z.unknown());
const media = z.record(z.string().regex(/^[\w.+-]+\/[\w.+-]+$/), z.strictObject({ schema: schemaObject }));
const response = z.union([
  z.strictObject({ $ref: z.string().regex(/^#\/components\/responses\/\w+$/) }),
  z.strictObject({ description: z.string().min(1), content: media.optional() }),
]);
const operation = z.strictObject({
  operationId: z.string().min(1),
  summary: z.string().min(1),
  security: z.array(z.record(z.string(), z.array(z.string()))),
  parameters: z.array(
    z.strictObject({
      name: z.string().min(1),
      in: z.enum(["path", "query"]),
      required: z.boolean(),
      schema: schemaObject,
    }),
  ),
  requestBody: z.strictObject({ required: z.boolean(), content: media }).optional(),
  responses: z.record(z.string().regex(/^([1-5]\d\d|default)$/), response),
});
/** The parts of OpenAPI 3.1 that the description uses, each with what the specification asks of it. */
const documentSchema = z.strictObject({
  openapi: z.string().regex(/^3\.1\.\d+$/),
  info: z.strictObject({ title: z.string().min(1), version: z.string().min(1), description: z.string() }),
  paths: z.record(
    z.string().startsWith("/"),
    z.partialRecord(z.enum(["get", "put", "post", "delete", "patch"]), operation),
  ),
  components: z.strictObject({
    securitySchemes: z.record(z.string(), z.looseObject({ type: z.string() })),
    responses: z.record(z.string(), response),
  }),
});
type Document = z.output<typeof documentSchema>;

let server: TestServer;
let raw: unknown;
let document: Document;
beforeAll(async () => {
  server = await startServer();
  raw = (await (await signedIn(server.url, "board")).get("/api/openapi.json")).body;
  document = documentSchema.parse(raw);
}, START_LIMIT);
afterAll(() => server?.stop());

const operations = () =>
  Object.entries(document.paths).flatMap(([path, item]) =>
    Object.entries(item).map(([method, each]) => ({ path, method, operation: each })),
  );

describe("the description that the server sends", () => {
  it("lists every method of every route file, and nothing else", () => {
    const listed = operations().map(({ path, method }) => `${method.toUpperCase()} ${path}`);
    expect(listed.sort()).toEqual(routes.map(({ path, method }) => `${method} ${path}`).sort());
  });

  it("has the words of the route files", () => {
    for (const { path, method, handler } of routes) {
      const { summary } = handler.route;
      const listed = operations().find((each) => each.path === path && each.method === method.toLowerCase());
      expect(listed?.operation.summary, `${method} ${path}`).toBe(summary);
      expect(listed?.operation.requestBody !== undefined, `${method} ${path}`).toBe(
        handler.route.body !== undefined,
      );
    }
  });

  it("names each operation once, and each of a path's parameters", () => {
    const ids = operations().map((each) => each.operation.operationId);
    expect(new Set(ids).size).toBe(ids.length);
    for (const { path, operation: each } of operations()) {
      const inPath = each.parameters.filter((parameter) => parameter.in === "path");
      expect(inPath.map(({ name }) => `{${name}}`).sort(), path).toEqual(
        (path.match(/\{\w+\}/g) ?? []).sort(),
      );
      expect(
        inPath.every(({ required }) => required),
        path,
      ).toBe(true);
      const keys = each.parameters.map((parameter) => `${parameter.in} ${parameter.name}`);
      expect(new Set(keys).size, path).toBe(keys.length);
    }
  });

  it("says of each operation one success, the problems, and who may ask", () => {
    const schemes = Object.keys(document.components.securitySchemes);
    for (const { path, method, operation: each } of operations()) {
      const statuses = Object.keys(each.responses);
      expect(
        statuses.filter((status) => status.startsWith("2")),
        `${method} ${path}`,
      ).toHaveLength(1);
      expect(statuses, `${method} ${path}`).toContain("default");
      for (const need of each.security)
        expect(schemes, path).toEqual(expect.arrayContaining(Object.keys(need)));
    }
  });

  it("refers to nothing that isn't there", () => {
    const refs = [...JSON.stringify(raw).matchAll(/"\$ref":"([^"]+)"/g)].map(([, ref]) => ref ?? "");
    expect(refs.length).toBeGreaterThan(0);
    for (const ref of new Set(refs)) {
      const steps = ref.replace(/^#\//, "").split("/");
      const found = steps.reduce<unknown>((value, step) => Reflect.get(Object(value) as object, step), raw);
      expect(found, ref).toBeDefined();
    }
  });
});
