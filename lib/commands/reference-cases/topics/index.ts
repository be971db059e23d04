import type { Fields, ReferenceCase } from "../case-format";
import { averageSizeFields } from "./average-size";
import { detectionFields } from "./detection";
import { equalSizeFields } from "./equal-size";
import { exactLimitFields } from "./exact-limits";
import { intervalFields } from "./intervals";
import { overdispersedFields } from "./overdispersed";
import { proportionFields } from "./proportions";
import { rateFields } from "./rates";
import { runRuleFields } from "./run-rules";

/** By a topic's letter: everything that the product works out from a case, under the names of its expectation. */
export const topics: Partial<Record<string, (referenceCase: ReferenceCase) => Fields>> = {
  a: proportionFields,
  b: averageSizeFields,
  c: rateFields,
  d: equalSizeFields,
  e: exactLimitFields,
  f: overdispersedFields,
  h: runRuleFields,
  i: detectionFields,
  l: intervalFields,
};
