import { and, eq } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { beforeAll, describe, expect, it } from "vitest";
import { denominatorValues, sharedDenominators, tallies } from "@/db/schema";
import { isDomainError, type DomainError } from "@/lib/errors";
import { asMonth } from "@/lib/indicators/month";
import { answerOf } from "@/lib/indicators/tally-answer";
import { getReturn } from "@/lib/services/returns";
import { chartTallies, getTallyHistory } from "@/lib/services/tallies";
import { TEST_NOW } from "../support/store";
import { NOVEMBER, refusal } from "./returns-fixtures";
import { TalliesSuite } from "./tallies-fixtures";

const suite = new TalliesSuite();
const { save, indicatorOf, revisionsOf } = suite;

describe("versions", () => {
  it("lets one of two saves of the same box through and shows the other both values", async () => {
    await indicatorOf("RACE");
    const attempts = await Promise.allSettled([
      save("RACE", { numerator: 4, denominator: 100 }),
      save("RACE", { numerator: 5, denominator: 100 }),
    ]);
    expect(attempts.map((each) => each.status).sort()).toEqual(["fulfilled", "rejected"]);
    const lost = attempts.find((each) => each.status === "rejected");
    const won = attempts.find((each) => each.status === "fulfilled");
    expect(isDomainError(lost?.reason, "stale")).toBe(true);
    expect((lost?.reason as DomainError).current).toMatchObject({
      version: 1,
      numerator: won?.value.numerator,
    });
  });

  it("lets saves of different boxes pass each other", async () => {
    await indicatorOf("BOXES");
    await save("BOXES", { numerator: 4 });
    expect(await save("BOXES", { denominator: 50, version: 0 })).toMatchObject({
      numerator: 4,
      denominator: 50,
      version: 2,
    });
    await save("BOXES", { note: "Busy month", version: 1 });
    expect((await refusal(save("BOXES", { denominator: 51, version: 1 }))).code).toBe("stale");
    expect(await save("BOXES", { numerator: 6, version: 2 })).toMatchObject({
      numerator: 6,
      note: "Busy month",
    });
  });

  it("takes the same save twice for one, and a version that never was for stale", async () => {
    const indicator = await indicatorOf("TWICE");
    const first = await save("TWICE", { numerator: 2, denominator: 10 });
    expect(await save("TWICE", { numerator: 2, denominator: 10 })).toEqual(first);
    expect(await revisionsOf(indicator.id)).toHaveLength(1);
    expect((await refusal(save("TWICE", { numerator: 3, version: 9 }))).code).toBe("stale");
  });

  it("finds a box stale that an earlier of two saves has moved", async () => {
    await indicatorOf("BACK");
    await save("BACK", { numerator: 1, denominator: 10 });
    await save("BACK", { numerator: 2, version: 1 });
    await save("BACK", { denominator: 11, version: 2 });
    expect((await refusal(save("BACK", { numerator: 3, version: 1 }))).current).toMatchObject({
      numerator: 2,
      version: 3,
    });
  });
});

describe("a shared denominator", () => {
  let shared: string;

  beforeAll(async () => {
    shared = uuidv7();
    await suite.store.db
      .insert(sharedDenominators)
      .values({ id: shared, code: "BEDDAYS", label: "Occupied bed days" });
    for (const code of ["SHARE-A", "SHARE-B"]) await indicatorOf(code, { sharedDenominatorId: shared });
  });

  it("is typed once, has a version of its own and moves no sibling", async () => {
    const first = await save("SHARE-A", { numerator: 4, denominator: 800, denominatorVersion: 0 });
    expect(first).toMatchObject({
      denominator: 800,
      version: 1,
      denominatorVersion: 1,
      sharedDenominator: "BEDDAYS",
    });
    const sibling = await save("SHARE-B", { numerator: 1 });
    expect(sibling).toMatchObject({ numerator: 1, denominator: 800, version: 1, denominatorVersion: 1 });
    const changed = await save("SHARE-A", { denominator: 804, version: 1, denominatorVersion: 1 });
    expect(changed).toMatchObject({ denominator: 804, version: 1, denominatorVersion: 2 });
    const after = await getReturn({
      ctx: suite.store.ctxFor(suite.nurse),
      input: { ward: "OSIER", month: NOVEMBER },
    });
    expect(after.tallies.find((line) => line.indicator === "SHARE-B")).toMatchObject({
      denominator: 804,
      version: 1,
    });
  });

  it("leaves a revision with every line that it reaches", async () => {
    const { items } = await getTallyHistory({
      ctx: suite.store.ctxFor(suite.nurse),
      input: { ward: "OSIER", month: NOVEMBER, indicator: "SHARE-B" },
    });
    expect(items.map((each) => [each.numerator, each.denominator, each.version])).toEqual([
      [1, 800, 1],
      [1, 804, 1],
    ]);
  });

  it("is stale without its version or with an old one, and says what stands", async () => {
    expect((await refusal(save("SHARE-B", { denominator: 810, version: 1 }))).code).toBe("stale");
    const old = await refusal(save("SHARE-B", { denominator: 810, version: 1, denominatorVersion: 1 }));
    expect(old.current).toMatchObject({ denominator: 804, denominatorVersion: 2 });
    await expect(save("SHARE-B", { numerator: 2, denominator: 804, version: 1 })).resolves.toMatchObject({
      version: 2,
    });
  });

  it("is refused where a sibling would have more events than units, and names the sibling", async () => {
    await save("SHARE-B", { numerator: 700, version: 2 });
    const refused = await refusal(save("SHARE-A", { denominator: 600, version: 1, denominatorVersion: 2 }));
    expect(refused).toMatchObject({ code: "invalid", errors: [{ path: "denominator" }] });
    expect(refused.message).toContain("SHARE-B indicator");
  });

  it("keeps two siblings from racing past each other's check", async () => {
    const month = asMonth("2026-10");
    await save("SHARE-A", { numerator: 5, denominator: 100 }, suite.nurse, month);
    await save("SHARE-B", { numerator: 5 }, suite.nurse, month);
    await Promise.allSettled([
      save("SHARE-A", { denominator: 10, version: 1, denominatorVersion: 1 }, suite.nurse, month),
      save("SHARE-B", { numerator: 50, version: 1 }, suite.nurse, month),
    ]);
    const [value] = await suite.store.db
      .select()
      .from(denominatorValues)
      .where(and(eq(denominatorValues.sharedDenominatorId, shared), eq(denominatorValues.month, month)));
    const rows = await suite.store.db.select().from(tallies).where(eq(tallies.month, month));
    expect(rows.length).toBe(2);
    for (const row of rows) expect(row.numerator).toBeLessThanOrEqual(value?.value ?? 0);
  });

  it("awaited frees the denominator alone", async () => {
    const month = asMonth("2026-09");
    const saved = await save("SHARE-A", { numerator: 5, awaited: "admissions" }, suite.nurse, month);
    expect(saved).toMatchObject({
      numerator: 5,
      denominator: null,
      awaited: "admissions",
      denominatorVersion: 1,
    });
    const lost = await save("SHARE-B", { notCollected: "Not counted" }, suite.nurse, month);
    expect(lost).toMatchObject({ notCollected: "Not counted", awaited: "admissions" });
  });
});

describe("charting many lines at once", () => {
  it("reads answers in the database as lib/indicators does", async () => {
    const month = asMonth("2026-08");
    const counts = [null, 0, 3];
    const cases = counts.flatMap((numerator) =>
      [null, 0, 12].flatMap((denominator) =>
        [null, "pharmacy"].flatMap((awaited) =>
          [null, "Lost"].map((notCollected) => ({ numerator, denominator, awaited, notCollected })),
        ),
      ),
    );
    // Only states that the table's checks allow can be told apart in it.
    const legal = cases.filter(
      (each) =>
        !(each.notCollected && (each.numerator !== null || each.denominator !== null)) &&
        !(each.awaited && each.denominator !== null),
    );
    const keys = await Promise.all(
      legal.map(async (figures, index) => {
        const indicator = await indicatorOf(`CASE-${index}`, { kind: "rate" });
        const row = { id: uuidv7(), wardId: suite.ward.id, indicatorId: indicator.id, month, ...figures };
        await suite.store.db.insert(tallies).values({ ...row, updatedAt: TEST_NOW, updatedBy: "Test" });
        return { wardId: suite.ward.id, indicatorId: indicator.id, month };
      }),
    );
    await suite.store.db.transaction(async (db) => {
      const tx = { ...suite.store.ctxFor(suite.store.lead), db, audit: [] };
      await chartTallies(tx, { keys, event: "sent", source: "import" });
    });
    const rows = await suite.store.db.select().from(tallies).where(eq(tallies.month, month));
    const byIndicator = new Map(rows.map((row) => [row.indicatorId, row]));
    for (const [index, figures] of legal.entries()) {
      const answer = answerOf(figures);
      const row = byIndicator.get(keys[index]?.indicatorId ?? "");
      expect([figures, row?.charted]).toEqual([figures, answer !== "blank" && answer !== "partial"]);
    }
  });
});
