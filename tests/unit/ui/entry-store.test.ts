import { describe, expect, it } from "vitest";
import type { ApiProblem, Sent } from "@/app/_hooks/use-api";
import { draftKey, type Part } from "@/app/(signed-in)/returns/[ward]/[month]/_components/entry-state";
import { EntryStore } from "@/app/(signed-in)/returns/[ward]/[month]/_components/entry-store";
import { asMonth } from "@/lib/indicators/month";
import type { TallyReply } from "@/lib/schemas/tally";
import type { WardReturnReply } from "@/lib/schemas/ward-return";

function line(indicator: string, values: Partial<TallyReply> = {}): TallyReply {
  return {
    indicator,
    name: indicator,
    kind: "proportion",
    per: 100,
    numeratorLabel: "Events",
    denominatorLabel: "Units",
    numeratorBy: "ward",
    team: "quality",
    sharedDenominator: null,
    matureOn: "2026-11-30",
    isMature: true,
    numerator: null,
    denominator: null,
    notCollected: null,
    awaited: null,
    note: null,
    version: 0,
    corrected: false,
    savedBy: null,
    savedAt: null,
    denominatorSavedBy: null,
    denominatorSavedAt: null,
    ...values,
  };
}

function wardReturn(...tallies: TallyReply[]): WardReturnReply {
  return {
    ward: "OSIER",
    wardName: "Osier ward",
    division: "Medicine",
    month: asMonth("2026-11"),
    status: "open",
    dueOn: "2026-12-07",
    version: 1,
    late: false,
    firstSubmittedAt: null,
    submittedAt: null,
    submittedBy: null,
    acceptedAt: null,
    acceptedBy: null,
    reopened: false,
    reopenedReason: null,
    tallies,
  };
}

interface Body {
  version: number;
  denominatorVersion?: number;
  numerator?: number | null;
  denominator?: number | null;
  notCollected?: string | null;
}

type Answer = (indicator: string, body: Body) => Partial<TallyReply> | Omit<ApiProblem, "type" | "title">;

/** A page's store against a server that answers as told; without an answer it keeps what it is sent. */
function page(lines: TallyReply[], ...answers: Answer[]) {
  const bodies: Body[] = [];
  const stored = new Map(lines.map((each) => [each.indicator, each]));
  const store = new EntryStore(wardReturn(...lines), async (indicator, sent): Promise<Sent<TallyReply>> => {
    const body = sent as Body;
    bodies.push(body);
    const { version, ...fields } = body;
    const answer = answers.shift()?.(indicator, body) ?? fields;
    if ("detail" in answer) {
      if (answer.current) stored.set(indicator, answer.current as TallyReply);
      return { ok: false, problem: { type: "", title: "", ...answer } };
    }
    const before = stored.get(indicator) ?? line(indicator);
    const fresh = {
      ...before,
      ...fields,
      ...answer,
      version: version + 1,
      savedAt: "2026-12-07T09:30:00.000Z",
    };
    for (const [code, each] of stored) {
      const shares = each.sharedDenominator !== null && each.sharedDenominator === fresh.sharedDenominator;
      if (shares) stored.set(code, { ...each, denominator: fresh.denominator });
    }
    stored.set(indicator, fresh);
    return { ok: true, data: fresh, status: 200 };
  });
  const type = (indicator: string, part: Part, text: string) => {
    store.type(indicator, part, text);
    store.leave(indicator, part);
    return store.settled();
  };
  const draft = (indicator: string, part: Part) => store.snapshot().drafts[draftKey(indicator, part)];
  const record = (indicator: string) =>
    store.snapshot().wardReturn.tallies.find((each) => each.indicator === indicator);
  return { store, bodies, type, draft, record };
}

const stale = (current: TallyReply) => () => ({
  status: 409,
  detail: "Somebody changed this line.",
  current,
});

describe("saving boxes", () => {
  it("sends the box that was left, on the version of the last reply", async () => {
    const { bodies, type, draft, record } = page([line("FALLS")]);
    await type("FALLS", "numerator", "4");
    await type("FALLS", "denominator", "1,000");
    expect(bodies).toEqual([
      { numerator: 4, version: 0 },
      { denominator: 1_000, version: 1 },
    ]);
    expect(draft("FALLS", "denominator")).toBeUndefined();
    expect(record("FALLS")).toMatchObject({ numerator: 4, denominator: 1_000, version: 2 });
  });

  it("sends nothing for a value that stands already, and puts one back", async () => {
    const { store, bodies, type, draft } = page([line("FALLS", { numerator: 4, version: 1 })]);
    await type("FALLS", "numerator", "4");
    store.type("FALLS", "numerator", "5");
    store.putBack("FALLS", "numerator");
    store.leave("FALLS", "numerator");
    await store.settled();
    expect(bodies).toEqual([]);
    expect(draft("FALLS", "numerator")).toBeUndefined();
  });

  it("keeps here what is no number, and what can't be until it is mended", async () => {
    const { store, bodies, type, draft } = page([line("HANDS")]);
    await type("HANDS", "numerator", "many");
    expect(draft("HANDS", "numerator")).toMatchObject({ state: "fix", text: "many" });
    store.type("HANDS", "numerator", "118");
    store.type("HANDS", "denominator", "19");
    await type("HANDS", "denominator", "19");
    expect(bodies).toEqual([]);
    expect(draft("HANDS", "denominator")?.state).toBe("fix");
    store.swap("HANDS");
    await store.settled();
    expect(bodies).toEqual([{ numerator: 19, denominator: 118, version: 0 }]);
  });

  it("asks which of two versions is right, and saves the other box by itself", async () => {
    const theirs = line("OBS", { numerator: 7, version: 1, savedBy: "T. Oakenby" });
    const { store, bodies, type, draft, record } = page([line("OBS")], stale(theirs));
    store.type("OBS", "denominator", "90");
    await type("OBS", "numerator", "8");
    await store.settled();
    expect(draft("OBS", "numerator")).toMatchObject({ state: "conflict", text: "8" });
    expect(record("OBS")).toMatchObject({ numerator: 7, denominator: 90 });
    store.keepMine("OBS");
    await store.settled();
    expect(bodies.at(-1)).toMatchObject({ numerator: 8, version: 2 });
    expect(record("OBS")).toMatchObject({ numerator: 8 });
  });

  it("takes the other version where that is chosen", async () => {
    const { store, type, draft, record } = page(
      [line("OBS")],
      stale(line("OBS", { numerator: 7, version: 1 })),
    );
    await type("OBS", "numerator", "8");
    store.useTheirs("OBS");
    expect(draft("OBS", "numerator")).toBeUndefined();
    expect(record("OBS")).toMatchObject({ numerator: 7, version: 1 });
  });

  it("keeps what no connection took, and sends it again", async () => {
    const { store, bodies, type, draft } = page([line("FALLS")], () => ({
      status: 0,
      detail: "No connection.",
    }));
    await type("FALLS", "numerator", "4");
    expect(draft("FALLS", "numerator")).toMatchObject({ state: "failed", text: "4" });
    expect(store.snapshot().failure).toBe("No connection.");
    store.saveAgain();
    await store.settled();
    expect(bodies).toHaveLength(2);
    expect(draft("FALLS", "numerator")).toBeUndefined();
    expect(store.snapshot().failure).toBeNull();
  });

  it("shows a refusal at its box and saves the other one", async () => {
    const refused = () => ({
      status: 422,
      detail: "Falls: too many.",
      errors: [{ path: "denominator", message: "Falls: too many." }],
    });
    const { store, bodies, type, draft } = page([line("ULCERS", { sharedDenominator: "BEDS" })], refused);
    store.type("ULCERS", "numerator", "1");
    await type("ULCERS", "denominator", "2");
    await store.settled();
    expect(draft("ULCERS", "denominator")).toMatchObject({ state: "fix", message: "Falls: too many." });
    expect(bodies.at(-1)).toMatchObject({ numerator: 1 });
    expect(draft("ULCERS", "numerator")).toBeUndefined();
  });

  it("keeps what is typed while the save is under way", async () => {
    const { store, type, draft } = page([line("FALLS")]);
    const first = type("FALLS", "numerator", "4");
    store.type("FALLS", "numerator", "45");
    await first;
    expect(draft("FALLS", "numerator")).toMatchObject({ state: "dirty", text: "45" });
  });
});

describe("a shared denominator", () => {
  it("reaches the other lines, and frees what waited for it", async () => {
    const shared = { sharedDenominator: "BEDS", denominator: 10, denominatorVersion: 1 };
    const { store, bodies, type, record, draft } = page([line("FALLS", shared), line("HARM", shared)]);
    await type("HARM", "numerator", "12");
    expect(draft("HARM", "numerator")?.state).toBe("fix");
    await type("FALLS", "denominator", "800");
    await store.settled();
    expect(record("HARM")).toMatchObject({ denominator: 800, numerator: 12 });
    expect(bodies.map((body) => body.numerator ?? body.denominator)).toEqual([800, 12]);
  });
});

describe("answers that aren't counts", () => {
  it("are saved in their turn and clear the boxes", async () => {
    const { store, bodies, draft, record } = page([line("DOSES")]);
    store.type("DOSES", "numerator", "x");
    expect(await store.saveAnswer("DOSES", { notCollected: "Lost" })).toBeNull();
    expect(bodies).toEqual([{ notCollected: "Lost", version: 0 }]);
    expect(draft("DOSES", "numerator")).toBeUndefined();
    expect(record("DOSES")?.notCollected).toBe("Lost");
  });

  it("hand a refusal back, with the record as it stands", async () => {
    const current = line("DOSES", { numerator: 3, version: 1 });
    const { store, record } = page([line("DOSES")], stale(current));
    expect(await store.saveAnswer("DOSES", { notCollected: "Lost" })).toMatchObject({ status: 409 });
    expect(record("DOSES")).toMatchObject({ numerator: 3, version: 1 });
  });
});
