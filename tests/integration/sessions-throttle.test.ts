import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { signInThrottle } from "@/db/schema";
import { anonymousActor } from "@/lib/policy";
import { countTry } from "@/lib/services/sessions/throttle";
import { makeTestStore, TEST_NOW, type TestStore } from "@/tests/support/store";
import { addPerson, auditOf, PASSWORD, signIn } from "./people-fixtures";

let store: TestStore;

beforeAll(async () => {
  store = await makeTestStore();
});
afterAll(() => store.close());

const later = (seconds: number) => new Date(TEST_NOW.valueOf() + seconds * 1000);
const codes = (results: PromiseSettledResult<unknown>[]) =>
  results.map((result) => (result.status === "fulfilled" ? "in" : (result.reason as { code: string }).code));

/** Failed tries up to where the password would be looked at, which is the slow part. */
async function fail(email: string, times: number, address: string | null = null) {
  for (let count = 0; count < times; count += 1) {
    const wait = await countTry({ ctx: store.ctxFor(anonymousActor), keys: { email, address } });
    expect(wait).toBe(0);
  }
}

describe("tries per account", () => {
  it("wait after the tenth failure, also with the right password, without being looked at", async () => {
    const nurse = await addPerson(store, "ward_nurse", "Della");
    await fail(nurse.email, 8);
    const last = [signIn(store, nurse.email, "wrong"), signIn(store, nurse.email, "wrong")];
    expect(codes(await Promise.allSettled(last))).toEqual(["unauthenticated", "unauthenticated"]);

    await expect(signIn(store, nurse.email)).rejects.toMatchObject({ code: "rate-limited", retryAfter: 30 });
    const entries = (await auditOf(store, "session.refuse")).filter(
      (entry) => entry.subjectId === nurse.personId,
    );
    expect(entries).toHaveLength(2);
    expect((await signIn(store, nurse.email, PASSWORD, later(30))).personId).toBe(nurse.personId);
  });

  it("begin anew after a right password", async () => {
    const nurse = await addPerson(store, "ward_nurse", "Imre");
    await fail(nurse.email, 9);
    await signIn(store, nurse.email);
    await fail(nurse.email, 9);
    expect((await signIn(store, nurse.email)).personId).toBe(nurse.personId);
  });

  it("can't be outrun by trying all at once", async () => {
    const nurse = await addPerson(store, "ward_nurse", "Pell");
    await fail(nurse.email, 7);
    const tries = Array.from({ length: 8 }, () => signIn(store, nurse.email, "wrong"));
    const outcome = codes(await Promise.allSettled(tries));
    expect(outcome.filter((code) => code === "unauthenticated")).toHaveLength(3);
    expect(outcome.filter((code) => code === "rate-limited")).toHaveLength(5);
  });

  it("are counted alike for an address that nobody has, kept without it, and hold up nobody else", async () => {
    const nurse = await addPerson(store, "ward_nurse", "Tamsin");
    await fail("nobody@example.test", 10);
    await expect(signIn(store, "nobody@example.test")).rejects.toMatchObject({ code: "rate-limited" });
    expect(JSON.stringify(await store.db.select().from(signInThrottle))).not.toContain("nobody");
    expect((await signIn(store, nurse.email)).email).toBe(nurse.email);
  });
});

describe("tries per network address", () => {
  it("wait after the hundredth failure over many accounts, whatever was right in between", async () => {
    const nurse = await addPerson(store, "ward_nurse", "Hale");
    const from = (address: string) => signIn(store, nurse.email, PASSWORD, TEST_NOW, address);
    for (let account = 0; account < 11; account += 1)
      await fail(`nobody${account}@example.test`, 9, "198.51.100.7");
    await from("198.51.100.7");
    await fail("somebody@example.test", 1, "198.51.100.7");
    await expect(from("198.51.100.7")).rejects.toMatchObject({ code: "rate-limited" });
    expect((await from("198.51.100.8")).email).toBe(nurse.email);
  });
});
