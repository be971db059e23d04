import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { sql } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { sharedDenominators, tallies } from "@/db/schema";
import { selectRows } from "@/db/rows";
import { asMonth, monthRange } from "@/lib/indicators/month";
import { exportTallies } from "@/lib/services/exports";
import { checkImport, commitImport, takeBackImport } from "@/lib/services/imports";
import { csvUpload, makeDataFolder, type SheetRow } from "../../support/sheets";
import { makeTestStore, type TestStore } from "../../support/store";

const ROWS = 50_000;
const WARDS = 24;
const INDICATORS = 30;

let store: TestStore;
let dropFolder: () => Promise<void>;
let upload: ReturnType<typeof csvUpload>;

/** Sixty-nine months of 24 wards and 30 indicators, every third of which counts out of shared bed days. */
beforeAll(async () => {
  dropFolder = await makeDataFolder();
  store = await makeTestStore();
  const sharedId = uuidv7();
  await store.db.insert(sharedDenominators).values({ id: sharedId, code: "OBD", label: "Occupied bed days" });
  const shared = { kind: "rate", per: 1000, sharedDenominatorId: sharedId } as const;
  const indicators = [];
  for (let index = 0; index < INDICATORS; index += 1) {
    indicators.push(await store.addIndicator(`IND-${index}`, index % 3 === 0 ? shared : {}));
  }
  const rows: SheetRow[] = [];
  for (let number = 0; number < WARDS; number += 1) {
    const ward = await store.addWard(`WARD-${number}`);
    for (const indicator of indicators) await store.assign(ward.id, indicator.id);
    for (const month of monthRange(asMonth("2021-01"), asMonth("2026-10"))) {
      for (const [index, { code }] of indicators.entries()) {
        const events = (number * 7 + index * 3 + Number(month.slice(5))) % 9;
        rows.push([ward.code, code, month, events, index % 3 === 0 ? 600 + Number(month.slice(5)) : 60]);
      }
    }
  }
  upload = csvUpload(rows.slice(0, ROWS));
});

afterAll(async () => {
  await store.close();
  await dropFolder();
});

/** Runs work while somebody else asks again and again; answers how often they had timers fire and questions answered. */
async function beside<Result>(
  work: Promise<Result>,
): Promise<{ result: Result; ticks: number; answers: number }> {
  const done = { value: false };
  let ticks = 0;
  let answers = 0;
  const timer = setInterval(() => {
    ticks += 1;
  }, 5);
  const asking = (async () => {
    while (!done.value) {
      await store.db.execute(sql`select 1`);
      if (!done.value) answers += 1;
      await new Promise((resolve) => setImmediate(resolve));
    }
  })();
  const result = await work.finally(() => {
    done.value = true;
    clearInterval(timer);
  });
  await asking;
  return { result, ticks, answers };
}

const sums = async () => {
  const [row] = await selectRows<{ rows: number; charted: number; events: number }>(
    store.db,
    sql`select count(*)::float8 as rows, (count(*) filter (where charted))::float8 as charted,
          coalesce(sum(numerator), 0)::float8 as events from ${tallies}`,
  );
  return row;
};

describe("50 000 rows", () => {
  const ctx = () => store.ctxFor(store.lead);

  it("are checked, brought in and accepted, exported and taken back, while others are answered", async () => {
    const checked = await beside(checkImport({ ctx: ctx(), input: upload }));
    expect(checked.result.counts).toEqual({ new: ROWS, changed: 0, same: 0, rejected: 0, skipped: 0 });
    expect(checked.result.rows).toHaveLength(ROWS);
    // Staging is many short transactions: questions of others are answered between them.
    expect(checked.answers).toBeGreaterThan(20);

    const { id } = checked.result;
    const committed = await beside(commitImport({ ctx: ctx(), input: { id, accept: true } }));
    expect(committed.result.broughtIn).toBe(ROWS);
    // Others wait for the one transaction, but the process goes on: timers fire between the chunks.
    expect(committed.ticks).toBeGreaterThan(20);
    const afterCommit = await sums();
    expect(afterCommit).toMatchObject({ rows: ROWS, charted: ROWS });
    expect(afterCommit?.events).toBeGreaterThan(0);

    const bytes = await exportTallies({ ctx: ctx(), input: { format: "csv" } });
    const same = await checkImport({ ctx: ctx(), input: { fileName: "again.csv", bytes } });
    expect(same.counts).toMatchObject({ same: ROWS });

    const takenBack = await beside(takeBackImport({ ctx: ctx(), input: { id } }));
    expect(takenBack.result.state).toBe("taken-back");
    expect(takenBack.ticks).toBeGreaterThan(20);
    expect(await sums()).toEqual({ rows: ROWS, charted: 0, events: 0 });
  }, 600_000);
});
