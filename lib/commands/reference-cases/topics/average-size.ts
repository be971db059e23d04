import { averageDenominatorView, centreLine, pChartLimits } from "@/lib/limits";
import type { Fields, ReferenceCase } from "../case-format";
import { columnIn, maskIn, numberIn, positionsWhere } from "../read-fields";

/** Topic b: limits at the mean size, where they can mislead, and limits at set sizes. */
export function averageSizeFields({ input }: ReferenceCase): Fields {
  const counts = { numerators: columnIn(input, "x"), denominators: columnIn(input, "n") };
  const sigmas = numberIn(input, "k", 3);
  const { centre } = centreLine(counts, maskIn(input, "baseline", counts.numerators.length));
  if (centre === null) return { center: null };
  const view = averageDenominatorView("binomial", counts, centre, sigmas);
  const sizes = input.posted_sizes === undefined ? new Float64Array() : columnIn(input, "posted_sizes");
  const posted = pChartLimits(centre, sizes, sigmas);
  return {
    center: centre,
    nbar: view.meanDenominator,
    lcl_average: view.lower,
    ucl_average: view.upper,
    beyond_average_limits: positionsWhere(view.verdicts),
    beyond_exact_limits: positionsWhere(view.ownVerdicts),
    needs_exact_check: positionsWhere(view.ownLimitDecides),
    verdict_differs: positionsWhere(
      view.verdicts.map((verdict, slot) => verdict - (view.ownVerdicts[slot] ?? 0)),
    ),
    posted_limits: Array.from(sizes, (n, slot) => ({ n, lcl: posted.lower[slot], ucl: posted.upper[slot] })),
  };
}
