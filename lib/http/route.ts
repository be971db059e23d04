import "server-only";
import { uuidv7 } from "uuidv7";
import type { z } from "zod";
import { getDb } from "@/db/client";
import type { Ctx } from "@/db/transaction";
import { currentActor } from "@/lib/auth/current-actor";
import { now } from "@/lib/config/clock";
import { DomainError, type FieldError } from "@/lib/errors";
import { problemResponse } from "./problem";
import { readJson } from "./read-body";
import { requireSameOrigin } from "./same-origin";

type Schema = z.ZodType;
type Parsed<S> = S extends Schema ? z.output<S> : undefined;

export interface RouteInput<P, Q, B> {
  ctx: Ctx;
  params: Parsed<P>;
  query: Parsed<Q>;
  body: Parsed<B>;
  /** For uploads; JSON bodies come parsed in `body`. */
  request: Request;
}

export interface RouteDefinition<P, Q, B, R> {
  /** One line for the API's description. */
  summary: string;
  /** Path parameters; one that doesn't parse is an unknown address, 404. */
  params?: P;
  query?: Q;
  body?: B;
  /** What is sent back; anything that it doesn't name is left out. Files are sent as a Response instead. */
  response?: R;
  /** Status of a success; 200 unless given. */
  status?: number;
  /** Only health, sign-in and invitations answer whoever asks. */
  openToAnyone?: boolean;
  /** Largest JSON body in bytes. */
  limit?: number;
  run: (input: RouteInput<P, Q, B>) => Promise<(R extends Schema ? z.input<R> : never) | Response>;
}

export interface RouteMeta {
  summary: string;
  params?: Schema;
  query?: Schema;
  body?: Schema;
  response?: Schema;
  status: number;
  openToAnyone: boolean;
}

export interface RouteHandler {
  (request: Request, context: { params: Promise<Record<string, string | string[]>> }): Promise<Response>;
  /** What the handler takes and gives: the OpenAPI document and the tests read it. */
  route: RouteMeta;
}

const DEFAULT_LIMIT = 64 * 1024;

/**
 * The one way to answer an API call: who is it, same origin, parse, one verb or read, response schema; every error
 * through one table. A route file has no `try`, no SQL and no role name.
 */
export function route<
  P extends Schema | undefined = undefined,
  Q extends Schema | undefined = undefined,
  B extends Schema | undefined = undefined,
  R extends Schema | undefined = undefined,
>(definition: RouteDefinition<P, Q, B, R>): RouteHandler {
  const handler = async (
    request: Request,
    context: { params: Promise<Record<string, string | string[]>> },
  ): Promise<Response> => {
    const requestId = uuidv7();
    try {
      const actor = await currentActor();
      if (actor.kind === "anonymous" && !definition.openToAnyone) {
        throw new DomainError("unauthenticated", "Sign in first.");
      }
      requireSameOrigin(request);
      const params = parsePart(definition.params, await context.params, notThere);
      const query = parsePart(definition.query, queryOf(request), needsFixing);
      const body = definition.body
        ? parsePart(definition.body, await readJson(request, definition.limit ?? DEFAULT_LIMIT), needsFixing)
        : undefined;
      const ctx: Ctx = { actor, db: await getDb(), now: now(), requestId };
      const result = await definition.run({
        ctx,
        params: params as Parsed<P>,
        query: query as Parsed<Q>,
        body: body as Parsed<B>,
        request,
      });
      if (result instanceof Response) return personal(result);
      const sent = definition.response ? definition.response.parse(result) : null;
      return personal(Response.json(sent, { status: definition.status ?? 200 }));
    } catch (error) {
      return problemResponse(error, requestId);
    }
  };
  const meta: RouteMeta = {
    summary: definition.summary,
    params: definition.params,
    query: definition.query,
    body: definition.body,
    response: definition.response,
    status: definition.status ?? 200,
    openToAnyone: definition.openToAnyone ?? false,
  };
  return Object.assign(handler, { route: meta });
}

/** Every reply may hold what only this person may see. */
function personal(response: Response): Response {
  response.headers.set("Cache-Control", "no-store");
  return response;
}

/** Repeated parameters arrive as arrays, which single-value schemas refuse. */
function queryOf(request: Request): Record<string, string | string[]> {
  const search = new URL(request.url).searchParams;
  const entries = [...new Set(search.keys())].map((key) => {
    const values = search.getAll(key);
    return [key, values.length === 1 ? (values[0] ?? "") : values] as const;
  });
  return Object.fromEntries(entries);
}

function parsePart(
  schema: Schema | undefined,
  value: unknown,
  fail: (issues: FieldError[]) => DomainError,
): unknown {
  if (!schema) return undefined;
  const result = schema.safeParse(value);
  if (result.success) return result.data;
  throw fail(
    result.error.issues.map((issue) => ({ path: issue.path.map(String).join("."), message: issue.message })),
  );
}

const notThere = () => new DomainError("not-found", "There is no such record.");
const needsFixing = (errors: FieldError[]) =>
  new DomainError("invalid", errors[0]?.message ?? "Something needs fixing.", { errors });
