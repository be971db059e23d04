import { createHash } from "node:crypto";
import { describe, expect, it } from "vitest";
import { contentPolicy } from "@/lib/http/content-policy";

const directives = (isDevelopment: boolean) =>
  new Map(
    contentPolicy("abc", isDevelopment)
      .split("; ")
      .map((directive) => [directive.split(" ")[0] ?? "", directive.split(" ").slice(1)] as const),
  );

describe("the content policy of a page", () => {
  it("runs nothing without this reply's nonce and reaches no other host", () => {
    const policy = directives(false);
    expect(policy.get("script-src")).toEqual(["'nonce-abc'", "'strict-dynamic'"]);
    for (const [name, values] of policy) {
      const known = ["'self'", "'none'", "data:", "'nonce-abc'", "'strict-dynamic'"];
      const foreign = values.filter((value) => !known.includes(value) && !value.startsWith("'sha256-"));
      expect([name, foreign]).toEqual([name, []]);
    }
    expect(policy.get("frame-ancestors")).toEqual(["'none'"]);
    expect(policy.get("base-uri")).toEqual(["'none'"]);
  });

  it("lets an empty style element pass, and no other text", () => {
    const empty = createHash("sha256").update("").digest("base64");
    expect(directives(false).get("style-src")).toEqual(["'self'", "'nonce-abc'", `'sha256-${empty}'`]);
  });

  it("allows eval to the development server alone", () => {
    expect(directives(true).get("script-src")).toContain("'unsafe-eval'");
    expect(directives(false).get("script-src")).not.toContain("'unsafe-eval'");
  });
});
