import { describe, expect, it } from "vitest";
import { defaultRules } from "@/lib/indicators/vocabulary";
import { createIndicatorSchema, ruleSchema, updateIndicatorSchema } from "@/lib/schemas/indicator";

const proportion = {
  code: "readm",
  name: "Readmissions",
  numeratorLabel: "Readmitted within 30 days",
  denominatorLabel: "Discharges",
  kind: "proportion",
  betterWhen: "lower",
  team: "quality",
};
const pathsOf = (value: unknown) =>
  createIndicatorSchema.safeParse(value).error?.issues.map((issue) => issue.path.join("."));

describe("a new indicator", () => {
  it("fills in what is left out", () => {
    expect(createIndicatorSchema.parse(proportion)).toMatchObject({
      code: "READM",
      per: 100,
      limits: "auto",
      numeratorBy: "ward",
      matureAfterDays: 0,
      sharedDenominator: null,
      rules: defaultRules,
      target: null,
      attribution: "",
    });
  });

  it("asks a rate per how many it is shown", () => {
    expect(pathsOf({ ...proportion, kind: "rate" })).toEqual(["per"]);
    expect(createIndicatorSchema.parse({ ...proportion, kind: "rate", per: 1000 }).per).toBe(1000);
  });

  it.each([
    ["kind", "ratio"],
    ["betterWhen", "up"],
    ["team", "nursing"],
    ["limits", "fixed"],
    ["per", 0],
    ["per", 12.5],
    ["per", "100"],
    ["matureAfterDays", -1],
    ["matureAfterDays", 367],
    ["target", -0.1],
    ["target", 1.2],
    ["target", Number.NaN],
    ["sharedDenominator", "BED DAYS"],
    ["numeratorLabel", " "],
    ["rules", []],
    ["rules", ["one-side", { name: "one-side", length: 9 }]],
  ])("refuses %s %j at its field", (field, value) => {
    expect(pathsOf({ ...proportion, [field]: value })).toEqual([field]);
  });

  it("takes a target above 1 for a rate alone", () => {
    expect(pathsOf({ ...proportion, kind: "rate", per: 1000, target: 1.2 })).toBeUndefined();
  });
});

describe("a rule", () => {
  it("is a name, or a name with its run length", () => {
    expect(ruleSchema.parse("beyond-action")).toEqual({ name: "beyond-action" });
    expect(ruleSchema.parse("one-side")).toEqual({ name: "one-side", length: 8 });
    expect(ruleSchema.parse({ name: "trend", length: 7 })).toEqual({ name: "trend", length: 7 });
  });

  it.each([
    "sudden",
    { name: "one-side", length: 5 },
    { name: "trend", length: 6.5 },
    { name: "two-of-three", length: 4 },
  ])("refuses %j", (rule) => {
    expect(ruleSchema.safeParse(rule).success).toBe(false);
  });
});

describe("a change of an indicator", () => {
  it("takes the version that was seen, needs nothing, and fills nothing in", () => {
    expect(updateIndicatorSchema.parse({ version: 2, limits: "exact" })).toEqual({
      version: 2,
      limits: "exact",
    });
    expect(updateIndicatorSchema.parse({ limits: "exact" })).toEqual({ limits: "exact" });
  });
});
