import { NextRequest } from "next/server";
import type { Session } from "next-auth";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { authOptions, TOO_MANY_TRIES } from "@/lib/auth/options";
import { PEER_HEADER } from "@/lib/auth/network-address";
import { supplyEnv } from "@/lib/config/env";
import { authHandler } from "@/lib/http/auth-handler";
import { findSessionActor } from "@/lib/services/sessions";
import type { Store } from "@/db/client";
import { makeTestStore, type TestStore } from "@/tests/support/store";
import { addPerson, PASSWORD } from "./people-fixtures";

let store: TestStore;
const holder = globalThis as typeof globalThis & { __ebblineStore?: Promise<Store> };

beforeAll(async () => {
  supplyEnv({ NEXTAUTH_SECRET: "0123456789abcdef0123456789abcdef", NEXTAUTH_URL: "http://127.0.0.1:3000" });
  store = await makeTestStore();
  holder.__ebblineStore = Promise.resolve(store);
  await addPerson(store, "ward_nurse", "Della");
});
afterAll(() => store.close());

/** The one provider as the library calls it. */
async function authorize(email: unknown, password: unknown) {
  const [provider] = authOptions().providers;
  const { authorize: run } = (provider as unknown as { options: { authorize: Authorize } }).options;
  return run({ email, password }, { headers: { [PEER_HEADER]: "198.51.100.7" } });
}
type Authorize = (
  typed: Record<string, unknown>,
  request: { headers: Record<string, string> },
) => Promise<{ id: string; sessionId?: string } | null>;

describe("the library's options", () => {
  it("put nothing but the session's id into the cookie", async () => {
    const user = await authorize("della@example.test", PASSWORD);
    if (!user) throw new Error("not signed in");
    const token = { name: "Della", email: "della@example.test", sub: user.id };
    const kept = await authOptions().callbacks?.jwt?.({ token, user, account: null });
    expect(kept).toEqual({ sid: user.sessionId });
  });

  it("give nothing for a wrong password, a code with the seconds for too many, and no session for odd input", async () => {
    expect(await authorize("della@example.test", "wrong")).toBeNull();
    expect(await authorize({ $ne: "" }, ["x"])).toBeNull();
    for (let count = 0; count < 10; count += 1) await authorize("nobody@example.test", "wrong");
    await expect(authorize("nobody@example.test", "wrong")).rejects.toThrow(
      new RegExp(`^${TOO_MANY_TRIES}-\\d+$`),
    );
  });

  it("end the row at sign-out, after which the session route knows nobody", async () => {
    const user = await authorize("della@example.test", PASSWORD);
    const token = { sid: user?.sessionId };
    const session = { expires: "2026-12-08T00:00:00.000Z" } as Session;
    const described = () =>
      authOptions().callbacks?.session?.({
        session,
        token,
        user: { id: "", email: "", emailVerified: null },
        newSession: {},
        trigger: "update",
      });
    expect(await described()).toMatchObject({ user: { email: "della@example.test" } });

    await authOptions().events?.signOut?.({ token, session });
    const left = await findSessionActor({ db: store.db, now: new Date(), sessionId: token.sid ?? "" });
    expect(left).toBeNull();
    await expect(described()).rejects.toThrow("ended");
  });

  it.each([
    ["/returns", "http://127.0.0.1:3000/returns"],
    ["http://127.0.0.1:3000/charts?x=1", "http://127.0.0.1:3000/charts?x=1"],
    ["https://elsewhere.example/returns", "http://127.0.0.1:3000/"],
    ["http://127.0.0.1:3000.elsewhere.example/", "http://127.0.0.1:3000/"],
    ["http://127.0.0.1:3000//elsewhere.example", "http://127.0.0.1:3000/"],
    ["//elsewhere.example", "http://127.0.0.1:3000/"],
  ])("lead from %s to %s", async (url, target) => {
    expect(await authOptions().callbacks?.redirect?.({ url, baseUrl: "http://127.0.0.1:3000" })).toBe(target);
  });
});

describe("the doors before the library", () => {
  const call = (
    method: string,
    action: string,
    init: { body?: string; headers?: Record<string, string> } = {},
  ) =>
    authHandler(new NextRequest(`http://127.0.0.1:3000/api/auth/${action}`, { method, ...init }), {
      params: Promise.resolve({ nextauth: action.split("/") }),
    });

  it.each([
    ["POST", "session"],
    ["GET", "signout"],
    ["GET", "callback/credentials"],
    ["POST", "signin/credentials"],
    ["POST", "callback/other"],
    ["PUT", "csrf"],
  ])("are shut for %s %s", async (method, action) => {
    expect((await call(method, action)).status).toBe(404);
  });

  it("swallow what browsers would log", async () => {
    expect((await call("POST", "_log", { body: "{}" })).status).toBe(204);
  });

  it("refuse other sites and large bodies before anything is read", async () => {
    const foreign = { headers: { origin: "https://elsewhere.example" } };
    expect((await call("POST", "callback/credentials", foreign)).status).toBe(403);
    const large = { body: `password=${"x".repeat(17_000)}` };
    expect((await call("POST", "callback/credentials", large)).status).toBe(413);
  });
});
