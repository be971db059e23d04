import type { Fields, ReferenceCase } from "../case-format";
import { columnIn, maskIn, numberIn } from "../read-fields";
import { sigmaChartFields } from "./sigma-chart";

/** Topic c: u charts with an exposure of their own each month. */
export function rateFields({ input }: ReferenceCase): Fields {
  const numerators = columnIn(input, "x");
  return sigmaChartFields({
    model: "poisson",
    counts: { numerators, denominators: columnIn(input, "exposure") },
    inBaseline: maskIn(input, "baseline", numerators.length),
    action: numberIn(input, "k", 3),
    warning: numberIn(input, "k_warning", 2),
    per: numberIn(input, "per", 1),
  });
}
