import { describe, expect, it } from "vitest";
import { asMonth } from "@/lib/indicators/month";
import { FIRST_SEGMENT } from "@/lib/indicators/segments";
import {
  inMonths,
  planSignals,
  towardsOf,
  type FoundSignal,
  type StoredSignal,
} from "@/lib/indicators/signal-life";

function found(from: string, to: string, over: Partial<FoundSignal> = {}): FoundSignal {
  return {
    rule: "one-side",
    side: "lower",
    segmentFrom: FIRST_SEGMENT,
    from: asMonth(from),
    to: asMonth(to),
    spansGap: false,
    ...over,
  };
}

function stored(id: string, from: string, to: string, over: Partial<StoredSignal> = {}): StoredSignal {
  return {
    ...found(from, to),
    id,
    status: "new",
    towards: "favourable",
    bornAt: new Date("2026-01-01T00:00:00Z"),
    ...over,
  };
}

describe("towardsOf", () => {
  it.each([
    ["upper", "lower", "adverse"],
    ["lower", "lower", "favourable"],
    ["upper", "higher", "favourable"],
    ["lower", "higher", "adverse"],
    ["upper", "neither", "neither"],
    ["lower", "neither", "neither"],
  ] as const)("%s where %s is better: %s", (side, better, towards) => {
    expect(towardsOf(side, better)).toBe(towards);
  });
});

describe("planSignals", () => {
  it("bears what is new and leaves what is the same alone", () => {
    const same = stored("a", "2025-01", "2025-08");
    const fresh = found("2026-01", "2026-01", { rule: "beyond-action" });
    expect(planSignals([same], [found("2025-01", "2025-08"), fresh])).toEqual({
      born: [fresh],
      moved: [],
      cameBack: [],
      withdrawn: [],
    });
  });

  it("lets a run grow and shrink as one signal", () => {
    const run = stored("a", "2025-01", "2025-08");
    for (const to of ["2025-09", "2025-07"]) {
      const plan = planSignals([run], [found("2025-01", to)]);
      expect(plan).toMatchObject({
        born: [],
        moved: [{ signal: { id: "a" }, found: { to } }],
        withdrawn: [],
      });
    }
  });

  it("withdraws what has lost its evidence, once", () => {
    expect(planSignals([stored("a", "2025-01", "2025-08")], []).withdrawn.map(({ id }) => id)).toEqual(["a"]);
    expect(planSignals([stored("a", "2025-01", "2025-08", { status: "withdrawn" })], []).withdrawn).toEqual(
      [],
    );
  });

  it("brings a withdrawn signal back under its own name", () => {
    const gone = stored("a", "2025-01", "2025-08", { status: "withdrawn" });
    const plan = planSignals([gone], [found("2025-02", "2025-09")]);
    expect(plan).toMatchObject({ born: [], cameBack: [{ signal: { id: "a" } }] });
  });

  it("keeps the elder where two have merged", () => {
    const young = stored("young", "2025-01", "2025-03", { bornAt: new Date("2026-03-01T00:00:00Z") });
    const elder = stored("elder", "2025-06", "2025-08");
    const plan = planSignals([young, elder], [found("2025-01", "2025-08")]);
    expect(plan.moved.map(({ signal }) => signal.id)).toEqual(["elder"]);
    expect(plan.withdrawn.map(({ id }) => id)).toEqual(["young"]);
  });

  it("prefers an active signal to an elder that was withdrawn", () => {
    const gone = stored("gone", "2025-01", "2025-08", {
      status: "withdrawn",
      bornAt: new Date("2025-01-01T00:00:00Z"),
    });
    const active = stored("active", "2025-01", "2025-08");
    const plan = planSignals([gone, active], [found("2025-01", "2025-09")]);
    expect(plan).toMatchObject({ moved: [{ signal: { id: "active" } }], cameBack: [], withdrawn: [] });
  });

  it("gives the earlier part of a split its identity and bears the later one", () => {
    const plan = planSignals(
      [stored("a", "2025-01", "2025-12")],
      [found("2025-06", "2025-12"), found("2025-01", "2025-04")],
    );
    expect(plan.moved).toMatchObject([{ signal: { id: "a" }, found: { from: "2025-01", to: "2025-04" } }]);
    expect(plan.born).toMatchObject([{ from: "2025-06" }]);
  });

  it.each([
    ["rule", { rule: "two-of-three" }],
    ["side", { side: "upper" as const }],
    ["segment", { segmentFrom: asMonth("2025-01") }],
  ])("is another signal under another %s", (_, other) => {
    const plan = planSignals([stored("a", "2025-01", "2025-08")], [found("2025-01", "2025-08", other)]);
    expect(plan.born).toHaveLength(1);
    expect(plan.withdrawn).toHaveLength(1);
  });

  it("is another signal where no month is shared", () => {
    const plan = planSignals([stored("a", "2025-01", "2025-03")], [found("2025-04", "2025-08")]);
    expect(plan).toMatchObject({ born: [{ from: "2025-04" }], withdrawn: [{ id: "a" }] });
  });

  it("leaves a closed or reviewed signal its status: it neither comes back nor is born again", () => {
    for (const status of ["closed", "in_review"] as const) {
      const plan = planSignals(
        [stored("a", "2025-01", "2025-08", { status })],
        [found("2025-01", "2025-08")],
      );
      expect(plan).toEqual({ born: [], moved: [], cameBack: [], withdrawn: [] });
    }
  });
});

describe("inMonths", () => {
  const months = ["2025-01", "2025-02", "2025-03"].map(asMonth);
  const detected = { rule: "beyond-action", side: "upper", segment: 0, spansGap: false } as const;

  it("names the months of a detection's slots", () => {
    expect(inMonths({ ...detected, first: 1, last: 2 }, months, FIRST_SEGMENT)).toMatchObject({
      from: "2025-02",
      to: "2025-03",
      segmentFrom: FIRST_SEGMENT,
    });
  });

  it("refuses slots outside the series", () => {
    expect(() => inMonths({ ...detected, first: 1, last: 3 }, months, FIRST_SEGMENT)).toThrow(RangeError);
  });
});
