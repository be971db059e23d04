import {
  binomialMass,
  ruleOfThree,
  signallingCounts,
  smallestDetectableDenominator,
  upperTail,
  zeroEventBound,
  type LimitBasis,
  type LimitMethod,
} from "@/lib/limits";
import { ACTION_SIGMAS } from "@/lib/limits/constants";
import { rateHalfWidth } from "@/lib/limits/count-sigma";
import type { Fields, ReferenceCase } from "../case-format";
import { hasNumber, numberIn, rowsIn } from "../read-fields";

/** Topic i: smallest denominators, zero events, power; rows carry their inputs. */
export function detectionFields({ expected }: ReferenceCase): Fields {
  const rows = rowsIn(expected).map(rowFields);
  return rows.some((row) => Object.keys(row).length > 0) ? { rows } : {};
}

function rowFields(row: Fields): Fields {
  if ("smallest_n_positive_lcl" in row) return smallestFields(row);
  if ("prob_zero" in row) return { prob_zero: binomialMass(0, numberIn(row, "n"), numberIn(row, "p")) };
  if ("zero_event_upper" in row) return zeroFields(numberIn(row, "n"));
  if (hasNumber(row, "p0") && hasNumber(row, "p1")) return powerFields(row);
  return {};
}

function basisOf(centre: number, method: LimitMethod, sigmaZ: number | null = null): LimitBasis {
  return { model: "binomial", centre, method, sigmaZ };
}

/** Limits of k sigma are 3-sigma limits of a σ_z of k/3. */
function smallestFields(row: Fields): Fields {
  const centre = numberIn(row, "num") / numberIn(row, "den");
  const basis = basisOf(centre, "overdispersed", numberIn(row, "k", ACTION_SIGMAS) / ACTION_SIGMAS);
  return { smallest_n_positive_lcl: smallestDetectableDenominator(basis, "lower") };
}

function zeroFields(n: number): Fields {
  return {
    zero_event_upper: zeroEventBound("binomial", n),
    two_sided: zeroEventBound("binomial", n, 0.975),
    rule_of_three: ruleOfThree(n),
    poisson: zeroEventBound("poisson", n),
  };
}

function powerFields(row: Fields): Fields {
  const n = numberIn(row, "n");
  const p0 = numberIn(row, "p0");
  const p1 = numberIn(row, "p1");
  const sigma = signallingCounts(basisOf(p0, "three-sigma"), n).high;
  const exact = signallingCounts(basisOf(p0, "exact"), n).high;
  const chance = (count: number | null, p: number) =>
    count === null ? 0 : upperTail("binomial", count, n, p);
  return {
    ucl: p0 + rateHalfWidth("binomial", n, p0, ACTION_SIGMAS),
    smallest_signal_count: sigma,
    power: chance(sigma, p1),
    false_alarm: chance(sigma, p0),
    exact_smallest_signal_count: exact,
    exact_power: chance(exact, p1),
    exact_false_alarm: chance(exact, p0),
  };
}
