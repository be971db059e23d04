import { describe, expect, it } from "vitest";
import { createWardSchema, updateWardSchema, wardParams } from "@/lib/schemas/ward";

const ward = { code: "osier-1", name: " Osier ", division: "Medicine", openFrom: "2024-01" };
const pathsOf = (schema: typeof createWardSchema | typeof updateWardSchema, value: unknown) =>
  schema.safeParse(value).error?.issues.map((issue) => issue.path.join("."));

describe("a new ward", () => {
  it("keeps its code in capitals, trims, and is open for good unless told", () => {
    expect(createWardSchema.parse(ward)).toEqual({
      code: "OSIER-1",
      name: "Osier",
      division: "Medicine",
      openFrom: "2024-01",
      openTo: null,
    });
  });

  it.each([
    ["code", "HOSPITAL"],
    ["code", "hospital"],
    ["code", "TWO WORDS"],
    ["code", "A-CODE-OF-17-LONG"],
    ["code", ""],
    ["name", "   "],
    ["name", "bad\u0000byte"],
    ["division", undefined],
    ["openFrom", "2024-13"],
    ["openFrom", 202401],
    ["openTo", "2023-12"],
  ])("refuses %s %j at its field", (field, value) => {
    expect(pathsOf(createWardSchema, { ...ward, [field]: value })).toEqual([field]);
  });
});

describe("a change of a ward", () => {
  it("takes the version that was seen, and needs nothing", () => {
    expect(updateWardSchema.parse({ version: 3 })).toEqual({ version: 3 });
    expect(updateWardSchema.parse({ name: "Osier" })).toEqual({ name: "Osier" });
  });

  it("tells a month taken away from one left out", () => {
    expect(updateWardSchema.parse({ version: 1, openTo: null })).toEqual({ version: 1, openTo: null });
  });

  it("refuses months the wrong way round", () => {
    expect(pathsOf(updateWardSchema, { version: 1, openFrom: "2025-01", openTo: "2024-12" })).toEqual([
      "openTo",
    ]);
  });
});

it("an address with a small code means the same ward", () => {
  expect(wardParams.parse({ code: "osier" })).toEqual({ code: "OSIER" });
});
