import { expect } from "vitest";
import type { Reply } from "@/tests/support/http-client";

const STACK = /\n\s+at .+:\d+:\d+|node_modules|\.next\/server|lib\/services\//;

/** What holds for every answer under /api, whoever asks for whatever. */
export function expectDecent(reply: Reply, what: string): void {
  const text = typeof reply.body === "string" ? reply.body : JSON.stringify(reply.body);
  expect(reply.status, `${what}: ${text.slice(0, 300)}`).toBeLessThan(500);
  expect(text, what).not.toMatch(STACK);
  const { headers } = reply;
  expect(headers.get("cache-control"), what).toBe("no-store");
  expect(headers.get("x-content-type-options"), what).toBe("nosniff");
  expect(headers.get("referrer-policy"), what).toBe("same-origin");
  expect(headers.get("x-frame-options"), what).toBe("DENY");
  expect(headers.get("cross-origin-resource-policy"), what).toBe("same-origin");
  expect(headers.get("permissions-policy"), what).toContain("camera=()");
  expect(headers.get("content-security-policy"), what).toMatch(/^default-src 'none'/);
  expect(headers.get("x-powered-by"), what).toBeNull();
}

/** The same, and a refusal with this status, said as a problem document. */
export function expectProblem(reply: Reply, status: number, what: string): void {
  expectDecent(reply, what);
  expect(reply.status, `${what}: ${JSON.stringify(reply.body).slice(0, 300)}`).toBe(status);
  expect(reply.headers.get("content-type"), what).toBe("application/problem+json");
  expect(reply.body, what).toMatchObject({
    type: expect.stringMatching(/^\/problems\//) as string,
    title: expect.any(String) as string,
    status,
    detail: expect.any(String) as string,
  });
}
