import { cChartLimits, centreLine, npChartLimits, sigmaVerdict, type CountColumns } from "@/lib/limits";
import type { Fields, ReferenceCase } from "../case-format";
import { columnIn, maskIn, numberIn } from "../read-fields";

/** Topic d: np and c charts, the equal-size special cases, on the scale of counts. */
export function equalSizeFields({ input }: ReferenceCase): Fields {
  const isNp = input.chart === "np";
  if (!isNp && input.chart !== "c") return {};
  const numerators = columnIn(input, "x");
  const size = isNp ? numberIn(input, "n") : 1;
  const model = isNp ? "binomial" : "poisson";
  const counts: CountColumns = {
    numerators,
    denominators: new Float64Array(numerators.length).fill(size),
  };
  const { centre } = centreLine(counts, maskIn(input, "baseline", numerators.length));
  if (centre === null) return { center: null };
  const sigmas = { action: numberIn(input, "k", 3), warning: numberIn(input, "k_warning", 2) };
  const action = isNp ? npChartLimits(centre, size, sigmas.action) : cChartLimits(centre, sigmas.action);
  const warning = isNp ? npChartLimits(centre, size, sigmas.warning) : cChartLimits(centre, sigmas.warning);
  const beyond = (k: number) =>
    Array.from(numerators.keys(), (slot) => slot + 1).filter((position) => {
      const count = numerators[position - 1] ?? NaN;
      return !Number.isNaN(count) && sigmaVerdict(model, count, size, centre, k) !== 0;
    });
  return {
    center: action.centre,
    sigma: action.sigma,
    ucl: action.upper,
    lcl: action.lower,
    upper_warning: warning.upper,
    lower_warning: warning.lower,
    beyond_action: beyond(sigmas.action),
    beyond_warning: beyond(sigmas.warning),
  };
}
