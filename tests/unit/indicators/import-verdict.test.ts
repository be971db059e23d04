import { describe, expect, it } from "vitest";
import {
  monthKey,
  pairKey,
  type ImportFacts,
  type ImportIndicator,
  type ImportMonth,
  type ImportTally,
} from "@/lib/indicators/import-facts";
import type { ImportLine, ReturnBefore } from "@/lib/indicators/import-row";
import { suggestionsFor } from "@/lib/indicators/import-suggestions";
import { judgeTogether, monthsSpokenOf } from "@/lib/indicators/import-together";
import { judgeLine, MAX_LINE_TEXT } from "@/lib/indicators/import-verdict";
import { asMonth } from "@/lib/indicators/month";

const NOV = asMonth("2026-11");
const ward = { id: "w1", code: "OSIER", name: "Osier", openFrom: asMonth("2025-01"), openTo: null };

function indicator(code: string, values: Partial<ImportIndicator> = {}): ImportIndicator {
  return {
    id: code.toLowerCase(),
    code,
    name: code,
    kind: "proportion",
    team: "quality",
    sharedDenominatorId: null,
    mayType: true,
    ...values,
  };
}

const indicators = [
  indicator("OBS"),
  indicator("FALLS", { kind: "rate", sharedDenominatorId: "obd" }),
  indicator("HARM", { sharedDenominatorId: "obd" }),
  indicator("CATH", { kind: "rate", team: "infection_control", mayType: false }),
  indicator("ELSEWHERE"),
];

const tally = (indicatorId: string, values: Partial<ImportTally> = {}): ImportTally => ({
  indicatorId,
  numerator: null,
  denominator: null,
  notCollected: null,
  awaited: null,
  note: null,
  corrected: false,
  version: 3,
  ...values,
});

const sent: ReturnBefore = {
  status: "submitted",
  reopened: false,
  reopenedReason: null,
  firstSubmittedAt: null,
  submittedAt: null,
  submittedBy: null,
  acceptedAt: null,
  acceptedBy: null,
};

interface Stored {
  tallies?: ImportTally[];
  obd?: { value: number | null; awaited: string | null; version: number };
  return?: ReturnBefore | null;
}

function facts(stored: Stored = {}, values: Partial<ImportFacts> = {}): ImportFacts {
  const month: ImportMonth = {
    return: stored.return ?? null,
    tallies: new Map((stored.tallies ?? []).map((each) => [each.indicatorId, each])),
    denominators: new Map(stored.obd ? [["obd", stored.obd]] : []),
  };
  return {
    thisMonth: asMonth("2026-12"),
    wards: new Map([["OSIER", ward]]),
    indicators: new Map(indicators.map((each) => [each.code, each])),
    assignments: new Map(
      ["obs", "falls", "harm", "cath"].map((id) => [
        pairKey("w1", id),
        { fromMonth: asMonth("2025-06"), toMonth: asMonth("2026-12") },
      ]),
    ),
    months: new Map([[monthKey("w1", NOV), month]]),
    mayCorrect: true,
    ...values,
  };
}

const columns = ["ward", "indicator", "month", "numerator", "denominator", "notCollected", "note"] as const;

function line(values: Partial<ImportLine> = {}): ImportLine {
  const row = values.row ?? 2;
  return {
    row,
    ward: "osier",
    indicator: "obs",
    monthText: "2026-11",
    month: NOV,
    numerator: 2,
    denominator: 40,
    notCollected: null,
    note: null,
    cells: Object.fromEntries(columns.map((column, index) => [column, `${"ABCDEFG"[index]}${row}`])),
    messages: [],
    onlyDenominator: null,
    blank: false,
    ...values,
  };
}

const judge = (values: Partial<ImportLine>, known: ImportFacts = facts()) =>
  judgeLine(line(values), known, suggestionsFor(known, true));

const half = { cell: "D2", columns: ["numerator" as const], message: "Half." };

describe("a row by itself", () => {
  it("adds where nothing stands, an empty line or only the shared denominator", () => {
    expect(judge({})).toMatchObject({ outcome: "new", tallyVersion: 0, before: null, messages: [] });
    expect(judge({}, facts({ tallies: [tally("obs", { note: "Only a note" })] })).outcome).toBe("new");
    const known = facts({ obd: { value: 700, awaited: null, version: 2 } });
    expect(judge({ indicator: "FALLS", denominator: 700 }, known)).toMatchObject({
      outcome: "new",
      denominatorVersion: 2,
      before: { tally: null, shared: { value: 700, awaited: null }, return: null },
    });
  });

  it("is the same where figures, reason and note agree, nothing counted out of nothing included", () => {
    const same = (values: Partial<ImportLine>, stored: Stored) => judge(values, facts(stored)).outcome;
    expect(same({}, { tallies: [tally("obs", { numerator: 2, denominator: 40, note: "Kept" })] })).toBe(
      "same",
    );
    expect(same({ note: "Kept" }, { tallies: [tally("obs", { numerator: 2, denominator: 40 })] })).toBe(
      "changed",
    );
    const none = { tallies: [tally("obs", { numerator: null, denominator: 0 })] };
    expect(same({ numerator: 0, denominator: 0 }, none)).toBe("same");
    const reason = { numerator: null, denominator: null, notCollected: "Closed" };
    expect(same(reason, { tallies: [tally("obs", { notCollected: "Closed" })] })).toBe("same");
    expect(same(reason, { tallies: [tally("obs", { notCollected: "Other" })] })).toBe("changed");
    expect(same({}, { tallies: [tally("obs", { notCollected: "Closed" })] })).toBe("changed");
    expect(same({}, { tallies: [tally("obs", { numerator: 2, awaited: "Pharmacy" })] })).toBe("changed");
    const shared = {
      tallies: [tally("falls", { numerator: 2 })],
      obd: { value: 700, awaited: null, version: 1 },
    };
    expect(same({ indicator: "FALLS", denominator: 700 }, shared)).toBe("same");
    expect(same({ indicator: "FALLS", denominator: 701 }, shared)).toBe("changed");
    expect(same({ indicator: "FALLS" }, { tallies: [tally("falls", { numerator: 2 })] })).toBe("changed");
  });

  it("is skipped where it is blank and rejected where a cell can't be read", () => {
    const message = { cell: "D2", columns: ["numerator" as const], message: "No number." };
    expect(judge({ blank: true, messages: [message] })).toMatchObject({
      outcome: "skipped",
      messages: [message],
    });
    expect(judge({ messages: [message], numerator: null })).toMatchObject({
      outcome: "rejected",
      messages: [message],
      wardId: "w1",
    });
    expect(judge({ month: null }).outcome).toBe("rejected");
    expect(judge({ ward: "", indicator: "" })).toMatchObject({ outcome: "rejected", messages: [] });
    expect(judge({ note: "x".repeat(MAX_LINE_TEXT + 1) }).messages[0]?.cell).toBe("G2");
  });

  it("names the cell, or the column where the sheet has none", () => {
    expect(judge({ ward: "OSEIR" }).messages[0]).toMatchObject({ cell: "A2", columns: ["ward"] });
    expect(judge({ ward: "OSEIR", cells: {} }).messages[0]?.cell).toBe("ward");
  });

  it("stays within the months that the ward reports", () => {
    const words = (values: Partial<ImportLine>, known = facts()) => judge(values, known).messages[0]?.message;
    expect(words({ month: asMonth("2027-01") })).toContain("still to come");
    expect(words({ month: asMonth("2025-03") })).toBe("Osier reports OBS from Jun 2025 to Dec 2026.");
    expect(words({ indicator: "ELSEWHERE" })).toBe("Osier doesn't report ELSEWHERE.");
    const closed = { ...ward, openTo: asMonth("2025-02") };
    expect(words({}, facts({}, { wards: new Map([["OSIER", closed]]) }))).toBe("Osier doesn't report OBS.");
  });

  it("rejects a pair that can't be", () => {
    expect(judge({ numerator: 41 }).messages[0]).toMatchObject({
      cell: "D2, E2",
      columns: ["numerator", "denominator"],
    });
    expect(judge({ indicator: "FALLS", numerator: 41 }).outcome).toBe("new");
    expect(judge({ indicator: "FALLS", denominator: 0 }).outcome).toBe("rejected");
  });

  it("lets a denominator stand alone only where a team counts the numerator", () => {
    const alone = { numerator: null, onlyDenominator: half };
    expect(judge(alone).messages).toEqual([half]);
    expect(judge({ ...alone, indicator: "NOTHING" }).messages).toContainEqual(half);
    const counted = facts({ tallies: [tally("cath", { numerator: 3 })] });
    expect(judge({ ...alone, indicator: "CATH" }, counted)).toMatchObject({
      outcome: "changed",
      numerator: 3,
    });
    expect(judge({ ...alone, indicator: "CATH", denominator: 0 }, counted).outcome).toBe("rejected");
    expect(judge({ indicator: "CATH", numerator: 3 }, counted).outcome).toBe("changed");
    expect(judge({ indicator: "CATH", numerator: 4 }, counted).messages[0]?.message).toContain(
      "Leave the numerator at 3",
    );
    const reason = { indicator: "CATH", numerator: null, denominator: null, notCollected: "Closed" };
    expect(judge(reason).outcome).toBe("rejected");
  });

  it("needs a lead and a reason for a sent month", () => {
    const stored = { tallies: [tally("obs", { numerator: 1, denominator: 40 })], return: sent };
    expect(judge({}, facts(stored))).toMatchObject({ outcome: "changed", messages: [{ columns: [] }] });
    expect(judge({}, facts(stored, { mayCorrect: false })).outcome).toBe("rejected");
    expect(judge({ numerator: 1 }, facts(stored, { mayCorrect: false })).outcome).toBe("same");
    const accepted = facts({ ...stored, return: { ...sent, status: "accepted" } });
    expect(judge({}, accepted).messages[0]?.message).toContain("accepted");
  });
});

describe("rows against each other", () => {
  const judgeAll = (rows: Partial<ImportLine>[], known: ImportFacts = facts()) => {
    const verdicts = rows.map((values, index) => judge({ row: index + 2, ...values }, known));
    judgeTogether(verdicts, known);
    return verdicts.map((verdict) => verdict.outcome);
  };

  it("rejects rows for one line and different values of a shared denominator", () => {
    expect(judgeAll([{}, { numerator: 3 }, { indicator: "FALLS" }])).toEqual(["rejected", "rejected", "new"]);
    expect(judgeAll([{}, {}, {}])).toEqual(["rejected", "rejected", "rejected"]);
    expect(judgeAll([{ indicator: "FALLS" }, { indicator: "HARM", denominator: 41 }])).toEqual([
      "rejected",
      "rejected",
    ]);
    expect(judgeAll([{ indicator: "FALLS" }, { indicator: "HARM" }])).toEqual(["new", "new"]);
    expect(judgeAll([{ ward: "NOBODY" }, { month: null }])).toEqual(["rejected", "rejected"]);
  });

  it("protects stored lines that the sheet doesn't list from a shared denominator", () => {
    const obd = { value: 700, awaited: null, version: 1 };
    const harmed = facts({
      tallies: [tally("harm", { numerator: 50 }), tally("obs", { numerator: 60 })],
      obd,
    });
    const falls = { indicator: "FALLS", denominator: 40 };
    expect(judgeAll([falls], harmed)).toEqual(["rejected"]);
    expect(judgeAll([{ ...falls, denominator: 700 }], harmed)).toEqual(["new"]);
    expect(judgeAll([{ ...falls, denominator: 60 }], harmed)).toEqual(["new"]);
    expect(judgeAll([falls, { indicator: "HARM", numerator: 10 }], harmed)).toEqual(["new", "changed"]);
    // A listed row that is rejected itself leaves the stored figure standing.
    expect(judgeAll([falls, { indicator: "HARM", numerator: 45 }], harmed)).toEqual(["rejected", "rejected"]);
    const notCollected = facts({ tallies: [tally("harm", { notCollected: "Closed" })], obd });
    expect(judgeAll([falls], notCollected)).toEqual(["new"]);
  });

  it("names each ward and month once, of known wards", () => {
    const lines = [line(), line({ indicator: "FALLS" }), line({ ward: "NOBODY" }), line({ month: null })];
    expect(monthsSpokenOf(lines, new Map([["OSIER", ward]]))).toEqual([{ wardId: "w1", month: NOV }]);
  });
});

describe("suggestions", () => {
  it("stop after 200 different codes", () => {
    const words = suggestionsFor(facts(), false);
    for (let index = 0; index < 200; index += 1) words.unknownIndicator(`NONE-${index}`);
    expect(words.unknownIndicator("FALS")).toBe("No indicator has the code “FALS”.");
    expect(words.unknownIndicator("NONE-3")).toBe("No indicator has the code “NONE-3”.");
    expect(words.unknownWard("OSEIR")).toBe("No ward has the code “OSEIR”. Did you mean OSIER?");
  });

  it("list the person's own wards, or say that there are none", () => {
    expect(suggestionsFor(facts(), true).unknownWard("XX")).toContain("You can send for OSIER.");
    expect(suggestionsFor(facts({}, { wards: new Map() }), true).unknownWard("XX")).toContain("no ward yet");
  });
});
