import type { Fields, ReferenceCase } from "../case-format";
import { columnIn, maskIn, numberIn } from "../read-fields";
import { sigmaChartFields } from "./sigma-chart";

/** Topic a: p charts with a denominator of their own each month. */
export function proportionFields({ input }: ReferenceCase): Fields {
  const numerators = columnIn(input, "x");
  return sigmaChartFields({
    model: "binomial",
    counts: { numerators, denominators: columnIn(input, "n") },
    inBaseline: maskIn(input, "baseline", numerators.length),
    action: numberIn(input, "k", 3),
    warning: numberIn(input, "k_warning", 2),
    per: 1,
  });
}
