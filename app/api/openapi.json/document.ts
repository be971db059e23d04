import { z } from "zod";
import type { RouteHandler, RouteMeta } from "@/lib/http";

export const methods = ["GET", "POST", "PUT", "PATCH", "DELETE"] as const;
export type Method = (typeof methods)[number];

/** The exports of one route file. */
export type RouteModule = Partial<Record<Method, RouteHandler>>;

type Json = Record<string, unknown>;

const PROBLEM = { $ref: "#/components/responses/Problem" };

/** Describes route modules, keyed by path with `{name}` for parameters, as an OpenAPI 3.1 document. */
export function openApiDocument(modules: Record<string, RouteModule>): Json {
  return {
    openapi: "3.1.0",
    info: {
      title: "Ebbline",
      version: "1",
      description:
        "Months are YYYY-MM, instants ISO 8601 in UTC. Errors are problem documents. " +
        "A change sends the version that it was based on. No patient details anywhere.",
    },
    paths: Object.fromEntries(
      Object.entries(modules).map(([path, module]) => [path, pathItem(path, module)]),
    ),
    components: {
      securitySchemes: {
        session: {
          type: "apiKey",
          in: "cookie",
          name: "next-auth.session-token",
          description: "Set by signing in; its name begins with __Secure- where the address is https.",
        },
      },
      responses: {
        Problem: {
          description: "What went wrong (RFC 9457)",
          content: { "application/problem+json": { schema: problemSchema } },
        },
      },
    },
  };
}

function pathItem(path: string, module: RouteModule): Json {
  const described = methods.flatMap((method) => {
    const handler = module[method];
    return handler ? [[method.toLowerCase(), operation(path, method, handler.route)] as const] : [];
  });
  return Object.fromEntries(described);
}

function operation(path: string, method: Method, meta: RouteMeta): Json {
  return {
    operationId: `${method.toLowerCase()} ${path}`,
    summary: meta.summary,
    security: meta.openToAnyone ? [] : [{ session: [] }],
    parameters: [...parameters("path", meta.params), ...parameters("query", meta.query)],
    ...(meta.body
      ? {
          requestBody: {
            required: true,
            content: { "application/json": { schema: schemaOf(meta.body, "input") } },
          },
        }
      : {}),
    responses: {
      [meta.status]: {
        description: "Done",
        ...(meta.response
          ? { content: { "application/json": { schema: schemaOf(meta.response, "output") } } }
          : {}),
      },
      default: PROBLEM,
    },
  };
}

function parameters(place: "path" | "query", schema: z.ZodType | undefined): Json[] {
  if (!schema) return [];
  const described = schemaOf(schema, "input");
  const required = new Set(Array.isArray(described.required) ? described.required : []);
  return Object.entries((described.properties ?? {}) as Record<string, Json>).map(([name, property]) => ({
    name,
    in: place,
    required: place === "path" || required.has(name),
    schema: property,
  }));
}

/** What can't be said in JSON Schema, such as a check across fields, is left out; the server still checks it. */
function schemaOf(schema: z.ZodType, io: "input" | "output"): Json {
  const described: Json = { ...z.toJSONSchema(schema, { io, unrepresentable: "any" }) };
  delete described.$schema;
  return described;
}

const problemSchema = schemaOf(
  z.object({
    type: z.string(),
    title: z.string(),
    status: z.int(),
    detail: z.string(),
    errors: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
    current: z.unknown().optional(),
  }),
  "output",
);
