/**
 * Twenty-five subgroups of unequal size: non-conforming purchase orders by week, the example of a p chart with
 * variable sample size in Montgomery DC, Introduction to Statistical Quality Control (Wiley), chapter on attribute
 * charts. The centre line and limits below were worked out from the definition in full precision; the book
 * prints 0.0955 for the centre, and one point beyond its limit, the eleventh.
 */
export const purchaseOrders = {
  numerators: [12, 8, 6, 9, 10, 12, 11, 16, 10, 6, 20, 15, 9, 8, 6, 8, 10, 7, 5, 8, 5, 8, 10, 6, 9],
  denominators: [
    100, 80, 80, 100, 110, 110, 100, 100, 90, 90, 110, 120, 120, 120, 110, 80, 80, 80, 90, 100, 100, 100, 100,
    90, 90,
  ],
  centre: 0.09551020408163265,
  /** By denominator: lower and upper action limit, lower and upper warning limit. */
  limits: new Map([
    [80, [0, 0.19409342051458195, 0.029788059792999783, 0.1612323483702655]],
    [90, [0.0025650562804066107, 0.18845535188285867, 0.03354677221414862, 0.15747363594911667]],
    [100, [0.007334694727773067, 0.18368571343549223, 0.03672653117905959, 0.1542938769842057]],
    [110, [0.011438154625052752, 0.17958225353821256, 0.03946217111057938, 0.1515582370526859]],
    [120, [0.01501734492727154, 0.17600306323599374, 0.04184829797872524, 0.14917211018454005]],
  ]),
  /** 0-based places. */
  beyondUpper: [10],
  pastWarning: [7, 10],
} as const;

export const purchaseOrderCounts = purchaseOrders.numerators.map(
  (numerator, index) => [numerator, purchaseOrders.denominators[index] ?? 0] as const,
);
