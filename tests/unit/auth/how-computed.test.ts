import { describe, expect, it } from "vitest";
import {
  example,
  fiveDecimals,
  fourDecimals,
  percent,
} from "@/app/(public)/how-computed/_components/example";

describe("the worked example of the explanation", () => {
  // By hand: 273/2877, 21/146, sqrt(0.0948905 × 0.9051095 / 146), and 9 × 0.9051095 / 0.0948905.
  it("shows figures that a pocket calculator gives", () => {
    expect([fourDecimals(example.centre), fourDecimals(example.rate)]).toEqual(["0.0949", "0.1438"]);
    expect(fiveDecimals(example.standardError)).toBe("0.02425");
    expect([percent(example.action.lower), percent(example.action.upper)]).toEqual(["2.2%", "16.8%"]);
    expect([percent(example.warning.lower), percent(example.warning.upper)]).toEqual(["4.6%", "14.3%"]);
    expect(Math.ceil(example.leastToShowFall)).toBe(86);
  });

  it("is the month that its words say: past the warning limit, inside the action limit", () => {
    expect(example.rate).toBeGreaterThan(example.warning.upper);
    expect(example.rate).toBeLessThan(example.action.upper);
  });
});
