import {
  ACTION_SIGMAS,
  centreLine,
  evaluateSeries,
  overdispersion,
  type CountModel,
  type LimitMethod,
  type SeriesEvaluation,
} from "@/lib/limits";
import type { Fields, ReferenceCase } from "../case-format";
import { columnIn, maskIn, numberIn, positionsWhere, scaled } from "../read-fields";

/** Topic f: Laney's charts, through the evaluation that every page calls. Its limits have one width, k = 3. */
export function overdispersedFields({ input }: ReferenceCase): Fields {
  if (numberIn(input, "k", ACTION_SIGMAS) !== ACTION_SIGMAS) return {};
  const model: CountModel = input.chart === "u-prime" ? "poisson" : "binomial";
  const per = numberIn(input, "per", 1);
  const counts = { numerators: columnIn(input, "x"), denominators: columnIn(input, "n_or_exposure") };
  const length = counts.numerators.length;
  const inBaseline = maskIn(input, "baseline", length);
  const { centre } = centreLine(counts, inBaseline);
  if (centre === null) return { center: null, sigma_z: null };
  const evaluate = (method: LimitMethod): SeriesEvaluation =>
    evaluateSeries({
      model,
      counts,
      segments: [{ start: 0, end: length, inBaseline, method }],
      rules: [],
      betterWhen: "lower",
    });
  const laney = evaluate("overdispersed");
  const spread = overdispersion(model, counts, centre, inBaseline);
  const exactConstant = overdispersion(model, counts, centre, inBaseline, 2 / Math.sqrt(Math.PI));
  return {
    center: centre * per,
    z: scaled(laney.z),
    moving_ranges: scaled(spread.movingRanges),
    mean_moving_range: spread.meanMovingRange,
    sigma_z: laney.segments[0]?.sigmaZ ?? null,
    sigma_z_with_d2_2_over_sqrt_pi: exactConstant.sigmaZ,
    ucl: scaled(laney.upperAction, per),
    lcl: scaled(laney.lowerAction, per),
    beyond_action: positionsWhere(laney.beyondAction),
    beyond_action_without_sigma_z: positionsWhere(evaluate("three-sigma").beyondAction),
    skipped: positionsWhere(Uint8Array.from(laney.values, (value) => (Number.isNaN(value) ? 1 : 0))),
  };
}
