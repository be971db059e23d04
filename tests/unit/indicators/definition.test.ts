import { describe, expect, it } from "vitest";
import { isReportedIn, reportedMonths } from "@/lib/indicators/assigned-months";
import { comparisonBreaks, definitionFor, newestDefinition } from "@/lib/indicators/definition";
import { decideDefinition } from "@/lib/indicators/definition-change";
import {
  decideSettings,
  reevaluationNeeded,
  type IndicatorSettings,
} from "@/lib/indicators/definition-settings";
import { asMonth } from "@/lib/indicators/month";

const version = (number: number, effectiveFrom: string, comparable = true) => ({
  number,
  effectiveFrom: asMonth(effectiveFrom),
  comparable,
});
const versions = [version(2, "2025-06", false), version(1, "2023-12"), version(3, "2027-01")];

describe("the definition of a month", () => {
  it.each([
    ["2023-01", 1],
    ["2023-12", 1],
    ["2025-05", 1],
    ["2025-06", 2],
    ["2026-12", 2],
    ["2027-01", 3],
    ["2099-01", 3],
  ])("%s is counted under version %i", (month, number) => {
    expect(definitionFor(versions, asMonth(month)).number).toBe(number);
  });

  it("needs a definition", () => {
    expect(() => definitionFor([], asMonth("2025-01"))).toThrow(RangeError);
    expect(() => newestDefinition([])).toThrow(RangeError);
  });

  it("finds the newest, and where months can't be compared", () => {
    expect(newestDefinition(versions).number).toBe(3);
    expect(comparisonBreaks(versions)).toEqual(["2025-06"]);
    expect(comparisonBreaks([version(1, "2020-01", false)])).toEqual([]);
  });
});

describe("a change of the words", () => {
  const newest = {
    ...version(2, "2025-06"),
    numeratorLabel: "Missed",
    denominatorLabel: "Seen",
    attribution: "",
  };
  const complete = { effectiveFrom: asMonth("2025-07"), comparable: false, reason: "Review" };

  it("makes the next version and keeps the words left out", () => {
    expect(decideDefinition(newest, { ...complete, denominatorLabel: "Observed" })).toEqual({
      number: 3,
      numeratorLabel: "Missed",
      denominatorLabel: "Observed",
      attribution: "",
      ...complete,
    });
  });

  it("is none where every word stays", () => {
    expect(decideDefinition(newest, { numeratorLabel: "Missed", reason: "For the record" })).toBeNull();
  });

  it.each([
    [{ ...complete }, ["effectiveFrom"]],
    [{ comparable: true }, ["comparable"]],
    [{ numeratorLabel: "All" }, ["effectiveFrom", "comparable", "reason"]],
    [{ ...complete, numeratorLabel: "All", effectiveFrom: asMonth("2025-06") }, ["effectiveFrom"]],
    [{ ...complete, numeratorLabel: "All", reason: undefined }, ["reason"]],
  ])("refuses %j", (change, paths) => {
    let refused: unknown;
    try {
      decideDefinition(newest, change);
    } catch (error) {
      refused = error;
    }
    expect(refused).toMatchObject({ code: "invalid", errors: paths.map((path) => ({ path })) });
  });
});

describe("a change of the settings", () => {
  const before: IndicatorSettings = {
    name: "Falls",
    kind: "rate",
    per: 1000,
    betterWhen: "lower",
    team: "quality",
    numeratorBy: "ward",
    matureAfterDays: 0,
    sharedDenominator: "BED-DAYS",
    limits: "auto",
    rules: [{ name: "beyond-action" }],
    target: 2,
  };

  it("names what changes, what can't stand together and what counts fix", () => {
    const decision = decideSettings(before, { kind: "proportion", sharedDenominator: null, per: 1000 });
    expect(decision.changed).toEqual(["kind", "sharedDenominator"]);
    expect(decision.problems).toMatchObject([{ path: "target" }]);
    expect(decision.fixedOnceCounted).toMatchObject([{ path: "kind" }, { path: "sharedDenominator" }]);
    expect(decideSettings(before, { target: null }).settings.target).toBeNull();
    expect(decideSettings(before, {}).changed).toEqual([]);
  });

  it("asks for a new look at the series only where verdicts can change", () => {
    expect(reevaluationNeeded(["name", "per", "target", "team", "numeratorBy"], false)).toBeNull();
    expect(reevaluationNeeded(["rules"], false)).toBe("rules");
    expect(reevaluationNeeded(["limits", "matureAfterDays"], false)).toBe("definition");
    expect(reevaluationNeeded([], true)).toBe("definition");
  });
});

describe("months in which a ward reports an indicator", () => {
  const ward = { openFrom: asMonth("2024-01"), openTo: asMonth("2026-06") };

  it("are those of the assignment in which the ward is open", () => {
    expect(reportedMonths(ward, { fromMonth: asMonth("2023-01"), toMonth: null })).toEqual({
      from: "2024-01",
      to: "2026-06",
    });
    const bounded = { fromMonth: asMonth("2025-01"), toMonth: asMonth("2025-06") };
    expect(reportedMonths({ ...ward, openTo: null }, bounded)).toEqual({ from: "2025-01", to: "2025-06" });
    expect(isReportedIn(ward, bounded, asMonth("2025-06"))).toBe(true);
    expect(isReportedIn(ward, bounded, asMonth("2025-07"))).toBe(false);
    expect(isReportedIn(ward, bounded, asMonth("2024-12"))).toBe(false);
  });
});
