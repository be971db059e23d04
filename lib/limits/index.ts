/** What the rest of the program uses of this folder; the pieces behind it are imported by their own files. */
export { averageDenominatorView, type AverageDenominatorView } from "./average-denominator";
export {
  isBelowDetection,
  monthsToPool,
  smallestDetectableDenominator,
  type BetterWhen,
} from "./below-detection";
export { binomialMass } from "./binomial-mass";
export {
  binomialLogLowerTail,
  binomialLogUpperTail,
  binomialLowerTail,
  binomialUpperTail,
} from "./binomial-tails";
export { byarInterval } from "./byar-interval";
export { cChartLimits } from "./c-chart";
export { centreLine, type CentreLine } from "./centre-line";
export * from "./constants";
export { chanceOfCount, lowerTail, upperTail, type CountChance } from "./count-tails";
export { detectableRate } from "./detectable-rate";
export { evaluateSeries } from "./evaluate-series";
export { clopperPearsonInterval, garwoodInterval } from "./exact-interval";
export { exactLimit, markExactLimits } from "./exact-limits";
export { pooledChance, runChance, sideChance, type PooledChance } from "./joint-chance";
export { existsBasis, limitBasis, sigmaScale, type LimitBasis } from "./limit-basis";
export { midPInterval } from "./mid-p-interval";
export { midPSignals, type SignallingCounts } from "./mid-p-signals";
export { normalQuantile } from "./normal-quantile";
export { npChartLimits, type CountLimitLine } from "./np-chart";
export { overdispersion, type Overdispersion } from "./overdispersion";
export { pChartLimits, type LimitColumns } from "./p-chart";
export { poissonMass } from "./poisson-mass";
export {
  poissonLogLowerTail,
  poissonLogUpperTail,
  poissonLowerTail,
  poissonUpperTail,
} from "./poisson-tails";
export { rateForLowerTail, rateForUpperTail } from "./rate-for-tail";
export { isSmallCount, settleMethod } from "./settle-method";
export { sigmaVerdict } from "./sigma-verdict";
export { falseAlarmChance, signallingCounts } from "./signalling-counts";
export type * from "./types";
export { uChartLimits } from "./u-chart";
export { wilsonInterval, type Interval } from "./wilson-interval";
export { ruleOfThree, zeroEventBound } from "./zero-event-bound";
export { zScore } from "./z-score";
