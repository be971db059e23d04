import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { anonymousActor, systemActor, type PersonActor } from "@/lib/policy";
import {
  acceptInvitation,
  findInvitation,
  inviteAgain,
  inviteFirstLead,
  invitePerson,
  listPeople,
} from "@/lib/services/people";
import { findSessionActor } from "@/lib/services/sessions";
import { makeTestStore, TEST_NOW, type TestStore } from "@/tests/support/store";
import { addPerson, auditOf, PASSWORD, personRow, signIn } from "./people-fixtures";

let store: TestStore;
let lead: PersonActor;

beforeAll(async () => {
  store = await makeTestStore();
});
afterAll(() => store.close());

const DAYS = 24 * 3600 * 1000;
const accept = (token: string, more: object = {}, at = TEST_NOW) =>
  acceptInvitation({ ctx: store.ctxFor(anonymousActor, at), input: { token, password: PASSWORD, ...more } });
const find = (token: string, at = TEST_NOW) =>
  findInvitation({ ctx: store.ctxFor(anonymousActor, at), input: { token } });

// First in the file: it needs a hospital without a lead.
describe("the first quality lead", () => {
  const invite = () => inviteFirstLead({ ctx: store.ctxFor(systemActor("set-up")) });

  it("comes in by the newest link alone, says who they are, and ends the offer", async () => {
    const earlier = await invite();
    const made = await invite();
    expect(await find(earlier?.token ?? "")).toBeNull();
    expect(await find(made?.token ?? "")).toMatchObject({ email: null, name: null });

    await expect(accept(made?.token ?? "")).rejects.toMatchObject({ code: "invalid" });
    await accept(made?.token ?? "", { name: "Maro Venndale", email: "maro@example.test" });
    const { personId, sessionId } = await signIn(store, "maro@example.test");
    expect(await personRow(store, personId)).toMatchObject({ role: "quality_lead", state: "active" });
    expect(await invite()).toBeNull();

    const actor = await findSessionActor({ db: store.db, now: TEST_NOW, sessionId });
    if (!actor) throw new Error("not signed in");
    lead = actor;
    expect((await listPeople({ ctx: store.ctxFor(lead) })).map((person) => person.email)).toEqual([
      "maro@example.test",
    ]);
  });

  it("is no business of anybody who isn't signed in", async () => {
    await expect(inviteFirstLead({ ctx: store.ctxFor(anonymousActor) })).rejects.toMatchObject({
      code: "unauthenticated",
    });
  });
});

describe("an invitation", () => {
  const invite = (name: string) =>
    invitePerson({
      ctx: store.ctxFor(lead),
      input: { email: `${name}@example.test`, name, role: "ward_nurse", wards: [], grants: [] },
    });

  it("works once", async () => {
    const { person, invitation } = await invite("della");
    expect(await find(invitation.token)).toEqual({
      personId: person.id,
      email: "della@example.test",
      name: "della",
    });
    expect(await accept(invitation.token)).toEqual({ email: "della@example.test" });
    expect(await personRow(store, person.id)).toMatchObject({ state: "active", version: 2 });
    expect((await personRow(store, person.id)).passwordHash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);

    expect(await find(invitation.token)).toBeNull();
    await expect(accept(invitation.token)).rejects.toMatchObject({ code: "not-found" });
    const entries = await auditOf(store, "person.accept-invitation");
    expect(entries.filter((entry) => entry.subjectId === person.id)).toHaveLength(1);
    expect(JSON.stringify(entries)).not.toContain("argon2");
  });

  it("taken up twice at once is taken up once", async () => {
    const { invitation } = await invite("twice");
    const results = await Promise.allSettled([accept(invitation.token), accept(invitation.token)]);
    expect(results.map((result) => result.status).sort()).toEqual(["fulfilled", "rejected"]);
  });

  it("ends after seven days", async () => {
    const { invitation } = await invite("late");
    const end = TEST_NOW.valueOf() + 7 * DAYS;
    expect(await find(invitation.token, new Date(end - 1))).not.toBeNull();
    expect(await find(invitation.token, new Date(end))).toBeNull();
    await expect(accept(invitation.token, {}, new Date(end))).rejects.toMatchObject({ code: "not-found" });
  });

  it("doesn't let the invited choose another name or address", async () => {
    const { person, invitation } = await invite("fixed");
    await accept(invitation.token, { name: "Somebody else", email: "else@example.test" });
    expect(await personRow(store, person.id)).toMatchObject({ name: "fixed", email: "fixed@example.test" });
  });

  it.each([
    ["short", "too short"],
    ["common", "password1234"],
    ["holder", "my name is holder"],
  ])("refuses the password of %s and stays open", async (name, password) => {
    const { invitation } = await invite(name);
    await expect(accept(invitation.token, { password })).rejects.toMatchObject({
      code: "invalid",
      errors: [{ path: "password" }],
    });
    expect(await find(invitation.token)).not.toBeNull();
  });

  it("is unknown where it was made up", async () => {
    await expect(accept("x".repeat(43))).rejects.toMatchObject({ code: "not-found" });
  });
});

describe("a new link for somebody who has a password", () => {
  it("sets another password and ends the sessions under the old one", async () => {
    const nurse = await addPerson(store, "ward_nurse", "Tamsin");
    const { sessionId } = await signIn(store, nurse.email);
    const { invitation } = await inviteAgain({ ctx: store.ctxFor(lead), input: { id: nurse.personId } });
    expect((await signIn(store, nurse.email)).personId).toBe(nurse.personId);

    await accept(invitation.token, { password: "another tide, another day" });
    expect(await findSessionActor({ db: store.db, now: TEST_NOW, sessionId })).toBeNull();
    await expect(signIn(store, nurse.email)).rejects.toMatchObject({ code: "unauthenticated" });
    expect((await signIn(store, nurse.email, "another tide, another day")).personId).toBe(nurse.personId);
  });
});
