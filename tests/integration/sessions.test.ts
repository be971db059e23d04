import { eq } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { cover, hospital, personWards, sessions } from "@/db/schema";
import { anonymousActor, type PersonActor } from "@/lib/policy";
import { endSession, findSessionActor, hashPassword, isPassword } from "@/lib/services/sessions";
import { NOBODYS_HASH } from "@/lib/services/sessions/password-hash";
import { makeTestStore, TEST_NOW, type TestStore } from "@/tests/support/store";
import { addPerson, auditOf, PASSWORD, signIn } from "./people-fixtures";

let store: TestStore;
let nurse: PersonActor;

beforeAll(async () => {
  store = await makeTestStore();
  nurse = await addPerson(store, "ward_nurse", "Della");
});
afterAll(() => store.close());

const minutes = (count: number) => new Date(TEST_NOW.valueOf() + count * 60_000);
const actorAt = (sessionId: string, at = TEST_NOW) => findSessionActor({ db: store.db, now: at, sessionId });

describe("signing in", () => {
  it("makes a session row and an entry by the person", async () => {
    const { sessionId } = await signIn(store, "DELLA@Example.test");
    expect(await actorAt(sessionId)).toEqual({ ...nurse, sessionId });
    const [entry] = await auditOf(store, "session.start");
    expect(entry).toMatchObject({ actorKind: "person", actorId: nurse.personId, subjectId: sessionId });
  });

  it("refuses a wrong password, an unknown address and half a form in the same words", async () => {
    const tries = [
      signIn(store, nurse.email, "not the password"),
      signIn(store, "nobody@example.test", PASSWORD),
      signIn(store, "not an address", PASSWORD),
      signIn(store, nurse.email, "x".repeat(1001)),
      signIn(store, nurse.email, ""),
    ];
    const refusals = await Promise.allSettled(tries);
    const reasons = refusals.map((refusal) =>
      refusal.status === "rejected" ? String(refusal.reason) : "let in",
    );
    expect(new Set(reasons).size).toBe(1);
    expect(reasons[0]).toContain("isn't right");

    const entries = await auditOf(store, "session.refuse");
    expect(entries.map((entry) => entry.subjectId).sort()).toEqual([nurse.personId, "unknown"].sort());
    expect(entries.every((entry) => entry.actorKind === "anonymous")).toBe(true);
    expect(JSON.stringify(entries)).not.toContain("nobody@example.test");
  });

  it("costs the same for an unknown address: the stand-in hash has the parameters of a real one", async () => {
    const parameters = (encoded: string) => encoded.split("$").slice(0, 4).join("$");
    expect(parameters(NOBODYS_HASH)).toBe(parameters(await hashPassword("whatever it is")));
    expect(await isPassword("whatever it is", NOBODYS_HASH)).toBe(false);
  });

  it("takes the same characters however a keyboard composes them", async () => {
    const hash = await hashPassword("caf\u00e9 by the tide");
    expect(await isPassword("cafe\u0301 by the tide", hash)).toBe(true);
  });
});

describe("a session", () => {
  it("ends after 30 minutes without use, and use is noted at most once a minute", async () => {
    const { sessionId } = await signIn(store, nurse.email);
    const seen = async () =>
      (await store.db.select().from(sessions).where(eq(sessions.id, sessionId)))[0]?.lastSeenAt;

    expect(await actorAt(sessionId, new Date(TEST_NOW.valueOf() + 59_999))).not.toBeNull();
    expect(await seen()).toEqual(TEST_NOW);
    expect(await actorAt(sessionId, minutes(29))).not.toBeNull();
    expect(await seen()).toEqual(minutes(29));
    expect(await actorAt(sessionId, minutes(58))).not.toBeNull();
    expect(await actorAt(sessionId, minutes(88))).toBeNull();
  });

  it("ends after 12 hours, however busy", async () => {
    const { sessionId } = await signIn(store, nurse.email);
    const last = 12 * 60;
    for (let at = 20; at < last; at += 20) expect(await actorAt(sessionId, minutes(at))).not.toBeNull();
    expect(await actorAt(sessionId, minutes(last))).toBeNull();
  });

  it("is nothing to whoever makes an id up", async () => {
    expect(await actorAt(uuidv7())).toBeNull();
    expect(await actorAt("' or true --")).toBeNull();
    expect(await actorAt("")).toBeNull();
  });
});

describe("signing out", () => {
  it("ends the row, so that a copied cookie is dead, and other sessions go on", async () => {
    const [here, there] = [await signIn(store, nurse.email), await signIn(store, nurse.email)];
    const actor = await actorAt(here.sessionId);
    if (!actor) throw new Error("not signed in");
    await endSession({ ctx: store.ctxFor(actor) });
    await endSession({ ctx: store.ctxFor(actor) });

    expect(await actorAt(here.sessionId)).toBeNull();
    expect(await actorAt(there.sessionId)).not.toBeNull();
    const entries = await auditOf(store, "session.end");
    expect(entries.map((entry) => entry.subjectId)).toEqual([here.sessionId]);
  });

  it("needs somebody signed in", async () => {
    await expect(endSession({ ctx: store.ctxFor(anonymousActor) })).rejects.toMatchObject({
      code: "unauthenticated",
    });
  });
});

describe("wards of a session", () => {
  it("are the person's own and those covered today, by the hospital's calendar", async () => {
    await store.db.update(hospital).set({ timeZone: "Pacific/Auckland" }).where(eq(hospital.id, 1));
    const own = await store.addWard("OWN");
    const lent = await store.addWard("LENT");
    await store.db.insert(personWards).values({ personId: nurse.personId, wardId: own.id });
    const one = {
      personId: nurse.personId,
      wardId: lent.id,
      fromDate: "2026-12-08",
      untilDate: "2026-12-08",
    };
    await store.db.insert(cover).values({ id: uuidv7(), ...one });
    // In Auckland, 13 hours ahead, 8 December runs from 11:00 on the 7th to 11:00 on the 8th in UTC.
    const wardsAt = async (at: Date) => {
      const { sessionId } = await signIn(store, nurse.email, PASSWORD, at);
      return new Set((await actorAt(sessionId, at))?.wardIds);
    };
    expect(await wardsAt(new Date("2026-12-07T10:59:59Z"))).toEqual(new Set([own.id]));
    expect(await wardsAt(new Date("2026-12-07T11:00:00Z"))).toEqual(new Set([own.id, lent.id]));
    expect(await wardsAt(new Date("2026-12-08T10:59:59Z"))).toEqual(new Set([own.id, lent.id]));
    expect(await wardsAt(new Date("2026-12-08T11:00:00Z"))).toEqual(new Set([own.id]));
  });
});
