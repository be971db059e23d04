/** The closed list of expected failures; anything else is a bug and answers 500. */
export const errorCodes = [
  "not-found",
  "forbidden",
  "unauthenticated",
  "conflict",
  "stale",
  "invalid",
  "too-large",
  "unsupported-type",
  "rate-limited",
  "precondition",
] as const;

export type ErrorCode = (typeof errorCodes)[number];

/** One thing to put right: where it is (dotted path or cell) and what to do, in words for the reader. */
export interface FieldError {
  path: string;
  message: string;
}

export interface DomainErrorDetails {
  errors?: FieldError[];
  /** The current record, sent back with `stale` so that both values can be shown side by side. */
  current?: unknown;
  /** Seconds to wait, with `rate-limited`. */
  retryAfter?: number;
}

/**
 * An expected outcome that is not success. Services throw it; one table in lib/http turns it into a problem
 * document, and pages into the matching error page.
 */
export class DomainError extends Error {
  readonly code: ErrorCode;
  readonly errors: FieldError[];
  readonly current: unknown;
  readonly retryAfter: number | undefined;

  constructor(code: ErrorCode, message: string, details: DomainErrorDetails = {}) {
    super(message);
    this.name = "DomainError";
    this.code = code;
    this.errors = details.errors ?? [];
    this.current = details.current;
    this.retryAfter = details.retryAfter;
  }
}

/** True for DomainErrors of the given code, also across module copies made by a bundler. */
export function isDomainError(error: unknown, code?: ErrorCode): error is DomainError {
  if (!(error instanceof Error) || error.name !== "DomainError") return false;
  return code === undefined || (error as DomainError).code === code;
}
