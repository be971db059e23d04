import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { averageDenominatorView, centreLine, type CountModel } from "@/lib/limits";
import { column, maskOf } from "./series-builder";

describe("averageDenominatorView", () => {
  it("is certain wherever it doesn't leave the decision to the month's own limit", () => {
    const months = fc.array(
      fc.integer({ min: 1, max: 400 }).chain((n) => fc.tuple(fc.nat(n), fc.constant(n))),
      { minLength: 1, maxLength: 24 },
    );
    fc.assert(
      fc.property(months, fc.constantFrom<CountModel>("binomial", "poisson"), (drawn, model) => {
        const counts = {
          numerators: column(drawn.map(([x]) => x)),
          denominators: column(drawn.map(([, n]) => n)),
        };
        const centre = centreLine(counts, maskOf(drawn.length)).centre ?? 0;
        const view = averageDenominatorView(model, counts, centre, 2);
        view.ownLimitDecides.forEach((decides, slot) => {
          if (decides === 0) expect(view.verdicts[slot]).toBe(view.ownVerdicts[slot]);
        });
      }),
    );
  });

  it("has no limits where nothing is plotted, and stops a proportion at 1", () => {
    const empty = averageDenominatorView(
      "binomial",
      { numerators: column([null]), denominators: column([4]) },
      0.5,
    );
    expect(empty).toMatchObject({ meanDenominator: null, lower: null, upper: null });
    const high = averageDenominatorView(
      "binomial",
      { numerators: column([4]), denominators: column([5]) },
      0.8,
    );
    expect(high.upper).toBe(1);
  });
});
