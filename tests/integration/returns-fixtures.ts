import { and, asc, desc, eq } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { afterAll, beforeAll, beforeEach } from "vitest";
import { auditEntries, sharedDenominators, signals, tallies, tallyRevisions, wardReturns } from "@/db/schema";
import { isDomainError, type DomainError } from "@/lib/errors";
import { addMonths, asMonth, monthRange, type Month } from "@/lib/indicators/month";
import type { Actor, PersonActor } from "@/lib/policy";
import { acceptReturns, sendReturns } from "@/lib/services/returns";
import { hospitalDay, openReturns, saveTally } from "@/lib/services/tallies";
import { makeTestStore, TEST_NOW, type TestStore } from "../support/store";

export const NOVEMBER = asMonth("2026-11");

type IndicatorValues = Parameters<TestStore["addIndicator"]>[1];

/** What a verb refused with; throws on anything else. */
export async function refusal(attempt: Promise<unknown>): Promise<DomainError> {
  const error: unknown = await attempt.then(
    () => new Error("nothing was refused"),
    (reason: unknown) => reason,
  );
  if (!isDomainError(error)) throw error;
  return error;
}

/** One hospital a file, and for each of its tests a ward and a nurse of its own. */
export class ReturnsSuite {
  store!: TestStore;
  ward!: Awaited<ReturnType<TestStore["addWard"]>>;
  nurse!: PersonActor;
  /** Number of the test, for codes of its own. */
  count = 0;

  constructor() {
    beforeAll(async () => {
      this.store = await makeTestStore();
    });
    beforeEach(async () => {
      this.count += 1;
      this.ward = await this.store.addWard(`WARD-${this.count}`);
      this.nurse = this.store.nurseOf(this.ward.id);
    });
    afterAll(() => this.store.close());
  }

  by = (actor: Actor, at: Date = TEST_NOW) => this.store.ctxFor(actor, at);

  input = (month: Month = NOVEMBER) => ({ ward: this.ward.code, month });

  save = (indicator: string, input: object, actor: Actor = this.nurse, month: Month = NOVEMBER) =>
    saveTally({
      ctx: this.by(actor),
      input: { ward: this.ward.code, month, indicator, version: 0, ...input },
    });

  indicatorOf = async (code: string, values: IndicatorValues = {}) => {
    const indicator = await this.store.addIndicator(`${code}-${this.count}`, values);
    await this.store.assign(this.ward.id, indicator.id);
    return indicator;
  };

  /** A denominator for indicators to share, by its id. */
  sharedDenominator = async () => {
    const id = uuidv7();
    await this.store.db
      .insert(sharedDenominators)
      .values({ id, code: `BEDS-${this.count}`, label: "Occupied bed days" });
    return id;
  };

  stranger = async () => this.store.nurseOf((await this.store.addWard(`FAR-${this.count}`)).id);

  tallyOf = async (indicatorId: string, month: Month = NOVEMBER) => {
    const [row] = await this.store.db
      .select()
      .from(tallies)
      .where(and(eq(tallies.indicatorId, indicatorId), eq(tallies.month, month)));
    return row;
  };

  /** What happened to a line, oldest first: event, effect on the chart, figures. */
  eventsOf = async (indicatorId: string) => {
    const rows = await this.store.db
      .select()
      .from(tallyRevisions)
      .where(eq(tallyRevisions.indicatorId, indicatorId))
      .orderBy(asc(tallyRevisions.id));
    return rows.map((row) => [row.event, row.charted, row.numerator, row.denominator]);
  };

  signalsOf = async (indicatorId: string) => {
    const rows = await this.store.db.select().from(signals).where(eq(signals.indicatorId, indicatorId));
    return rows.map((row) => [row.rule, row.status, row.withdrawnWhy]);
  };

  lastAudit = async () => {
    const [entry] = await this.store.db.select().from(auditEntries).orderBy(desc(auditEntries.seq)).limit(1);
    return entry;
  };

  /** Two years on the chart, sent at once: 8 and 12 in 100 by turns, so that no run forms. */
  withHistory = async (indicatorId: string) => {
    const { ward, store } = this;
    const months = monthRange(addMonths(NOVEMBER, -24), addMonths(NOVEMBER, -1));
    const figures = (index: number) => ({ numerator: index % 2 === 0 ? 8 : 12, denominator: 100 });
    const saved = { wardId: ward.id, indicatorId, updatedAt: TEST_NOW, updatedBy: "Test" };
    await store.db
      .insert(tallies)
      .values(months.map((month, index) => ({ id: uuidv7(), month, ...saved, ...figures(index) })));
    await store.db.transaction(async (db) => {
      const tx = { ...this.by(store.lead), db, audit: [] };
      const wanted = months.map((month) => ({ wardId: ward.id, month }));
      await openReturns(tx, wanted, await hospitalDay(tx));
      const rows = await db.select().from(wardReturns).where(eq(wardReturns.wardId, ward.id));
      const returnIds = rows.map((row) => row.id);
      await sendReturns(tx, { returnIds, source: "import" });
      await acceptReturns(tx, returnIds);
    });
  };
}
