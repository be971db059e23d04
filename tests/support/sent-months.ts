import { uuidv7 } from "uuidv7";
import { tallies } from "@/db/schema";
import { withTransaction } from "@/db/transaction";
import { addMonths, asMonth } from "@/lib/indicators/month";
import { reevaluateSeries } from "@/lib/services/series";
import { TEST_NOW, type TestStore } from "./store";

/** Numerator and denominator of one month after another, as sent; the series is worked out afterwards. */
export async function addSentMonths(
  store: TestStore,
  series: { wardId: string; indicatorId: string },
  figures: readonly (readonly [number, number])[],
  from = "2024-01",
): Promise<void> {
  const rows = figures.map(([numerator, denominator], index) => ({
    id: uuidv7(),
    ...series,
    month: addMonths(asMonth(from), index),
    numerator,
    denominator,
    charted: true,
    chartedNumerator: numerator,
    chartedDenominator: denominator,
    updatedAt: TEST_NOW,
    updatedBy: "Test nurse",
  }));
  await store.db.insert(tallies).values(rows);
  await withTransaction(store.ctxFor(store.lead), async (tx) => {
    await reevaluateSeries(tx, { pairs: [series], why: "correction" });
  });
}
