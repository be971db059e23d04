import { describe, expect, it } from "vitest";
import { safePath } from "@/lib/auth/safe-path";

describe("safePath", () => {
  it.each(["/returns", "/charts/OSIER/FALLS?from=2026-01", "/people#x"])(
    "goes on to a page of this site: %s",
    (path) => {
      expect(safePath(path)).toBe(path.split("#")[0]);
    },
  );

  it.each([
    "https://elsewhere.example/",
    "//elsewhere.example/",
    "/\\elsewhere.example",
    "/\t/elsewhere.example",
    "/..//elsewhere.example",
    "\\\\elsewhere.example",
    "javascript:alert(1)",
    "returns",
    "",
    "/api/exports/tallies.xlsx",
    "/sign-in?from=/sign-in",
    "/_next/static/x.js",
    undefined,
    null,
    ["/returns", "/charts"],
  ])("stays at the start for %j", (wanted) => {
    expect(safePath(wanted)).toBe("/");
  });
});
