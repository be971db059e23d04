"use client";

import useSWR, { type SWRConfiguration, type SWRResponse } from "swr";
import { sendingWords } from "@/lib/strings/sending";

/** A problem document as the API sends it (RFC 9457); status 0 where no answer came at all. */
export interface ApiProblem {
  type: string;
  title: string;
  status: number;
  detail: string;
  errors?: { path: string; message: string }[];
  /** The record as it stands now, where somebody else changed it meanwhile. */
  current?: unknown;
}

export type Sent<Data> = { ok: true; data: Data; status: number } | { ok: false; problem: ApiProblem };

type Method = "POST" | "PUT" | "PATCH" | "DELETE";

/** Thrown by the SWR fetcher, so that `error.problem` can be shown. */
export class ApiError extends Error {
  constructor(readonly problem: ApiProblem) {
    super(problem.detail);
    this.name = "ApiError";
  }
}

/** Sends a change to the API as JSON. Never throws: what went wrong comes back as a problem to show. */
export async function sendJson<Data = unknown>(
  method: Method,
  url: string,
  body?: unknown,
): Promise<Sent<Data>> {
  return request<Data>(url, {
    method,
    headers: body === undefined ? {} : { "Content-Type": "application/json" },
    body: body === undefined ? undefined : JSON.stringify(body),
  });
}

/** Sends a file or another form body; the browser names the content type. */
export async function sendForm<Data = unknown>(url: string, body: FormData): Promise<Sent<Data>> {
  return request<Data>(url, { method: "POST", body });
}

/** Reads one API address; throws ApiError, as SWR wants it. */
export async function getJson<Data>(url: string): Promise<Data> {
  const sent = await request<Data>(url, { method: "GET" });
  if (!sent.ok) throw new ApiError(sent.problem);
  return sent.data;
}

/** SWR over one API address; null waits. */
export function useApi<Data>(
  url: string | null,
  options?: SWRConfiguration<Data, ApiError>,
): SWRResponse<Data, ApiError> {
  return useSWR<Data, ApiError>(url, getJson<Data>, options);
}

/** Splits a problem for a form: messages for the fields that it has, and what is left to say above it. */
export function problemForForm<Name extends string>(
  problem: ApiProblem,
  fields: readonly Name[],
): { fieldErrors: { name: Name; message: string }[]; rest: string | null } {
  const isField = (path: string): path is Name => (fields as readonly string[]).includes(path);
  const errors = (problem.errors ?? []).map((error) => ({ ...error, path: error.path.split(".")[0] ?? "" }));
  const fieldErrors = errors.flatMap(({ path, message }) => (isField(path) ? [{ name: path, message }] : []));
  const elsewhere = errors.filter((error) => !isField(error.path)).map((error) => error.message);
  if (elsewhere.length > 0) return { fieldErrors, rest: elsewhere.join(" ") };
  return { fieldErrors, rest: fieldErrors.length > 0 ? null : problem.detail };
}

async function request<Data>(url: string, init: RequestInit): Promise<Sent<Data>> {
  let response: Response;
  try {
    response = await fetch(url, { ...init, credentials: "same-origin", cache: "no-store" });
  } catch {
    return { ok: false, problem: problem(0, sendingWords.noConnectionTitle, sendingWords.noConnection) };
  }
  const content: unknown = await response.json().catch(() => undefined);
  if (!response.ok) {
    const unknown = problem(response.status, sendingWords.unreadableTitle, sendingWords.unreadable);
    return { ok: false, problem: isProblem(content) ? content : unknown };
  }
  return { ok: true, data: trusted<Data>(content), status: response.status };
}

/** Safe because the server parsed the reply with the route's response schema before sending it. */
function trusted<Data>(content: unknown): Data {
  return content as Data;
}

function isProblem(content: unknown): content is ApiProblem {
  return typeof content === "object" && content !== null && "detail" in content && "status" in content;
}

function problem(status: number, title: string, detail: string): ApiProblem {
  return { type: "about:blank", title, status, detail };
}
