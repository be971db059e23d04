import { isDomainError, type DomainError, type ErrorCode, type FieldError } from "@/lib/errors";

/** The one table from expected failures to HTTP. */
const statusOf: Record<ErrorCode, number> = {
  unauthenticated: 401,
  forbidden: 403,
  "not-found": 404,
  conflict: 409,
  stale: 409,
  precondition: 409,
  "too-large": 413,
  "unsupported-type": 415,
  invalid: 422,
  "rate-limited": 429,
};

const titleOf: Record<ErrorCode, string> = {
  unauthenticated: "Not signed in",
  forbidden: "Not allowed",
  "not-found": "Not found",
  conflict: "Conflict",
  stale: "Changed meanwhile",
  precondition: "Not possible now",
  "too-large": "Too large",
  "unsupported-type": "Wrong type of content",
  invalid: "Needs fixing",
  "rate-limited": "Too many tries",
};

export interface Problem {
  type: string;
  title: string;
  status: number;
  detail: string;
  errors?: FieldError[];
  current?: unknown;
}

/** RFC 9457 problem document of an expected failure. */
export function toProblem(error: DomainError): Problem {
  return {
    type: `/problems/${error.code}`,
    title: titleOf[error.code],
    status: statusOf[error.code],
    detail: error.message,
    ...(error.errors.length > 0 ? { errors: error.errors } : {}),
    ...(error.current === undefined ? {} : { current: error.current }),
  };
}

/** Answer for any thrown value: problem details for the expected, a bare 500 with a reference for a bug. */
export function problemResponse(error: unknown, requestId: string): Response {
  if (isDomainError(error)) {
    const headers: Record<string, string> = error.retryAfter
      ? { "Retry-After": String(error.retryAfter) }
      : {};
    return problemJson(toProblem(error), headers);
  }
  console.error(JSON.stringify({ event: "request.failed", requestId, error: describe(error) }));
  return problemJson({
    type: "about:blank",
    title: "Something went wrong",
    status: 500,
    detail: `Nothing was changed. Reference: ${requestId}`,
  });
}

function problemJson(problem: Problem, headers: Record<string, string> = {}): Response {
  return new Response(JSON.stringify(problem), {
    status: problem.status,
    headers: { "Content-Type": "application/problem+json", "Cache-Control": "no-store", ...headers },
  });
}

function describe(error: unknown): string {
  return error instanceof Error ? (error.stack ?? error.message) : String(error);
}
