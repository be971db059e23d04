import { describe, expect, it } from "vitest";
import { isDomainError } from "@/lib/errors";
import {
  actions,
  anonymousActor,
  authorize,
  can,
  decide,
  mayAttempt,
  requireAction,
  roles,
  scopeOf,
  systemActor,
  typesNumerator,
  type Action,
  type Actor,
  type Facts,
  type PersonActor,
  type Role,
} from "@/lib/policy";
import { person } from "@/tests/support/actors";

const OWN = "0190a0a0-0000-7000-8000-000000000001";
const OTHER = "0190a0a0-0000-7000-8000-000000000002";

const actorOf = (role: Role): PersonActor => person(role, `Some ${role}`, role === "ward_nurse" ? [OWN] : []);

/** Every action by every role, written out once more by hand: a change of the table must be meant. */
const expected: Record<Action, string> = {
  "me.read": "nurse control board lead",
  "session.end": "nurse control board lead",
  "ward.list": "nurse control lead",
  "ward.create": "lead",
  "ward.update": "lead",
  "indicator.list": "nurse control lead",
  "indicator.create": "lead",
  "indicator.update": "lead",
  "assignment.list": "nurse control lead",
  "assignment.set": "lead",
  "baseline.read": "nurse control lead",
  "baseline.set": "lead",
  "baseline.propose": "control lead",
  "baseline.decide": "lead",
  "return.read": "nurse control lead",
  "return.submit": "nurse lead",
  "return.recall": "nurse lead",
  "return.accept": "lead",
  "return.reopen": "lead",
  "tally.save": "nurse control lead",
  "tally.correct": "nurse lead",
  "correction.decide": "lead",
  "tally.history": "nurse control lead",
  "chart.read": "nurse control lead",
  "annotation.create": "nurse control lead",
  "signal.list": "nurse control lead",
  "series.rebuild": "",
  "import.create": "nurse lead",
  "import.read": "nurse lead",
  "import.commit": "nurse lead",
  "import.accept": "lead",
  "import.take-back": "nurse lead",
  "export.tallies": "nurse control lead",
  "pack.list": "nurse control board lead",
  "people.list": "lead",
  "people.invite": "lead",
  "people.update": "lead",
  "settings.read": "nurse control lead",
  "settings.update": "lead",
  "audit.read": "lead",
};

const shortName: Record<Role, string> = {
  ward_nurse: "nurse",
  infection_control: "control",
  board_member: "board",
  quality_lead: "lead",
};

/** Facts under which nothing but the role decides. */
const ownFacts = (actor: PersonActor): Facts => ({
  wardId: OWN,
  team: "infection_control",
  numeratorBy: "team",
  authorId: actor.personId,
});

describe("the table action × role", () => {
  it("has a line here for every action", () => {
    expect(Object.keys(expected).sort()).toEqual([...actions].sort());
  });

  it.each(actions)("%s", (action) => {
    const allowed = roles.filter((role) => mayAttempt(actorOf(role), action)).map((role) => shortName[role]);
    expect(allowed.join(" ")).toBe(expected[action]);
  });

  it.each(actions)("%s is refused to whoever is not signed in", (action) => {
    expect(mayAttempt(anonymousActor, action)).toBe(false);
    expect(() => requireAction(anonymousActor, action)).toThrowError(/Sign in/);
  });

  it.each(actions)("%s throws forbidden for the other roles", (action) => {
    for (const role of roles.filter((each) => !mayAttempt(actorOf(each), action))) {
      const attempt = () => authorize(actorOf(role), action, ownFacts(actorOf(role)));
      expect(attempt).toThrowError(/role doesn't allow/);
    }
  });
});

describe("facts", () => {
  /** What a nurse may do on her own ward, so that another ward must be hidden. */
  const onWards: Action[] = [
    "baseline.read",
    "return.read",
    "return.submit",
    "return.recall",
    "tally.save",
    "tally.correct",
    "tally.history",
    "chart.read",
    "annotation.create",
  ];

  it.each(onWards)(
    "%s is allowed on a nurse's own ward, hidden on another, refused without a ward",
    (action) => {
      const nurse = actorOf("ward_nurse");
      expect(decide(nurse, action, ownFacts(nurse))).toBe("allow");
      expect(decide(nurse, action, { ...ownFacts(nurse), wardId: OTHER })).toBe("hide");
      expect(decide(nurse, action, { ...ownFacts(nurse), wardId: undefined })).toBe("deny");
    },
  );

  it("knows every other action of a nurse as one that is on no ward", () => {
    const others = actions.filter(
      (action) => mayAttempt(actorOf("ward_nurse"), action) && !onWards.includes(action),
    );
    expect(others.sort()).toEqual([
      "assignment.list",
      "export.tallies",
      "import.commit",
      "import.create",
      "import.read",
      "import.take-back",
      "indicator.list",
      "me.read",
      "pack.list",
      "session.end",
      "settings.read",
      "signal.list",
      "ward.list",
    ]);
  });

  it("refuses when a needed fact is missing", () => {
    const nurse = actorOf("ward_nurse");
    expect(decide(nurse, "return.read", {})).toBe("deny");
    expect(decide(nurse, "tally.save", { wardId: OWN })).toBe("deny");
    expect(decide(nurse, "import.commit", {})).toBe("deny");
    expect(decide(actorOf("quality_lead"), "baseline.decide", { wardId: OWN })).toBe("deny");
  });

  it("hides other wards from a nurse as not found", () => {
    const attempt = () => authorize(actorOf("ward_nurse"), "chart.read", { wardId: OTHER });
    expect(attempt).toThrowError(
      expect.toSatisfy((error: unknown) => isDomainError(error, "not-found")) as Error,
    );
    expect(can(actorOf("ward_nurse"), "chart.read", { wardId: OWN })).toBe(true);
  });

  it("hides somebody else's import, but not from a lead", () => {
    expect(decide(actorOf("ward_nurse"), "import.read", { authorId: "somebody else" })).toBe("hide");
    expect(decide(actorOf("quality_lead"), "import.read", { authorId: "somebody else" })).toBe("allow");
  });

  it("lets nobody decide on a baseline that they proposed", () => {
    const lead = actorOf("quality_lead");
    expect(decide(lead, "baseline.decide", { wardId: OWN, authorId: lead.personId })).toBe("deny");
    expect(decide(lead, "baseline.decide", { wardId: OWN, authorId: "somebody else" })).toBe("allow");
  });

  it("lets infection control propose baselines for its own indicators alone", () => {
    const control = actorOf("infection_control");
    expect(decide(control, "baseline.propose", { wardId: OWN, team: "infection_control" })).toBe("allow");
    expect(decide(control, "baseline.propose", { wardId: OWN, team: "quality" })).toBe("deny");
    expect(decide(control, "baseline.propose", { wardId: OWN })).toBe("deny");
  });

  it("lets infection control type only the lines that its team counts", () => {
    const control = actorOf("infection_control");
    const facts = { wardId: OWN, team: "infection_control", numeratorBy: "team" } as const;
    expect(decide(control, "tally.save", facts)).toBe("allow");
    expect(decide(control, "tally.save", { ...facts, numeratorBy: "ward" })).toBe("deny");
    expect(decide(control, "tally.save", { ...facts, team: "quality" })).toBe("deny");
  });

  it("says who types a numerator", () => {
    const byTeam = { numeratorBy: "team", team: "infection_control" } as const;
    const byWard = { numeratorBy: "ward", team: "quality" } as const;
    expect(typesNumerator(actorOf("ward_nurse"), byTeam)).toBe(false);
    expect(typesNumerator(actorOf("ward_nurse"), byWard)).toBe(true);
    expect(typesNumerator(actorOf("infection_control"), byTeam)).toBe(true);
    expect(typesNumerator(actorOf("infection_control"), byWard)).toBe(false);
    expect(typesNumerator(actorOf("quality_lead"), byTeam)).toBe(true);
    expect(typesNumerator(actorOf("board_member"), byWard)).toBe(false);
    expect(typesNumerator(anonymousActor, byWard)).toBe(false);
    expect(typesNumerator(systemActor("seed"), byTeam)).toBe(true);
  });
});

describe("what can't be known refuses", () => {
  it("refuses an unknown role and an unknown action", () => {
    const stranger = { ...actorOf("quality_lead"), role: "owner" } as unknown as Actor;
    expect(actions.filter((action) => mayAttempt(stranger, action))).toEqual([]);
    expect(mayAttempt(actorOf("quality_lead"), "ward.explode" as Action)).toBe(false);
    expect(mayAttempt(actorOf("quality_lead"), "constructor" as Action)).toBe(false);
    expect(mayAttempt(systemActor("seed"), "toString" as Action)).toBe(false);
    expect(
      mayAttempt({ ...actorOf("quality_lead"), role: "constructor" } as unknown as Actor, "me.read"),
    ).toBe(false);
  });
});

describe("scopes", () => {
  it("filters by own wards for nurses, by nothing for staff, by no ward for others", () => {
    expect(scopeOf(actorOf("ward_nurse"))).toEqual({ wards: [OWN] });
    expect(scopeOf(actorOf("infection_control"))).toEqual({ wards: "all" });
    expect(scopeOf(actorOf("quality_lead"))).toEqual({ wards: "all" });
    expect(scopeOf(actorOf("board_member"))).toEqual({ wards: [] });
    expect(scopeOf(anonymousActor)).toEqual({ wards: [] });
    expect(scopeOf(systemActor("seed"))).toEqual({ wards: "all" });
  });

  it("gives an unknown role no ward", () => {
    expect(scopeOf({ ...actorOf("quality_lead"), role: "owner" } as unknown as Actor)).toEqual({ wards: [] });
  });
});
