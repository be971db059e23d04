import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { envNames, parseEnv } from "@/lib/config/env";

const example = readFileSync(".env.example", "utf8");
const pairs = example
  .split("\n")
  .filter((line) => /^[A-Z_]+=/.test(line))
  .map((line): [name: string, value: string] => {
    const at = line.indexOf("=");
    return [line.slice(0, at), line.slice(at + 1)];
  });

describe("the environment", () => {
  it("is named in .env.example, every variable once and none besides", () => {
    expect(pairs.map(([name]) => name).sort()).toEqual([...envNames].sort());
  });

  it("can be started with what .env.example says", () => {
    const values: Record<string, string> = Object.fromEntries(pairs);
    expect(parseEnv(values)).toEqual(parseEnv({}));
  });

  it("names every wrong variable in one error", () => {
    const parse = () => parseEnv({ NEXTAUTH_SECRET: "short", PORT: "door", DATABASE_URL: "mysql://x" });
    for (const name of ["NEXTAUTH_SECRET", "PORT", "DATABASE_URL"])
      expect(parse).toThrowError(new RegExp(name));
  });

  it("takes empty text as not set", () => {
    expect(parseEnv({ PORT: "" }).PORT).toBe("3000");
  });
});
