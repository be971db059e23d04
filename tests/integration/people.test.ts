import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { DomainError } from "@/lib/errors";
import type { PersonActor } from "@/lib/policy";
import { getMe, inviteAgain, invitePerson, listPeople, updatePerson } from "@/lib/services/people";
import { findSessionActor } from "@/lib/services/sessions";
import { verifyChain } from "@/lib/services/audit";
import { makeTestStore, TEST_NOW, type TestStore } from "@/tests/support/store";
import { addPerson, auditOf, personRow, signIn } from "./people-fixtures";

let store: TestStore;
let lead: PersonActor;

beforeAll(async () => {
  store = await makeTestStore();
  lead = await addPerson(store, "quality_lead", "Maro");
  await store.addWard("OSIER");
  await store.addWard("TERN");
});
afterAll(() => store.close());

const invitation = (name: string, wards: string[] = []) => ({
  email: `${name.toLowerCase()}@example.test`,
  name,
  role: "ward_nurse" as const,
  wards,
  grants: [],
});
const actorOf = (sessionId: string) => findSessionActor({ db: store.db, now: TEST_NOW, sessionId });

describe("invitePerson", () => {
  it("adds somebody who can't sign in yet, and leaves the token out of everything kept", async () => {
    const { person, invitation: made } = await invitePerson({
      ctx: store.ctxFor(lead),
      input: invitation("Della", ["TERN", "OSIER"]),
    });
    expect(person).toMatchObject({
      state: "invited",
      wards: ["OSIER", "TERN"],
      version: 1,
      lastSignedInAt: null,
    });
    expect(made.expiresAt.valueOf() - TEST_NOW.valueOf()).toBe(7 * 24 * 3600 * 1000);

    const [entry] = await auditOf(store, "person.invite");
    expect(entry).toMatchObject({ actorId: lead.personId, subjectId: person.id });
    expect(JSON.stringify(entry)).not.toContain(made.token);
    expect((await verifyChain({ ctx: store.ctxFor(lead) })).intact).toBe(true);
  });

  it("is the lead's alone", async () => {
    for (const actor of [store.infection, store.board, store.nurseOf()]) {
      const call = invitePerson({ ctx: store.ctxFor(actor), input: invitation("Nobody") });
      await expect(call).rejects.toMatchObject({ code: "forbidden" });
      await expect(listPeople({ ctx: store.ctxFor(actor) })).rejects.toMatchObject({ code: "forbidden" });
    }
  });

  it("refuses an address twice, unknown wards, and powers that a board member can't hold; nothing is kept", async () => {
    const before = await listPeople({ ctx: store.ctxFor(lead) });
    const call = (input: Parameters<typeof invitePerson>[0]["input"]) =>
      invitePerson({ ctx: store.ctxFor(lead), input });
    await expect(call(invitation("Maro"))).rejects.toMatchObject({ code: "conflict" });
    await expect(call(invitation("Imre", ["OSIER", "NOWHERE"]))).rejects.toMatchObject({ code: "invalid" });
    await expect(
      call({ ...invitation("Osric"), role: "board_member", grants: ["packs:draft"] }),
    ).rejects.toMatchObject({ code: "invalid", errors: [{ path: "grants" }] });
    expect(await listPeople({ ctx: store.ctxFor(lead) })).toHaveLength(before.length);
  });
});

describe("updatePerson", () => {
  const update = (id: string, version: number, change: object) =>
    updatePerson({ ctx: store.ctxFor(lead), input: { id, version, ...change } });

  it("changes wards and role with the person's next request, not when a session ends", async () => {
    const nurse = await addPerson(store, "ward_nurse", "Tamsin");
    const { sessionId } = await signIn(store, nurse.email);
    expect(await actorOf(sessionId)).toMatchObject({ role: "ward_nurse", wardIds: [] });

    await update(nurse.personId, 1, { wards: ["OSIER"] });
    const moved = await actorOf(sessionId);
    expect(moved?.wardIds).toHaveLength(1);
    expect(moved && (await getMe({ ctx: store.ctxFor(moved) })).wards).toEqual(["OSIER"]);

    const saved = await update(nurse.personId, 2, { role: "infection_control" });
    expect(saved).toMatchObject({ role: "infection_control", wards: [], version: 3 });
    expect(await actorOf(sessionId)).toMatchObject({ role: "infection_control", wardIds: [] });
  });

  it("answers a stale version with the record as it stands, and changes nothing", async () => {
    const nurse = await addPerson(store, "ward_nurse", "Pell");
    await update(nurse.personId, 1, { name: "Pell Tressick" });
    const late = await update(nurse.personId, 1, { name: "Other" }).catch((error: unknown) => error);
    expect(late).toMatchObject({ code: "stale", current: { name: "Pell Tressick", version: 2 } });
    expect((await personRow(store, nurse.personId)).name).toBe("Pell Tressick");
  });

  it("switches off at once: sessions end, and a password opens nothing", async () => {
    const nurse = await addPerson(store, "ward_nurse", "Beck");
    const { sessionId } = await signIn(store, nurse.email);
    await update(nurse.personId, 1, { state: "off" });
    expect(await actorOf(sessionId)).toBeNull();
    await expect(signIn(store, nurse.email)).rejects.toMatchObject({ code: "unauthenticated" });

    const entry = (await auditOf(store, "person.update")).find((each) => each.subjectId === nurse.personId);
    expect(JSON.parse(entry?.before ?? "")).toMatchObject({ state: "active" });
    expect(JSON.parse(entry?.after ?? "")).toMatchObject({ state: "off", sessionsEnded: 1 });
    expect(entry?.after).not.toContain("argon2");

    await update(nurse.personId, 2, { state: "active" });
    expect(await actorOf(sessionId)).toBeNull();
    expect((await signIn(store, nurse.email)).email).toBe(nurse.email);
  });

  it("leaves somebody who never chose a password only invited when switched on again", async () => {
    const { person } = await invitePerson({ ctx: store.ctxFor(lead), input: invitation("Corin") });
    await update(person.id, 1, { state: "off" });
    await expect(inviteAgain({ ctx: store.ctxFor(lead), input: { id: person.id } })).rejects.toMatchObject({
      code: "precondition",
    });
    expect((await update(person.id, 2, { state: "active" })).state).toBe("invited");
  });

  it("knows nobody by an unknown id, and is the lead's alone", async () => {
    await expect(update(store.lead.personId, 1, {})).rejects.toMatchObject({ code: "not-found" });
    const call = updatePerson({ ctx: store.ctxFor(store.board), input: { id: lead.personId, version: 1 } });
    await expect(call).rejects.toMatchObject({ code: "forbidden" });
  });
});

describe("the last quality lead", () => {
  it("can be neither switched off nor given another role", async () => {
    for (const change of [{ state: "off" as const }, { role: "board_member" as const }]) {
      const call = updatePerson({
        ctx: store.ctxFor(lead),
        input: { id: lead.personId, version: 1, ...change },
      });
      await expect(call).rejects.toMatchObject({ code: "precondition" });
    }
    expect(await personRow(store, lead.personId)).toMatchObject({
      state: "active",
      role: "quality_lead",
      version: 1,
    });
  });

  it("remains where two leads switch each other off at once", async () => {
    const other = await addPerson(store, "quality_lead", "Hale");
    const off = (actor: PersonActor, id: string) =>
      updatePerson({ ctx: store.ctxFor(actor), input: { id, version: 1, state: "off" } });
    const results = await Promise.allSettled([off(lead, other.personId), off(other, lead.personId)]);
    expect(results.map((result) => result.status).sort()).toEqual(["fulfilled", "rejected"]);
    const refused = results.find((result) => result.status === "rejected");
    expect(refused?.reason).toBeInstanceOf(DomainError);
    expect(refused?.reason).toMatchObject({ code: "precondition" });
  });
});
