import { asc, eq } from "drizzle-orm";
import { afterAll, beforeAll } from "vitest";
import { tallyRevisions } from "@/db/schema";
import { asMonth, type Month } from "@/lib/indicators/month";
import type { Actor, PersonActor } from "@/lib/policy";
import { saveTally } from "@/lib/services/tallies";
import { makeTestStore, type TestStore } from "../support/store";
import { NOVEMBER } from "./returns-fixtures";

/** One hospital and one ward a file; every test takes indicators of its own. */
export class TalliesSuite {
  store!: TestStore;
  ward!: Awaited<ReturnType<TestStore["addWard"]>>;
  nurse!: PersonActor;

  constructor() {
    beforeAll(async () => {
      this.store = await makeTestStore();
      this.ward = await this.store.addWard("OSIER", { openFrom: asMonth("2026-03") });
      this.nurse = this.store.nurseOf(this.ward.id);
    });
    afterAll(() => this.store.close());
  }

  save = (indicator: string, input: object, actor: Actor = this.nurse, month: Month = NOVEMBER) =>
    saveTally({
      ctx: this.store.ctxFor(actor),
      input: { ward: "OSIER", month, indicator, version: 0, ...input },
    });

  indicatorOf = async (code: string, values: Parameters<TestStore["addIndicator"]>[1] = {}) => {
    const indicator = await this.store.addIndicator(code, values);
    await this.store.assign(this.ward.id, indicator.id);
    return indicator;
  };

  revisionsOf = (indicatorId: string) =>
    this.store.db
      .select()
      .from(tallyRevisions)
      .where(eq(tallyRevisions.indicatorId, indicatorId))
      .orderBy(asc(tallyRevisions.id));
}
